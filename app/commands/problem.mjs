/** What a person can put right; the commands print its message and no stack. */
export class Problem extends Error {
  /** @override */
  name = 'Problem'
}

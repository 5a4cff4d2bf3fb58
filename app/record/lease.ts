/** How long a worker holds what it took, in milliseconds, and how much it takes at once. */
export const leaseMilliseconds = 2 * 60 * 1000
export const leaseLimit = 20

const minute = 60 * 1000
const hour = 60 * minute
const pauses = [minute, 5 * minute, 25 * minute, 2 * hour, 10 * hour]

/** How often something is tried before it waits for a person. */
export const mostTries = pauses.length + 1

/** When to try again after so many tries that failed (the first is 1), or null when it is given up. */
export function toNextTry(tries: number, now: Date): Date | null {
  const pause = pauses[tries - 1]
  return pause === undefined ? null : new Date(now.getTime() + pause)
}

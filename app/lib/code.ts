/** Letters and digits that cannot be taken for one another, read aloud or scratched on a tag (no 0 O 1 I L 5 S U V). */
export const codeAlphabet = '2346789ABCDEFGHJKMNPQRTWXYZ'

/** A code people see: two letters of the area and five characters, without the dash (`KC7FQ2X`). */
export function toCode(area: string, random: (bytes: number) => Uint8Array): string {
  const letters = Array.from(random(5), byte => codeAlphabet[byte % codeAlphabet.length])
  return area + letters.join('')
}

/** How a code is shown: `KC-7FQ2X`. */
export function formatCode(code: string): string {
  return `${code.slice(0, 2)}-${code.slice(2)}`
}

/** The stored form of a code however it was typed (dash, blanks, small letters), or null when it cannot be one. */
export function parseCode(text: string): string | null {
  const code = text.toUpperCase().replace(/[\s-]/g, '')
  return /^[A-Z]{2}[0-9A-Z]{5}$/.test(code) ? code : null
}

/** The code at the end of a URL's last part (`slack-water-KC7FQ2X`), or null. */
export function parseSlug(slug: string): string | null {
  return parseCode(slug.split('-').at(-1) ?? '')
}

/** A URL's last part: the name in plain letters and the code; only the code is ever looked up. */
export function toSlug(name: string, code: string): string {
  const plain = name
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '')
  return plain ? `${plain}-${code}` : code
}

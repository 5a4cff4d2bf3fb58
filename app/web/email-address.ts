const local = /^[a-z0-9.!#$%&'*+/=?^_`{|}~-]{1,64}$/
const domain = /^(?=.{1,253}$)([a-z0-9]([a-z0-9-]{0,61}[a-z0-9])?\.)+[a-z0-9-]{2,63}$/

/**
 * An address as it is kept, or null when it cannot be one: small letters; a domain in letters of any script becomes
 * its ASCII form; before the @ only ASCII, since look-alike letters must never be somebody else's address.
 */
export function parseEmailAddress(text: string): string | null {
  const at = text.trim().lastIndexOf('@')
  if (at < 1) return null
  const before = text.trim().slice(0, at).toLowerCase()
  const after = toAsciiDomain(text.trim().slice(at + 1))
  if (after === null || !local.test(before) || /^\.|\.$|\.\./.test(before)) return null
  const address = `${before}@${after}`
  return address.length <= 254 ? address : null
}

function toAsciiDomain(text: string): string | null {
  if (/[\s/\\?#:@%]/.test(text)) return null
  try {
    const ascii = new URL(`http://${text}`).hostname
    return domain.test(ascii) && !/^[\d.]+$/.test(ascii) ? ascii : null
  } catch {
    return null
  }
}

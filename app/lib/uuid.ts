/**
 * A UUID version 7 (RFC 9562): 48 bits of milliseconds, then 74 random bits, so that rows made later sort later.
 * `random` gives that many random bytes.
 */
export function toUuid7(now: Date, random: (bytes: number) => Uint8Array): string {
  const bytes = new Uint8Array(16)
  let time = now.getTime()
  for (let i = 5; i >= 0; i--) {
    bytes[i] = time % 256
    time = Math.floor(time / 256)
  }
  bytes.set(random(10), 6)
  bytes[6] = (bytes[6]! & 0x0f) | 0x70
  bytes[8] = (bytes[8]! & 0x3f) | 0x80
  const hex = Array.from(bytes, byte => byte.toString(16).padStart(2, '0')).join('')
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-${hex.slice(12, 16)}-${hex.slice(16, 20)}-${hex.slice(20)}`
}

/** Whether a string is a UUID as the database writes it. */
export function isUuid(text: string): boolean {
  return /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/.test(text)
}

/** The rules of a mailed code. */
export const codeRules = {
  digits: 8,
  minutes: 10,
  /** wrong tries for an address in one browser while its codes live */
  tries: 5,
  perAddressADay: 10,
  perNetworkAnHour: 30,
} as const

/** A code of eight digits out of 64 random bits, each as likely as any other to within one in 10¹¹. */
export function toCodeDigits(random: (bytes: number) => Uint8Array): string {
  const number = random(8).reduce<bigint>((sum, byte) => sum * 256n + BigInt(byte), 0n)
  return String(number % 10n ** BigInt(codeRules.digits)).padStart(codeRules.digits, '0')
}

/** How a code is shown: `4821 9306`. */
export function formatDigits(code: string): string {
  return `${code.slice(0, 4)} ${code.slice(4)}`
}

/** The eight digits however they were typed or pasted, or null. */
export function parseDigits(text: string): string | null {
  const digits = text.normalize('NFKC').replace(/[\s-]/g, '')
  return /^\d{8}$/.test(digits) ? digits : null
}

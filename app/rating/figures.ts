/** A figure to two significant digits, as people read it: 287 → "290", 0.034 → "0.034", 12345 → "12,000". */
export function formatTwoDigits(value: number): string {
  if (!Number.isFinite(value) || value === 0) return '0'
  return Number(value.toPrecision(2)).toLocaleString('en', { maximumSignificantDigits: 2 })
}

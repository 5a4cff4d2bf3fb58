/** The day of a moment in a time zone, as `2027-03-12`. */
export function toDay(moment: Date, timeZone: string): string {
  return new Intl.DateTimeFormat('en-CA', {
    timeZone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
  }).format(moment)
}

/** A day so many months on (never past the month's end), as `2027-03-31`. */
export function addMonths(day: string, months: number): string {
  const [year, month, date] = day.split('-').map(Number) as [number, number, number]
  const last = new Date(Date.UTC(year, month - 1 + months + 1, 0)).getUTCDate()
  return new Date(Date.UTC(year, month - 1 + months, Math.min(date, last))).toISOString().slice(0, 10)
}

/** A day so many days on, as `2027-03-31`. */
export function addDays(day: string, days: number): string {
  return new Date(Date.parse(`${day}T00:00:00Z`) + days * 86_400_000).toISOString().slice(0, 10)
}

/** The last moment (to the millisecond) of a day in a time zone, also where the clocks change at midnight. */
export function toDayEnd(day: string, timeZone: string): Date {
  const noon = Date.parse(`${day}T12:00:00Z`)
  // no zone is further than 14 hours from UTC, so the day's end lies between these two
  let [within, after] = [noon - 3 * 3_600_000, noon + 27 * 3_600_000]
  while (after - within > 1) {
    const middle = Math.floor((within + after) / 2)
    if (toDay(new Date(middle), timeZone) <= day) within = middle
    else after = middle
  }
  return new Date(within)
}

/** Whole and part years between two days, never negative. */
export function yearsBetween(from: string, to: string): number {
  return Math.max(0, (Date.parse(to) - Date.parse(from)) / (365.25 * 86_400_000))
}

const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec']

/** A day as people read it: `2027-03-12` → "12 Mar 2027". */
export function formatDay(day: string): string {
  const [year, month, date] = day.split('-').map(Number) as [number, number, number]
  return `${date} ${months[month - 1]} ${year}`
}

/** A day in a table where the year is plain: "12 Mar". */
export function formatDayShort(day: string): string {
  return formatDay(day).split(' ').slice(0, 2).join(' ')
}

/** A moment in a time zone: "12 Mar 2027, 14:20". The page names the zone once. */
export function formatMoment(moment: Date, timeZone: string): string {
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  }).formatToParts(moment)
  const get = (type: Intl.DateTimeFormatPartTypes) => parts.find(part => part.type === type)?.value ?? ''
  return `${formatDay(`${get('year')}-${get('month')}-${get('day')}`)}, ${get('hour')}:${get('minute')}`
}

/** How a time zone is named on a page: "Atlantic/Azores" → "Azores time". */
export function formatZone(timeZone: string): string {
  return `${(timeZone.split('/').at(-1) ?? timeZone).replaceAll('_', ' ')} time`
}

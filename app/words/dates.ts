/** Instants in words. A zone is always named by who asks: the circuit's, or UTC where there is no circuit. */

const format = (timeZone: string, parts: Intl.DateTimeFormatOptions) =>
  new Intl.DateTimeFormat('en-GB', { timeZone, ...parts })

/**
 * "20:14" on the day itself, "9 Oct, 20:14" within the same year, "9 Oct 2025" before.
 * @param instant ISO 8601
 * @param now ISO 8601, the reader's present
 * @param timeZone IANA zone whose clock and calendar are meant
 */
export function whenWords(instant: string, now: string, timeZone: string): string {
  const [at, today] = [Date.parse(instant), Date.parse(now)]
  const day = format(timeZone, { year: 'numeric', month: '2-digit', day: '2-digit' })
  const time = format(timeZone, { hour: '2-digit', minute: '2-digit' }).format(at)
  if (day.format(at) === day.format(today)) return time
  const year = format(timeZone, { year: 'numeric' })
  const date = format(timeZone, { day: 'numeric', month: 'short' }).format(at)
  return year.format(at) === year.format(today) ? `${date}, ${time}` : `${date} ${year.format(at)}`
}

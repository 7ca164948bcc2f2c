import { source } from './source'

const DAY_MS = 86_400_000
const dayOf = (date: string) => Date.parse(`${date}T00:00:00Z`)

/**
 * Moves a date of the source so that its track walk was yesterday: everything that was found lies in the past and keeps its
 * distance to the walk, and the places that were checked on foot are fresh.
 * @param today YYYY-MM-DD, UTC
 * @param time HH:MM, UTC
 * @returns instant, ISO 8601
 */
export function instantOf(date: string, today: string, time: string): string {
  const sinceWalk = dayOf(date) - dayOf(source.dates.trackWalk)
  const day = new Date(dayOf(today) - DAY_MS + sinceWalk).toISOString().slice(0, 10)
  return `${day}T${time}:00.000Z`
}

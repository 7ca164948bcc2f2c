import type { Metres } from '~/track/units'
import { whenWords } from '~/words/dates'
import type { BookLine } from './book-list'

interface Entry extends Omit<BookLine, 'changed'> {
  layout: { id: string; name: string; length: Metres }
  changedAt: string
}

/** Books as a list shows them. Without an event of its own a team's list tells the time of UTC. */
export const bookLines = (books: readonly Entry[], now: string): BookLine[] =>
  books.map(({ slug, name, archived, layout, car, corners, marks, changedAt }) => ({
    slug,
    name,
    archived,
    layout: { name: layout.name, length: layout.length },
    car,
    corners,
    marks,
    changed: whenWords(changedAt, now, 'UTC'),
  }))

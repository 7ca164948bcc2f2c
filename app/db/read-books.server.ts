import { and, asc, desc, eq, sql } from 'drizzle-orm'
import type { Actor } from '~/book/actions'
import type { BookId, LayoutId } from '~/book/ids'
import { type Metres, metres } from '~/track/units'
import type { Db } from './database'
import { ownTeam } from './own-team'
import { books, cars, changes, circuits, corners, layouts, marks } from './schema'

/** A book in a list. */
export interface BookEntry {
  id: BookId
  slug: string
  name: string
  archived: boolean
  circuit: string
  layout: { id: LayoutId; name: string; length: Metres }
  car: string
  corners: number
  marks: number
  /** Instant of the last change, ISO 8601. */
  changedAt: string
}

/** The team's books, those in use first, the last made first. */
export async function readBooks(db: Db, actor: Actor): Promise<BookEntry[]> {
  const rows = await db
    .select({
      id: books.id,
      slug: books.slug,
      name: books.name,
      state: books.state,
      circuit: circuits.name,
      layout: { id: layouts.id, name: layouts.name, length: layouts.length },
      car: cars.name,
      corners: db.$count(
        corners,
        and(eq(corners.teamId, books.teamId), eq(corners.layoutId, layouts.id), eq(corners.state, 'live')),
      ),
      marks: db.$count(marks, and(eq(marks.teamId, books.teamId), eq(marks.bookId, books.id), eq(marks.state, 'live'))),
      changedAt: sql<Date>`coalesce((select max(${changes.createdAt}) from ${changes}
        where ${changes.teamId} = ${books.teamId} and ${changes.bookId} = ${books.id}), ${books.createdAt})`.mapWith(
        books.createdAt,
      ),
    })
    .from(books)
    .innerJoin(layouts, and(eq(layouts.teamId, books.teamId), eq(layouts.id, books.layoutId)))
    .innerJoin(circuits, and(eq(circuits.teamId, layouts.teamId), eq(circuits.id, layouts.circuitId)))
    .innerJoin(cars, and(eq(cars.teamId, books.teamId), eq(cars.id, books.carId)))
    .where(ownTeam(actor, books.teamId))
    .orderBy(desc(books.state), desc(books.createdAt), asc(books.id))
  return rows.map(({ state, layout, changedAt, ...row }) => ({
    ...row,
    archived: state === 'archived',
    layout: { ...layout, length: metres(layout.length) },
    changedAt: changedAt.toISOString(),
  }))
}

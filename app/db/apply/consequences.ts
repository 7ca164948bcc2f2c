import { and, asc, eq, isNull } from 'drizzle-orm'
import type { BookId, CardId, CornerId, LandmarkId, TeamId } from '~/book/ids'
import { type Json, OPERATION_VERSION, type Operation, type Scope } from '~/book/operation'
import type { Place, Placement } from '~/book/place'
import { resolveTie } from '~/book/ties'
import type { Db } from '../database'
import { placeColumns, placeFrom } from '../placing'
import { books, cards, marks, places, ties } from '../schema'
import { newId } from './new-id'
import { keyOf, type LockedScope } from './scopes'
import type { Values } from './values'

type Scopes = ReadonlyMap<string, LockedScope>

const followUp = (cause: Operation, scope: Scope, target: Operation['target'], set: Operation['set']): Operation => ({
  id: newId(),
  v: OPERATION_VERSION,
  scope,
  target,
  set,
  madeAt: cause.madeAt,
})

/**
 * What dropping a landmark does to the marks tied to it, in every book of the layout: each stays where its tie held it, with its
 * words, and hangs on nothing.
 * @param landmark its fields before it is dropped
 */
export async function freeTies(db: Db, team: TeamId, drop: Operation, landmark: Values, scopes: Scopes) {
  const rows = await db
    .select({ book: marks.bookId, mark: marks.id, place: placeColumns })
    .from(ties)
    .innerJoin(
      places,
      and(eq(places.teamId, ties.teamId), eq(places.markId, ties.markId), eq(places.ground, ties.ground)),
    )
    .innerJoin(marks, and(eq(marks.teamId, ties.teamId), eq(marks.id, ties.markId)))
    .where(and(eq(ties.teamId, team), eq(ties.landmarkId, drop.target.id as LandmarkId)))
    .orderBy(asc(marks.id), asc(ties.ground))
  return rows.flatMap(({ book, mark, place: row }) => {
    const scope: Scope = { kind: 'book', id: book }
    const locked = scopes.get(keyOf(scope))
    if (!locked) return []
    const from = placeFrom(row)
    const to = freed(from, landmark[row.ground] as unknown as Placement | null, locked)
    const set = { [row.ground]: { from: from as unknown as Json, to: to as unknown as Json } }
    return [followUp(drop, scope, { kind: 'mark', id: mark }, set)]
  })
}

/** The place where its tie held it, hanging on nothing. */
function freed(place: Place, placement: Placement | null, { length, reversed, carLength }: LockedScope) {
  const at = resolveTie(place, placement, { length, reversed, carLength: carLength ?? 0 })
  return { ...place, ...at, tie: place.tie && { ...place.tie, landmarkId: null, along: null } }
}

/** What a corner that comes to life does: every book of its layout that has no card for it gets one. */
export async function cardsForCorner(db: Db, team: TeamId, making: Operation, layout: LockedScope) {
  const corner = making.target.id as CornerId
  const rows = await db
    .select({ id: books.id })
    .from(books)
    .leftJoin(cards, and(eq(cards.teamId, books.teamId), eq(cards.bookId, books.id), eq(cards.cornerId, corner)))
    .where(and(eq(books.teamId, team), eq(books.layoutId, layout.layout), isNull(cards.id)))
    .orderBy(asc(books.id))
  return rows.map(({ id }) => makeCard(id, corner, making.madeAt))
}

/** The operation that makes a book's card of a corner. */
export function makeCard(book: BookId, corner: CornerId, madeAt: string): Operation {
  return {
    id: newId(),
    v: OPERATION_VERSION,
    scope: { kind: 'book', id: book },
    target: { kind: 'card', id: newId<CardId>() },
    set: { state: { from: null, to: 'live' }, cornerId: { from: null, to: corner } },
    madeAt,
  }
}

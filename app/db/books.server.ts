import { and, eq } from 'drizzle-orm'
import { generateNKeysBetween } from 'fractional-indexing'
import type { Actor } from '~/book/actions'
import type { BookId, CarId, ConditionId, CornerId, LayoutId } from '~/book/ids'
import type { ConditionKind } from '~/book/kinds'
import { OPERATION_VERSION, type Operation } from '~/book/operation'
import { makeCard } from './apply/consequences'
import { newId } from './apply/new-id'
import { applyAll } from './apply.server'
import { nameProblems } from './checks'
import { commander, type Declined, lockTeam, type Member } from './command'
import type { Db } from './database'
import { ownTeam } from './own-team'
import { books, cars, corners, layouts } from './schema'
import { freeSlug } from './slugs'

export interface NewBook {
  id: BookId
  name: string
  layout: LayoutId
  car: CarId
}

/** What every book starts with; more are added as they are needed. */
const FIRST_CONDITIONS: readonly { kind: ConditionKind; name: string }[] = [
  { kind: 'dry', name: 'Dry' },
  { kind: 'wet', name: 'Wet' },
]

/**
 * Makes a book for a layout and a car: dry and wet, and an empty card for each corner. The car's length is pinned. Sending the same
 * id again makes nothing more.
 */
export async function makeBook(
  db: Db,
  actor: Actor,
  input: NewBook,
): Promise<{ kind: 'made'; book: BookId; slug: string } | Declined> {
  const asked = await commander(db, actor, 'book.make')
  if (asked.kind !== 'member') return asked
  const problems = nameProblems('name', input.name)
  if (problems.length > 0) return { kind: 'invalid', problems }
  const name = input.name.trim()
  return db.transaction((tx) => addBook(tx, actor, asked.member, { ...input, name }))
}

async function addBook(
  db: Db,
  actor: Actor,
  { team, person }: Member,
  { id, name, layout, car }: NewBook,
): Promise<{ kind: 'made'; book: BookId; slug: string } | Declined> {
  await lockTeam(db, team)
  const known = await db.select({ id: books.id, slug: books.slug }).from(books).where(eq(books.teamId, team))
  const again = known.find((book) => book.id === id)
  if (again) return { kind: 'made', book: id, slug: again.slug }
  // The layout stays locked until its cards are there: a corner made meanwhile would have none.
  const [onLayout] = await db
    .select({ id: layouts.id })
    .from(layouts)
    .where(and(ownTeam(actor, layouts.teamId), eq(layouts.id, layout), eq(layouts.state, 'live')))
    .for('no key update')
  const [forCar] = await db
    .select({ length: cars.length })
    .from(cars)
    .where(and(ownTeam(actor, cars.teamId), eq(cars.id, car), eq(cars.state, 'live')))
  if (!onLayout) return { kind: 'invalid', problems: [{ field: 'layout', code: 'not-found' }] }
  if (!forCar) return { kind: 'invalid', problems: [{ field: 'car', code: 'not-found' }] }

  const slug = freeSlug(
    name,
    known.map((row) => row.slug),
  )
  await db
    .insert(books)
    .values({ teamId: team, id, slug, name, layoutId: layout, carId: car, carLength: forCar.length, madeBy: person })
  const manner = { by: person, acceptedBy: null, asked: false, propose: false, batch: newId<string>() }
  const done = await applyAll(db, actor, await firstContent(db, actor, id, layout), manner)
  if (done.kind === 'stopped') throw new Error(`a new book could not be filled: ${done.outcome.kind}`)
  return { kind: 'made', book: id, slug }
}

async function firstContent(db: Db, actor: Actor, book: BookId, layout: LayoutId): Promise<Operation[]> {
  const madeAt = new Date().toISOString()
  const rows = await db
    .select({ id: corners.id })
    .from(corners)
    .where(and(ownTeam(actor, corners.teamId), eq(corners.layoutId, layout), eq(corners.state, 'live')))
  const ranks = generateNKeysBetween(null, null, FIRST_CONDITIONS.length)
  const conditions = FIRST_CONDITIONS.map(({ kind, name }, at) => makeCondition(book, kind, name, ranks[at]!, madeAt))
  return [...conditions, ...rows.map(({ id }: { id: CornerId }) => makeCard(book, id, madeAt))]
}

function makeCondition(book: BookId, kind: ConditionKind, name: string, rank: string, madeAt: string): Operation {
  const values = { state: 'live', kind, name, rank }
  return {
    id: newId(),
    v: OPERATION_VERSION,
    scope: { kind: 'book', id: book },
    target: { kind: 'condition', id: newId<ConditionId>() },
    set: Object.fromEntries(Object.entries(values).map(([field, to]) => [field, { from: null, to }])),
    madeAt,
  }
}

import { and, asc, eq, inArray, or } from 'drizzle-orm'
import type { Actor } from '~/book/actions'
import type { BookId, LayoutId } from '~/book/ids'
import type { Operation, Scope, TargetKind } from '~/book/operation'
import type { Db } from '../database'
import { ownTeam } from '../own-team'
import { books, layouts } from '../schema'

/** A scope under its row lock: nobody else writes in it until the transaction ends. */
export interface LockedScope {
  scope: Scope
  rev: number
  archived: boolean
  /** The layout itself, or the book's. */
  layout: LayoutId
  /** The drawn line's length in metres. */
  length: number
  reversed: boolean
  /** Metres, as pinned in the book; null for a layout. */
  carLength: number | null
}

export const keyOf = (scope: Scope) => `${scope.kind} ${scope.id}`

/** Fields of a layout's things that reach into its books: ties are freed or move with their landmark, cards are made. */
const REACHING: Partial<Record<TargetKind, readonly string[]>> = {
  landmark: ['state', 'sim', 'real'],
  corner: ['state'],
}

const reachesBooks = ({ target, set }: Operation) =>
  REACHING[target.kind]?.some((field) => set[field] !== undefined) ?? false

/**
 * Locks the scopes of some operations, always layouts before books and each in the order of their ids, so that two writers
 * cannot wait for each other. A scope that is not the actor's is not in the answer.
 */
export async function lockScopes(db: Db, actor: Actor, operations: readonly Operation[]) {
  const layoutIds = idsOf(operations, 'layout') as LayoutId[]
  const bookIds = idsOf(operations, 'book') as BookId[]
  const widened = operations.filter(reachesBooks).map(({ scope }) => scope.id as LayoutId)
  const locked = new Map<string, LockedScope>()
  for (const row of await lockLayouts(db, actor, layoutIds)) {
    const scope: Scope = { kind: 'layout', id: row.id }
    const { rev, length, reversed } = row
    locked.set(keyOf(scope), {
      scope,
      rev,
      length,
      reversed,
      archived: row.state === 'archived',
      layout: row.id,
      carLength: null,
    })
  }
  for (const row of await lockBooks(db, actor, bookIds, widened)) {
    const scope: Scope = { kind: 'book', id: row.id }
    const { rev, layout, length, reversed, carLength } = row
    locked.set(keyOf(scope), { scope, rev, layout, length, reversed, carLength, archived: row.state === 'archived' })
  }
  return locked
}

const idsOf = (operations: readonly Operation[], kind: Scope['kind']) => [
  ...new Set(operations.filter(({ scope }) => scope.kind === kind).map(({ scope }) => scope.id)),
]

async function lockLayouts(db: Db, actor: Actor, ids: LayoutId[]) {
  if (ids.length === 0) return []
  return db
    .select({
      id: layouts.id,
      rev: layouts.rev,
      state: layouts.state,
      length: layouts.length,
      reversed: layouts.reversed,
    })
    .from(layouts)
    .where(and(ownTeam(actor, layouts.teamId), inArray(layouts.id, ids)))
    .orderBy(asc(layouts.id))
    .for('no key update')
}

async function lockBooks(db: Db, actor: Actor, ids: BookId[], ofLayouts: LayoutId[]) {
  if (ids.length === 0 && ofLayouts.length === 0) return []
  return db
    .select({
      id: books.id,
      rev: books.rev,
      state: books.state,
      layout: books.layoutId,
      length: layouts.length,
      reversed: layouts.reversed,
      carLength: books.carLength,
    })
    .from(books)
    .innerJoin(layouts, and(eq(layouts.teamId, books.teamId), eq(layouts.id, books.layoutId)))
    .where(and(ownTeam(actor, books.teamId), or(inArray(books.id, ids), inArray(books.layoutId, ofLayouts))))
    .orderBy(asc(books.id))
    .for('no key update', { of: books })
}

import { and, desc, eq, inArray, lt, or, sql } from 'drizzle-orm'
import type { Actor } from '~/book/actions'
import type { BookId, CardId, LayoutId, OperationId, PersonId } from '~/book/ids'
import type { FieldChange, TargetKind } from '~/book/operation'
import type { Db } from './database'
import { ownTeam } from './own-team'
import { changes, landmarks, marks, stretches } from './schema'

/** One line of the change log. */
export interface Change {
  /** Order of writing; where the next page begins. */
  at: number
  operation: OperationId
  book: BookId | null
  layout: LayoutId | null
  rev: number
  target: { kind: TargetKind; id: string }
  set: Record<string, FieldChange>
  reason: string | null
  undoes: OperationId | null
  batch: string | null
  by: PersonId | null
  /** Whose thing was changed: the maker of the mark, landmark or stretch, dropped or not; null for what has no maker. */
  madeBy: PersonId | null
  acceptedBy: PersonId | null
  /** Instants, ISO 8601: when it was made, when it was written. */
  madeAt: string
  writtenAt: string
}

export interface ChangesAsked {
  book?: BookId
  layout?: LayoutId
  /** Only changes of this card and of its marks, dropped ones too. */
  card?: CardId
  /** Only lines before this one. */
  before?: number
  limit: number
}

/** The latest changes of a book, of a layout or of the whole team, latest first. */
export async function readChanges(db: Db, actor: Actor, asked: ChangesAsked): Promise<Change[]> {
  const rows = await db
    .select({
      at: changes.id,
      operation: changes.operationId,
      book: changes.bookId,
      layout: changes.layoutId,
      rev: changes.rev,
      targetKind: changes.targetKind,
      targetId: changes.targetId,
      set: changes.set,
      reason: changes.reason,
      undoes: changes.undoes,
      batch: changes.batch,
      by: changes.byId,
      madeBy: sql<PersonId | null>`coalesce(${marks.madeBy}, ${landmarks.madeBy}, ${stretches.madeBy})`,
      acceptedBy: changes.acceptedBy,
      madeAt: changes.madeAt,
      writtenAt: changes.createdAt,
    })
    .from(changes)
    .leftJoin(marks, isTarget('mark', marks))
    .leftJoin(landmarks, isTarget('landmark', landmarks))
    .leftJoin(stretches, isTarget('stretch', stretches))
    .where(
      and(
        ownTeam(actor, changes.teamId),
        asked.book && eq(changes.bookId, asked.book),
        asked.layout && eq(changes.layoutId, asked.layout),
        asked.card && or(eq(changes.targetId, asked.card), inArray(changes.targetId, marksOf(db, actor, asked.card))),
        asked.before === undefined ? undefined : lt(changes.id, asked.before),
      ),
    )
    .orderBy(desc(changes.id))
    .limit(asked.limit)
  return rows.map(({ targetKind, targetId, madeAt, writtenAt, ...row }) => ({
    ...row,
    target: { kind: targetKind, id: targetId },
    madeAt: madeAt.toISOString(),
    writtenAt: writtenAt.toISOString(),
  }))
}

const isTarget = (kind: TargetKind, table: typeof marks | typeof landmarks | typeof stretches) =>
  and(eq(changes.targetKind, kind), eq(table.teamId, changes.teamId), eq(table.id, changes.targetId))

const marksOf = (db: Db, actor: Actor, card: CardId) =>
  db
    .select({ id: sql<string>`${marks.id}` })
    .from(marks)
    .where(and(ownTeam(actor, marks.teamId), eq(marks.cardId, card)))

import { and, desc, eq, or, type SQL } from 'drizzle-orm'
import type { Actor } from '~/book/actions'
import type { OperationId, PersonId } from '~/book/ids'
import { OPERATION_VERSION, type Operation, type Outcome, type Scope } from '~/book/operation'
import { undoOf } from './apply/engine'
import { newId } from './apply/new-id'
import { applyBatch, type BatchOutcome } from './apply.server'
import type { Db } from './database'
import { isBy, ownTeam, personOf } from './own-team'
import { changes } from './schema'

const logged = {
  operation: changes.operationId,
  book: changes.bookId,
  layout: changes.layoutId,
  kind: changes.targetKind,
  target: changes.targetId,
  set: changes.set,
  madeAt: changes.madeAt,
  batch: changes.batch,
  by: changes.byId,
}
type Logged = Pick<typeof changes.$inferSelect, 'set' | 'madeAt' | 'batch'> & {
  by: PersonId | null
  operation: OperationId
  book: typeof changes.$inferSelect.bookId
  layout: typeof changes.$inferSelect.layoutId
  kind: Operation['target']['kind']
  target: string
}

/**
 * Takes back one operation of a scope, with all of the same person's that was applied together with it. Nothing is taken back where something changed
 * since: then the answer is the conflict.
 */
export async function undoOperation(db: Db, actor: Actor, scope: Scope, operation: OperationId): Promise<Outcome> {
  const inScope = scope.kind === 'book' ? eq(changes.bookId, scope.id) : eq(changes.layoutId, scope.id)
  const [line] = await db
    .select(logged)
    .from(changes)
    .where(and(ownTeam(actor, changes.teamId), inScope, eq(changes.operationId, operation)))
  if (!line) return { kind: 'not-found' }
  const undone = await takeBack(db, actor, await togetherWith(db, actor, line))
  if (undone.kind === 'stopped') return undone.outcome
  return undone.outcomes.length === 1 ? undone.outcomes[0]! : summary(undone)
}

/** Takes back every operation of a batch of the actor's own, in whatever scopes they are, or none of them. */
export async function undoBatch(db: Db, actor: Actor, batch: string): Promise<BatchOutcome> {
  const lines = await linesOf(db, actor, personOf(actor), eq(changes.batch, batch))
  if (lines.length === 0) return { kind: 'stopped', at: 0, outcome: { kind: 'not-found' } }
  return takeBack(db, actor, lines)
}

/** One outcome for several: the last one's revision, nothing more to offer. */
function summary({ kind, outcomes }: Extract<BatchOutcome, { outcomes: unknown }>): Outcome {
  const rev = Math.max(0, ...outcomes.map((outcome) => ('rev' in outcome ? outcome.rev : 0)))
  return kind === 'proposed' ? { kind, rev } : { kind, rev, undo: null }
}

/** The line of an operation, those of its batch, and what followed from it. */
const togetherWith = (db: Db, actor: Actor, { operation, batch, by }: Logged) =>
  linesOf(
    db,
    actor,
    by,
    or(
      eq(changes.operationId, operation),
      eq(changes.batch, operation),
      batch === null ? undefined : eq(changes.batch, batch),
    ),
  )

/** Lines of one person, latest first: the name of a batch is its sender's word, and says nothing of what others sent. */
async function linesOf(db: Db, actor: Actor, by: PersonId | null, which: SQL | undefined): Promise<Logged[]> {
  return db
    .select(logged)
    .from(changes)
    .where(and(ownTeam(actor, changes.teamId), isBy(changes.byId, by), which))
    .orderBy(desc(changes.id))
}

async function takeBack(db: Db, actor: Actor, lines: readonly Logged[]): Promise<BatchOutcome> {
  const reversed = lines.map(operationOf).flatMap((operation) => undoOf(operation, operation.set) ?? [])
  if (reversed.length === 0) return { kind: 'applied', batch: '', outcomes: [{ kind: 'nothing', rev: 0 }] }
  const batch = reversed.length > 1 ? newId<string>() : undefined
  return applyBatch(db, actor, batch ? reversed.map((operation) => ({ ...operation, batch })) : reversed)
}

function operationOf({ operation, book, layout, kind, target, set, madeAt }: Logged): Operation {
  const scope: Scope | null = book ? { kind: 'book', id: book } : layout ? { kind: 'layout', id: layout } : null
  if (!scope) throw new Error('a change belongs to a book or a layout')
  return {
    id: operation,
    v: OPERATION_VERSION,
    scope,
    target: { kind, id: target },
    set,
    madeAt: madeAt.toISOString(),
  }
}

import { and, eq } from 'drizzle-orm'
import type { Actor } from '~/book/actions'
import type { PersonId, TeamId } from '~/book/ids'
import {
  type FieldChange,
  type Operation,
  type Outcome,
  type RefusalCode,
  reverseOf,
  SCOPE_OF_TARGET,
} from '~/book/operation'
import type { Db } from '../database'
import { books, layouts } from '../schema'
import { cardsForCorner, freeTies } from './consequences'
import { newId } from './new-id'
import { mayApply } from './permission'
import { addChange, addReceipt, bodyHash, findReceipts } from './receipts'
import { leavingProblems, numberTaken, referenceProblems } from './references'
import { keyOf, type LockedScope } from './scopes'
import { change, hasMaker, load, make, type Stored } from './targets'
import { compare, normalNow, normalSet, type Problem, resultProblems, type Values, valuesTo } from './values'

/** One transaction under way: its scopes are locked, and everything it writes stands or falls together. */
export interface Work {
  db: Db
  actor: Actor
  team: TeamId
  scopes: ReadonlyMap<string, LockedScope>
  /** Corners whose number or state changed, to be held against each other at the end. */
  renumbered: { scope: LockedScope; id: string }[]
}

/** Under whose name an operation is written, and what is asked first. */
export interface Manner {
  by: PersonId | null
  /** The coach who accepts it: its receipt is there already. */
  acceptedBy: PersonId | null
  /** A consequence of what was allowed already is not asked for again. */
  asked: boolean
  /** Store as a proposal even what the actor might do at once: a batch is proposed whole. */
  propose: boolean
  batch: string | null
}

const refused = (reason: RefusalCode): Outcome => ({ kind: 'refused', reason })
const invalid = (problems: readonly Problem[]): Outcome => ({ kind: 'invalid', problems })

/** Applies one operation whose frame has been checked. Anything but `applied` has written nothing of the content. */
export async function applyOne(work: Work, operation: Operation, manner: Manner): Promise<Outcome> {
  const scope = work.scopes.get(keyOf(operation.scope))
  if (!scope) return { kind: 'not-found' }
  const known = manner.acceptedBy === null ? await knownOutcome(work, operation, manner) : null
  if (known) return known
  const { kind } = operation.target
  if (SCOPE_OF_TARGET[kind] !== operation.scope.kind) return refused('unknown-target')
  const { set, problems } = normalSet(kind, operation.set, scope.length)
  if (problems.length > 0) return invalid(problems)
  const target = await findTarget(work, operation, scope, manner)
  if (!target) return { kind: 'not-found' }
  return applyTo(work, operation, manner, { scope, set, ...target })
}

/** What became of an operation that was sent before, or null for a new one. */
async function knownOutcome(work: Work, operation: Operation, { by }: Manner): Promise<Outcome | null> {
  const receipts = await findReceipts(work.db, work.team, by, operation.id)
  if (receipts.length === 0) return null
  const own = receipts.find(({ person }) => person === by)
  if (!own || own.bodyHash !== bodyHash(operation)) return refused('id-in-use')
  if (own.status === 'proposed') return { kind: 'proposed', rev: own.rev }
  return own.status === 'declined' ? refused('another-persons') : { kind: 'already-applied', rev: own.rev }
}

interface Target {
  stored: Stored | null
  now: Values
}

/** The thing an operation is about, where it is in this scope; a thing to be made is not there yet. A card is made with its corner. */
async function findTarget(
  work: Work,
  operation: Operation,
  scope: LockedScope,
  { asked }: Manner,
): Promise<Target | null> {
  const { kind, id } = operation.target
  const stored = await load(work.db, work.team, kind, id)
  if (stored && stored.scopeId !== operation.scope.id) return null
  if (!stored) {
    const { state } = operation.set
    const makes = state?.from === null && state.to === 'live'
    if (!makes || kind === 'book' || kind === 'layout' || (kind === 'card' && asked)) return null
  }
  return { stored, now: normalNow(kind, stored?.values ?? null, scope.length) }
}

interface Case extends Target {
  scope: LockedScope
  set: Record<string, FieldChange>
}

async function applyTo(work: Work, operation: Operation, manner: Manner, found: Case): Promise<Outcome> {
  const { scope, set, stored, now } = found
  const { kind, id } = operation.target
  const making = stored === null
  const madeBy = stored?.madeBy ?? null
  const answer = manner.asked
    ? await mayApply(work.db, work.team, work.actor, { kind, id, making, madeBy, set }, scope.archived)
    : ({ ok: true } as const)
  if (!answer.ok && answer.reason !== 'another-persons') return refused(answer.reason)
  const after = { ...now, ...valuesTo(set) }
  const problems = await problemsOf(work, operation, found, after, manner)
  if (problems.length > 0) return invalid(problems)
  if (!answer.ok || manner.propose) return propose(work, operation, manner, scope)

  const { written, theirs } = compare(set, now)
  if (Object.keys(theirs).length > 0) return { kind: 'conflict', rev: scope.rev, theirs }
  if (Object.keys(written).length === 0) return nothing(work, operation, manner, scope)
  return write(work, operation, manner, found, written)
}

async function problemsOf(
  work: Work,
  operation: Operation,
  { scope, stored, now }: Case,
  after: Values,
  manner: Manner,
) {
  const { kind, id } = operation.target
  const reach = { db: work.db, team: work.team, scope }
  const plain = resultProblems(kind, stored === null, now, after)
  if (plain.length > 0) return plain
  if (stored === null && manner.by === null && hasMaker(kind)) return [{ field: 'state', code: 'needs-a-person' }]
  // A book has one dry condition from its first day: all others differ from it.
  if (stored === null && manner.asked && kind === 'condition' && after.kind === 'dry')
    return [{ field: 'kind', code: 'taken' }]
  const unfound = await referenceProblems(reach, kind, now, after)
  return unfound.length > 0 ? unfound : leavingProblems(reach, kind, id, now, after)
}

async function propose(work: Work, operation: Operation, { by, batch }: Manner, scope: LockedScope): Promise<Outcome> {
  const { db, team } = work
  const receipt = { team, person: by, operation, status: 'proposed', rev: scope.rev, batch } as const
  return (await addReceipt(db, receipt)) ? { kind: 'proposed', rev: scope.rev } : refused('id-in-use')
}

async function nothing(work: Work, operation: Operation, manner: Manner, scope: LockedScope): Promise<Outcome> {
  const { by, batch, acceptedBy } = manner
  const { db, team } = work
  const receipt = { team, person: by, operation, status: 'nothing', rev: scope.rev, batch } as const
  if (acceptedBy === null && !(await addReceipt(db, receipt))) return refused('id-in-use')
  return { kind: 'nothing', rev: scope.rev }
}

async function write(
  work: Work,
  operation: Operation,
  manner: Manner,
  { scope, stored, now }: Case,
  written: Record<string, FieldChange>,
): Promise<Outcome> {
  const { db, team } = work
  const { kind, id } = operation.target
  const { by, batch, acceptedBy } = manner
  if (acceptedBy === null) {
    const receipt = { team, person: by, operation, status: 'applied', rev: scope.rev + 1, batch } as const
    if (!(await addReceipt(db, receipt))) return refused('id-in-use')
  }
  const drops = kind === 'landmark' && written.state?.to === 'dropped'
  const freed = drops ? await freeTies(db, team, operation, now, work.scopes) : []
  await applyFollowUps(work, freed, { ...manner, batch: batch ?? operation.id })

  scope.rev += 1
  if (stored) await change(db, team, kind, id, valuesTo(written))
  else await make(db, team, kind, id, operation.scope.id, by, valuesTo(written))
  const set = written
  await addChange(db, { team, by, acceptedBy, operation, set, rev: scope.rev, batch })

  if (kind === 'corner') work.renumbered.push({ scope, id })
  if (kind === 'corner' && written.state?.to === 'live') {
    await applyFollowUps(work, await cardsForCorner(db, team, operation, scope), { ...manner, batch: null })
  }
  return { kind: 'applied', rev: scope.rev, undo: freed.length > 0 ? null : undoOf(operation, written) }
}

/** Writes what follows from an operation; that it cannot be written is a mistake of this program. */
async function applyFollowUps(work: Work, operations: readonly Operation[], manner: Manner) {
  for (const operation of operations) {
    const outcome = await applyOne(work, operation, { ...manner, acceptedBy: null, asked: false, propose: false })
    if (outcome.kind !== 'applied') throw new Error(`a consequence was not applied: ${outcome.kind}`)
  }
}

/** The operation that takes one back. Things are never unmade: taking back the making drops the thing; a card stays. */
export function undoOf(operation: Operation, written: Record<string, FieldChange>): Operation | null {
  const reverse = reverseOf({ ...operation, set: written }, newId(), new Date().toISOString())
  if (written.state?.from !== null) return reverse
  return operation.target.kind === 'card' ? null : { ...reverse, set: { state: { from: 'live', to: 'dropped' } } }
}

/** Thrown to undo everything a transaction wrote; carries what to answer instead. */
export class Stopped extends Error {
  constructor(readonly outcome: Outcome) {
    super('the transaction is taken back')
  }
}

/** Last checks of a transaction and the new revisions of its scopes. */
export async function finish(work: Work, before: ReadonlyMap<string, number>): Promise<void> {
  for (const { scope, id } of work.renumbered) {
    const stored = await load(work.db, work.team, 'corner', id)
    if (stored?.values.state !== 'live') continue
    const taken = await numberTaken(work.db, work.team, scope, id, stored.values.number ?? null)
    if (taken) throw new Stopped(invalid([{ field: 'number', code: 'taken' }]))
  }
  for (const [key, { scope, rev }] of work.scopes) {
    if (rev === before.get(key)) continue
    if (scope.kind === 'book')
      await work.db
        .update(books)
        .set({ rev })
        .where(and(eq(books.teamId, work.team), eq(books.id, scope.id)))
    else
      await work.db
        .update(layouts)
        .set({ rev })
        .where(and(eq(layouts.teamId, work.team), eq(layouts.id, scope.id)))
  }
}

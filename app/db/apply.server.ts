import type { Actor } from '~/book/actions'
import { OPERATION_VERSION, type Operation, type Outcome } from '~/book/operation'
import { operationSchema } from '~/book/schemas'
import { applyOne, finish, type Manner, Stopped, type Work } from './apply/engine'
import { newId } from './apply/new-id'
import { lockScopes } from './apply/scopes'
import { isSensibleInstant } from './checks'
import type { Db } from './database'
import { personOf } from './own-team'
import { isStorable } from './storable'

/** What became of a batch: all of it, or nothing of it and the first operation that could not be. */
export type BatchOutcome =
  | { kind: 'applied' | 'proposed'; batch: string; outcomes: Outcome[] }
  | { kind: 'stopped'; at: number; outcome: Outcome }

/**
 * The one write of a team's shared content. In one transaction: locks the scope, answers what it has seen before, checks every
 * field and the actor's right, holds each field against what is now, writes all of the operation or nothing of it, adds a line to
 * the change log. What a driver may not change at once becomes a proposal.
 * @param input an operation as it came, unchecked
 */
export async function applyOperation(db: Db, actor: Actor, input: unknown): Promise<Outcome> {
  const operation = readOperation(input)
  if ('kind' in operation) return operation
  return transact(db, actor, [operation], async (work) => {
    const manner = { ...plainly(actor), batch: operation.batch ?? null }
    return applyOne(work, operation, manner)
  })
}

/**
 * Applies operations in their order, all or none; they are undone together. Where one of them touches what another person made,
 * the whole batch becomes a proposal.
 * @param inputs operations as they came, unchecked; without a `batch` of their own they get one
 */
export async function applyBatch(db: Db, actor: Actor, inputs: readonly unknown[]): Promise<BatchOutcome> {
  const operations: Operation[] = []
  for (const [at, input] of inputs.entries()) {
    const operation = readOperation(input)
    if ('kind' in operation) return { kind: 'stopped', at, outcome: operation }
    operations.push(operation)
  }
  const batch = operations.find((operation) => operation.batch)?.batch ?? newId<string>()
  const manner = { ...plainly(actor), batch }
  const applied = await applyAll(db, actor, operations, manner)
  const proposes = applied.kind === 'stopped' && applied.outcome.kind === 'proposed'
  return proposes ? applyAll(db, actor, operations, { ...manner, propose: true }) : applied
}

const plainly = (actor: Actor): Omit<Manner, 'batch'> => ({
  by: personOf(actor),
  acceptedBy: null,
  asked: true,
  propose: false,
})

const GOES_ON: Record<'apply' | 'propose', readonly Outcome['kind'][]> = {
  apply: ['applied', 'already-applied', 'nothing'],
  propose: ['proposed'],
}

/** All of these in one transaction, or nothing and where it stopped. */
export async function applyAll(
  db: Db,
  actor: Actor,
  operations: readonly Operation[],
  manner: Manner,
): Promise<BatchOutcome> {
  const goesOn = GOES_ON[manner.propose ? 'propose' : 'apply']
  const outcomes: Outcome[] = []
  let at = 0
  const last = await transact(db, actor, operations, async (work) => {
    for (const operation of operations) {
      at = outcomes.length
      const outcome = await applyOne(work, operation, manner)
      if (!goesOn.includes(outcome.kind)) throw new Stopped(outcome)
      outcomes.push(outcome)
    }
    return null
  })
  if (last) return { kind: 'stopped', at, outcome: last }
  return { kind: manner.propose ? 'proposed' : 'applied', batch: manner.batch ?? '', outcomes }
}

/** Runs work under the locks of its operations' scopes. A `Stopped` takes everything back and is the answer. */
async function transact<Answer>(
  db: Db,
  actor: Actor,
  operations: readonly Operation[],
  run: (work: Work) => Promise<Answer>,
): Promise<Answer | Outcome> {
  if (actor.kind === 'stranger') return { kind: 'refused', reason: 'not-a-member' }
  try {
    return await db.transaction(async (tx) => {
      const scopes = await lockScopes(tx, actor, operations)
      const before = new Map([...scopes].map(([key, { rev }]) => [key, rev]))
      const work: Work = { db: tx, actor, team: actor.team, scopes, renumbered: [] }
      const answer = await run(work)
      await finish(work, before)
      return answer
    })
  } catch (error) {
    if (error instanceof Stopped) return error.outcome
    throw error
  }
}

/** The operation in what came, or why it is none. A newer version is named as such, not as a mistake. */
function readOperation(input: unknown): Operation | Outcome {
  const version = (input as { v?: unknown } | null | undefined)?.v
  if (typeof version === 'number' && version > OPERATION_VERSION) return { kind: 'refused', reason: 'newer-version' }
  if (!isStorable(input)) return { kind: 'invalid', problems: [{ field: '', code: 'not-storable' }] }
  const parsed = operationSchema.safeParse(input)
  if (parsed.success) {
    if (isSensibleInstant(parsed.data.madeAt)) return parsed.data as Operation
    return { kind: 'invalid', problems: [{ field: 'madeAt', code: 'out-of-range' }] }
  }
  const problems = parsed.error.issues.map(({ path, code }) => ({ field: path.join('.'), code }))
  return { kind: 'invalid', problems }
}

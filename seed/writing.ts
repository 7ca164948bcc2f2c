import type { Actor } from '~/book/actions'
import { type Json, OPERATION_VERSION, type Operation, type Scope } from '~/book/operation'
import { newId } from '~/db/apply/new-id'
import { applyBatch } from '~/db/apply.server'
import type { Db } from '~/db/database'

/** The operation that makes a thing. Fields that are null are left out. */
export function making(
  scope: Scope,
  target: Operation['target'],
  fields: Record<string, Json>,
  madeAt: string,
): Operation {
  return setting(scope, target, { state: 'live', ...fields }, madeAt)
}

/** The operation that fills empty fields of a thing. */
export function setting(
  scope: Scope,
  target: Operation['target'],
  fields: Record<string, Json>,
  madeAt: string,
): Operation {
  const given = Object.entries(fields).filter(([, value]) => value !== null)
  const set = Object.fromEntries(given.map(([field, to]) => [field, { from: null, to }]))
  return { id: newId(), v: OPERATION_VERSION, scope, target, set, madeAt }
}

/** Applies operations together; whatever is not applied is a mistake of the demo. */
export async function applyTogether(db: Db, actor: Actor, operations: readonly Operation[]): Promise<void> {
  if (operations.length === 0) return
  const outcome = await applyBatch(db, actor, operations)
  if (outcome.kind === 'stopped')
    throw new Error(`demo operation ${outcome.at} was not applied: ${JSON.stringify(outcome.outcome)}`)
  if (outcome.kind === 'proposed') throw new Error('the demo only writes what its people may write')
}

/** What a command made; whatever else it answers is a mistake of the demo. */
export function made<Outcome extends { kind: string }>(outcome: Outcome): Extract<Outcome, { kind: 'made' }> {
  if (outcome.kind !== 'made') throw new Error(`the demo was refused: ${JSON.stringify(outcome)}`)
  return outcome as Extract<Outcome, { kind: 'made' }>
}

/** Items by what they have in common, in the order in which each first occurs. */
export function groupsBy<Item>(items: readonly Item[], keyOf: (item: Item) => string): Map<string, Item[]> {
  const groups = new Map<string, Item[]>()
  for (const item of items) groups.set(keyOf(item), [...(groups.get(keyOf(item)) ?? []), item])
  return groups
}

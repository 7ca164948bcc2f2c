import type { Action, Actor, Answer, Facts } from './actions'
import { MATRIX, READS } from './matrix'

/**
 * The one answer to "may this actor do that". Asked by every loader, action and API route; the same answer disables the button
 * and refuses the request. A stranger may nothing; nobody writes in an archived book; a job may all the rest for its team.
 */
export function may(actor: Actor, action: Action, facts: Facts = {}): Answer {
  if (actor.kind === 'stranger') return { ok: false, reason: 'not-a-member' }
  if (facts.archived && !READS.has(action) && action !== 'book.archive') return { ok: false, reason: 'read-only' }
  if (actor.kind === 'job') return { ok: true }
  const grant = MATRIX[action][actor.role]
  if (grant === 'yes') return { ok: true }
  if (grant === 'no') return { ok: false, reason: 'role' }
  return facts.madeBy === actor.person ? { ok: true } : { ok: false, reason: 'another-persons' }
}

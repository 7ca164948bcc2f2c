import { data } from 'react-router'
import type { Action, Actor, Facts, Reason } from '~/book/actions'
import { may } from '~/book/may'
import { type Params, type ProblemCode, problem } from '~/words/problems'

/** An answer to throw where a request is refused: its status and its words go to the nearest error page. */
export function refusal(code: ProblemCode, params: Params = {}) {
  const answer = problem(code, params)
  return data(answer, { status: answer.status })
}

/** Lets the actor on, or throws the refusal. */
export function allow(actor: Actor, action: Action, facts: Facts = {}): void {
  const answer = may(actor, action, facts)
  if (!answer.ok) throw refusal(answer.reason)
}

/** The refusal for a command that did nothing. What was invalid belongs at the form's fields and is no refusal. */
export function refusalOf(declined: { kind: string; reason?: Reason }) {
  if (declined.kind === 'refused' && declined.reason) return refusal(declined.reason)
  return refusal(declined.kind === 'not-found' ? 'not-found' : 'form')
}

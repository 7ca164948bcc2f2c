import type { Json, Operation, Outcome } from '~/book/operation'
import { metres } from '~/track/units'
import { circuitWords as words } from '~/words/circuits'
import { formatMetres } from '~/words/measures'
import { problem } from '~/words/problems'
import type { LayoutAsk } from './layout-ask'
import { type Choice, type LayoutActionData, type LayoutCorner, type LayoutOutcome, typedAgain } from './layout-data'

/** What became of the operations of an ask: all of them done, or the first that could not be. */
export type Applied =
  | { kind: 'applied' | 'proposed'; batch: string; outcomes: readonly Outcome[] }
  | { kind: 'stopped'; at: number; outcome: Outcome }

/** The answer to an ask: what the page says of it, and the HTTP status. */
export interface LayoutAnswer {
  status: number
  sent: Omit<LayoutActionData, 'id'>
}

type Change = Extract<LayoutAsk, { kind: 'change' }>

/** A form that does not fit goes back as it was typed. */
export function wrongAnswer(ask: Extract<LayoutAsk, { kind: 'wrong' }>, now: readonly LayoutCorner[]): LayoutAnswer {
  return { status: problem('form').status, sent: { form: ask.form, outcome: null, lastResult: typed(ask, now, null) } }
}

/** What was typed, once more; errors where there are some. */
function typed(
  ask: Pick<Change, 'form' | 'submission'>,
  now: readonly LayoutCorner[],
  shown: string | null,
  errors = {},
) {
  const reply = ask.submission.reply(errors)
  if (ask.form === 'way') return reply
  const corners = typedAgain(ask.submission.payload.corners, now, shown).map((row) => ({ ...row }))
  return { ...reply, initialValue: { corners } }
}

/**
 * What became of a change.
 * @param now the corners as they are after it
 */
export function changeAnswer(ask: Change, applied: Applied, now: readonly LayoutCorner[]): LayoutAnswer {
  const { form, operations } = ask
  const done = (outcome: LayoutOutcome): LayoutAnswer => ({ status: 200, sent: { form, outcome, lastResult: null } })
  if (applied.kind !== 'stopped') {
    const changed = applied.outcomes.filter(({ kind }) => kind === 'applied').length
    if (changed === 0) return done({ kind: 'done', words: words.nothing, undo: null })
    const undo = operations.length === 1 ? { operation: operations[0]?.id ?? '' } : { batch: applied.batch }
    return done({ kind: 'done', words: words.keptCorners(changed), undo })
  }
  const operation = operations[applied.at]
  const { outcome } = applied
  if (outcome.kind === 'conflict' && operation) return conflict(ask, operation, outcome.theirs, now)
  if (outcome.kind === 'invalid' && operation) return invalid(ask, operation, now)
  const { status, text } = problem(outcome.kind === 'refused' ? outcome.reason : 'unknown-target')
  const refused = { kind: 'refused', words: text } as const
  return { status, sent: { form, outcome: refused, lastResult: typed(ask, now, null) } }
}

function conflict(
  ask: Change,
  operation: Operation,
  theirs: Record<string, Json>,
  now: readonly LayoutCorner[],
): LayoutAnswer {
  const corner = now.find(({ id }) => id === operation.target.id)
  const choices = Object.entries(theirs).map(([field, value]) => choice(field, value, operation.set[field]?.to ?? null))
  const title = corner ? words.conflictIn(corner.number, corner.name) : words.conflict
  const outcome: LayoutOutcome = corner
    ? { kind: 'conflict', form: 'corners', corner: corner.id, title, choices }
    : { kind: 'conflict', form: 'way', title, choices, again: startAgain(operation, theirs) }
  const lastResult = typed(ask, now, corner?.id ?? null)
  return { status: problem('conflict').status, sent: { form: ask.form, outcome, lastResult } }
}

/** What sends the start line once more, over what the other made of it. */
const startAgain = (operation: Operation, theirs: Record<string, Json>) => ({
  startAlong: Number(operation.set.startAlong?.to ?? 0),
  seenStart: Number(theirs.startAlong ?? 0),
})

const FIELDS: Record<string, string> = { number: words.columns.number, name: words.columns.name }

function choice(field: string, theirs: Json, mine: Json): Choice {
  if (field === 'startAlong') return { field: words.startLine, theirs: alongWords(theirs), mine: alongWords(mine) }
  return { field: FIELDS[field] ?? field, theirs: String(theirs ?? ''), mine: String(mine ?? '') }
}
const alongWords = (value: Json) => words.startAt(formatMetres(metres(Number(value))))

/** The one thing the form itself does not see: a number that another gave meanwhile. */
function invalid(ask: Change, operation: Operation, now: readonly LayoutCorner[]): LayoutAnswer {
  const number = String(operation.set.number?.to ?? '')
  const at = now.findIndex(({ id }) => id === operation.target.id)
  const fieldErrors = { [`corners[${at}].number`]: [words.numberTwice(number)] }
  return {
    status: problem('form').status,
    sent: { form: ask.form, outcome: null, lastResult: typed(ask, now, null, { fieldErrors }) },
  }
}

/** What became of an undo. */
export function undoAnswer(outcome: Outcome | Extract<Applied, { kind: 'applied' | 'proposed' }>): LayoutAnswer {
  const answer = (status: number, said: LayoutOutcome): LayoutAnswer => ({
    status,
    sent: { form: 'undo', outcome: said, lastResult: null },
  })
  if (outcome.kind === 'conflict') {
    return answer(problem('conflict').status, { kind: 'refused', words: words.undoConflict })
  }
  if (outcome.kind === 'refused' || outcome.kind === 'invalid' || outcome.kind === 'not-found') {
    const { status, text } = problem(outcome.kind === 'refused' ? outcome.reason : 'unknown-target')
    return answer(status, { kind: 'refused', words: text })
  }
  return answer(200, { kind: 'done', words: words.undone, undo: null })
}

import type { SeenMark } from '~/book/edits'
import type { ConditionId, MarkId, PersonId } from '~/book/ids'
import type { MarkIntent, Typed } from '~/book/intents'
import { type CornerIntent, kindOfChoice } from './mark-forms'

type MarkForm = Extract<CornerIntent, { intent: MarkIntent['intent'] }>

/** What a form that was read without fault asks of a mark. */
export function markIntent(form: MarkForm, me: PersonId): MarkIntent {
  if (form.intent === 'drop') return { intent: 'drop', mark: form.mark as MarkId }
  if (form.intent === 'change')
    return { intent: 'change', mark: form.mark as MarkId, seen: form.seen as SeenMark, typed: typedOf(form) }
  const forPerson = form.whose === 'me' ? me : null
  return {
    intent: 'add',
    mark: {
      id: form.mark as MarkId,
      ...kindOfChoice(form.kind),
      condition: form.condition as ConditionId,
      forPerson,
    },
    typed: typedOf(form),
  }
}

function typedOf(form: Extract<MarkForm, { intent: 'add' | 'change' }>): Typed {
  const { ground, metres, side, across, hand } = form
  return {
    ground,
    metres,
    side,
    across,
    hand,
    manner: form.manner ?? null,
    gear: form.gear ?? null,
    speedKmh: form.speed ?? null,
  }
}

import type { SeenMark } from '~/book/edits'
import type { ConditionId, MarkId, PersonId } from '~/book/ids'
import type { MarkIntent, Typed } from '~/book/intents'
import { type CornerIntent, kindOfChoice } from './mark-forms'
import type { Asked } from './result'

type MarkForm = Extract<CornerIntent, { intent: MarkIntent['intent'] }>

/** What a form that was read without fault asks of a mark; null where it takes away a place that is not there. */
export function markIntent(form: MarkForm, me: PersonId): MarkIntent | null {
  const mark = form.mark as MarkId
  if (form.intent === 'drop') return { intent: 'drop', mark }
  if (form.intent === 'clear') {
    const { place } = form.seen as SeenMark
    return place && { intent: 'clear', mark, ground: form.ground, seen: place }
  }
  if (form.intent === 'change')
    return { intent: 'change', mark, seen: form.seen as SeenMark, typed: typedOf(form, isMoved(form)) }
  const forPerson = form.whose === 'me' ? me : null
  const kind = kindOfChoice(form.kind)
  return {
    intent: 'add',
    mark: { id: mark, ...kind, condition: form.condition as ConditionId, forPerson },
    typed: typedOf(form, true),
  }
}

/** What the answer to a form is told by. */
export function askedBy(form: MarkForm): Asked {
  const mark = form.mark as MarkId
  if (form.intent === 'drop') return { intent: 'drop', mark }
  if (form.intent !== 'add') return { intent: form.intent, mark, ground: form.ground }
  return { intent: 'add', mark: { ...kindOfChoice(form.kind), gear: form.gear ?? null }, ground: form.ground }
}

/** Whether the place is another than its fields showed. */
function isMoved({ shown, metres, side, across, hand }: Extract<MarkForm, { intent: 'change' }>): boolean {
  if (!shown) return true
  const same = Number(shown.metres) === metres && shown.side === side
  return !(same && Number(shown.across) === across && shown.hand === hand)
}

function typedOf(form: Extract<MarkForm, { intent: 'add' | 'change' }>, moved: boolean): Typed {
  const { ground, metres, side, across, hand } = form
  return {
    ground,
    metres,
    side,
    across,
    hand,
    moved,
    manner: form.manner ?? null,
    gear: form.gear ?? null,
    speedKmh: form.speed ?? null,
  }
}

import type { LapFrame } from '~/track/lap-frame'
import {
  addMark,
  changeMark,
  clearPlace,
  dropMark,
  type Making,
  type NewMark,
  type SeenMark,
  typedPlace,
} from './edits'
import type { MarkId } from './ids'
import type { Ground, Manner } from './kinds'
import type { Operation } from './operation'
import type { Place } from './place'
import type { CornerView } from './view'

/** Where a person puts a mark, as he types it. */
export interface Typed {
  ground: Ground
  metres: number
  side: 'before' | 'after'
  /** Metres from the middle of the road. */
  across: number
  hand: 'left' | 'right'
  /** Whether the place is another than the form showed; if not, it stays as it is stored, with its tie. */
  moved: boolean
  manner: Manner | null
  gear: number | null
  speedKmh: number | null
}

export type MarkIntent =
  | { intent: 'add'; mark: Pick<NewMark, 'id' | 'kind' | 'role' | 'condition' | 'forPerson'>; typed: Typed }
  | { intent: 'change'; mark: MarkId; seen: SeenMark; typed: Typed }
  | { intent: 'clear'; mark: MarkId; ground: Ground; seen: Place }
  | { intent: 'drop'; mark: MarkId }

/** The operation of an intent on one corner; null where it would change nothing. */
export function operationOf(intent: MarkIntent, making: Making, corner: CornerView, frame: LapFrame): Operation | null {
  if (intent.intent === 'drop') return dropMark(making, intent.mark)
  if (intent.intent === 'clear') return clearPlace(making, intent.mark, intent.ground, intent.seen)
  const { typed } = intent
  const at = typedPlace(corner.datum.station, typed, frame)
  const details = { manner: typed.manner, gear: typed.gear, speed: speedOf(typed.speedKmh) }
  if (intent.intent === 'add')
    return addMark(making, { ...intent.mark, ...details, card: corner.card.id, ground: typed.ground, at }, frame)
  return changeMark(making, intent.mark, typed.ground, intent.seen, typed.moved ? { ...details, at } : details, frame)
}

/** m/s on the grid of 0.1 km/h on which speeds are stored, so that an untouched speed equals the one that was seen. */
const speedOf = (kmh: number | null) => (kmh === null ? null : Math.round(kmh * 10) / 36)

import { type LapFrame, wrap } from '~/track/lap-frame'
import { type Offset, offset, type Station, station, toMillimetre } from '~/track/units'
import type { CardId, ConditionId, MarkId, OperationId, PersonId } from './ids'
import type { BrakeRole, Ground, Manner, MarkKind } from './kinds'
import type { FieldChange, Json, Operation, Scope } from './operation'
import { OPERATION_VERSION } from './operation'
import type { Place } from './place'

/** What a person does on a page, turned into operations. Ids and the instant come from whoever does it. */

export interface Making {
  id: OperationId
  madeAt: string
  scope: Scope
}

/** A place as a person gives it. */
export interface GivenPlace {
  station: Station
  offset: Offset
}

export interface NewMark {
  id: MarkId
  card: CardId
  kind: MarkKind
  role: BrakeRole | null
  manner: Manner | null
  condition: ConditionId
  forPerson: PersonId | null
  gear: number | null
  /** m/s */
  speed: number | null
  ground: Ground
  at: GivenPlace
}

/** Adds a mark with one place. */
export function addMark(making: Making, mark: NewMark, frame: LapFrame): Operation {
  const fields: Record<string, Json> = {
    state: 'live',
    cardId: mark.card,
    kind: mark.kind,
    conditionId: mark.condition,
    [mark.ground]: storedPlace(mark.at, null, frame),
  }
  const optional = {
    role: mark.role,
    manner: mark.manner,
    forPerson: mark.forPerson,
    gear: mark.gear,
    speed: mark.speed,
  }
  for (const [field, value] of Object.entries(optional)) if (value !== null) fields[field] = value
  return operation(making, mark.id, fromNothing(fields))
}

/** What a person saw of a mark when he began to change it: the values an operation starts from. */
export interface SeenMark {
  /** The place on the ground he changes, null where the mark had none there. */
  place: Place | null
  manner: Manner | null
  gear: number | null
  /** m/s */
  speed: number | null
}

/** What he leaves it at. A place that was not touched is left out. */
export interface GivenMark extends Omit<SeenMark, 'place'> {
  at?: GivenPlace
}

/** Changes one place of a mark and what goes with it; null where nothing differs from what was seen. */
export function changeMark(
  making: Making,
  mark: MarkId,
  ground: Ground,
  seen: SeenMark,
  given: GivenMark,
  frame: LapFrame,
): Operation | null {
  const set: Record<string, FieldChange> = {}
  if (given.at) {
    const to = storedPlace(given.at, tieAfter(seen.place, given.at, frame), frame)
    if (!samePlace(seen.place, to)) set[ground] = { from: asJson(seen.place), to }
  }
  for (const field of ['manner', 'gear', 'speed'] as const)
    if (seen[field] !== given[field]) set[field] = { from: seen[field], to: given[field] }
  return Object.keys(set).length === 0 ? null : operation(making, mark, set)
}

/** Moved by more than this along the road, a mark no longer stands at the thing it was tied to; across, at its line. Metres. */
const TIE_REACH = { along: 1, across: 0.25 } as const

/**
 * What is left of a tie when its place is put elsewhere by hand: never the landmark's measure; its words as long as the mark
 * still stands where they say.
 */
function tieAfter(seen: Place | null, at: GivenPlace, frame: LapFrame): Place['tie'] {
  if (!seen?.tie || Math.abs(frame.gap(frame.toStation(seen.along), at.station)) > TIE_REACH.along) return null
  const stays = Math.abs(frame.toOffset(seen.across) - at.offset) <= TIE_REACH.across
  return { ...seen.tie, along: null, ...(stays ? {} : { across: null, acrossWords: null }) }
}

/** Takes one of a mark's two places away. */
export function clearPlace(making: Making, mark: MarkId, ground: Ground, seen: Place): Operation {
  return operation(making, mark, { [ground]: { from: asJson(seen), to: null } })
}

/** Takes a mark off the book; it can be taken back. */
export function dropMark(making: Making, mark: MarkId): Operation {
  return operation(making, mark, { state: { from: 'live', to: 'dropped' } })
}

/** A place nudged along the road (forward positive) and across it (left positive), in metres. */
export function nudged(place: GivenPlace, by: { ahead: number; left: number }, frame: LapFrame): GivenPlace {
  return { station: station(wrap(place.station + by.ahead, frame.length)), offset: offset(place.offset + by.left) }
}

/** The place of typed metres before or after the datum and left or right of the middle of the road. */
export function typedPlace(
  datum: Station,
  typed: { metres: number; side: 'before' | 'after'; across: number; hand: 'left' | 'right' },
  frame: Pick<LapFrame, 'length'>,
): GivenPlace {
  const signed = typed.side === 'before' ? -typed.metres : typed.metres
  return {
    station: station(wrap(datum + signed, frame.length)),
    offset: offset(typed.hand === 'left' ? typed.across : -typed.across),
  }
}

function storedPlace(at: GivenPlace, tie: Place['tie'], frame: LapFrame) {
  return asJson({ along: frame.toAlong(at.station), across: frame.toAcross(at.offset), tie })
}

const samePlace = (seen: Place | null, to: { along: number; across: number }) =>
  seen !== null && toMillimetre(seen.along) === to.along && toMillimetre(seen.across) === to.across

type StoredPlace = { along: number; across: number; tie: Json }

function asJson(place: Place): StoredPlace
function asJson(place: Place | null): StoredPlace | null
function asJson(place: Place | null): StoredPlace | null {
  return place && { along: toMillimetre(place.along), across: toMillimetre(place.across), tie: place.tie as Json }
}

function fromNothing(fields: Record<string, Json>): Record<string, FieldChange> {
  return Object.fromEntries(Object.entries(fields).map(([field, to]) => [field, { from: null, to }]))
}

function operation(making: Making, mark: MarkId, set: Record<string, FieldChange>): Operation {
  return { ...making, v: OPERATION_VERSION, target: { kind: 'mark', id: mark }, set }
}

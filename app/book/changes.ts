import { type LapFrame, makeLapFrame } from '~/track/lap-frame'
import { type Along, along, type Metres, metres } from '~/track/units'
import type { CornerId, OperationId, PersonId } from './ids'
import { type BrakeRole, GROUNDS, type Ground, type MarkKind, type TurnDirection } from './kinds'
import type { FieldChange, Json, TargetKind } from './operation'
import type { BookView, CornerView } from './view'

/** A line of the change log, as far as it takes to tell it. */
export interface LoggedChange {
  operation: OperationId
  target: { kind: TargetKind; id: string }
  set: Record<string, FieldChange>
  reason: string | null
  undoes: OperationId | null
  batch: string | null
  by: PersonId | null
}

/** What a change did. `ahead` is metres along the road in the direction of travel, `left` across it. */
export type Deed =
  | { deed: 'added' | 'dropped' | 'restored' | 'archived' | 'merged' | 'undone' | 'renamed' }
  | { deed: 'moved'; ground: Ground; ahead: Metres; left: Metres }
  | { deed: 'placed' | 'cleared' | 'tied'; ground: Ground }
  | { deed: 'set'; set: Record<string, Json> }

/** A change ready to be put into words. */
export interface ToldChange {
  operation: OperationId
  by: PersonId | null
  reason: string | null
  corner: Pick<CornerView, 'number' | 'name' | 'direction'> | null
  thing:
    | { kind: 'mark'; mark: MarkKind; role: BrakeRole | null; gear: number | null }
    | { kind: 'landmark' | 'stretch' | 'condition'; name: string }
    | { kind: 'card' | 'corner' | 'book' | 'layout' }
  what: Deed
  /** How many changes were made together, this one among them; and whether all of them did the same to the same kind of thing. */
  count: number
  alike: boolean
}

/**
 * Changes worth telling, in the order given. What comes with a book or a corner by itself (a new card, a first condition) is
 * left out; changes made together are told as one.
 * @param changes latest first; what was dropped is named by the lines among them that made it
 */
export function tellChanges(changes: readonly LoggedChange[], view: BookView): ToldChange[] {
  const { length, startAlong, reversed } = view.layout
  const frame = makeLapFrame({ length, startAlong: along(startAlong), reversed })
  const known = knownThings(changes, view)
  const told = new Map<string, ToldChange>()
  for (const { operation, by, reason, batch, target, set, undoes } of changes) {
    const what = deedOf({ target, set, undoes }, frame)
    const found = known.get(target.id)
    if (!what || !found) continue
    const key = batch ? `${batch} ${by}` : operation
    const change = { operation, by, reason, what, count: 1, alike: true, ...found }
    const other = told.get(key)
    told.set(key, other ? together(other, change) : change)
  }
  return [...told.values()]
}

/** Two changes made together as one: the first speaks, of a corner only where both are of it. */
function together(first: ToldChange, other: ToldChange): ToldChange {
  const same = first.thing.kind === other.thing.kind && first.what.deed === other.what.deed
  const inOneCorner = first.corner?.number === other.corner?.number
  return {
    ...first,
    corner: inOneCorner ? first.corner : null,
    reason: first.reason === other.reason ? first.reason : null,
    count: first.count + 1,
    alike: first.alike && same,
  }
}

type Known = Pick<ToldChange, 'corner' | 'thing'>

/** Everything of the book by id, dropped marks too as far as the changes tell of them. */
function knownThings(changes: readonly LoggedChange[], view: BookView): Map<string, Known> {
  const known = new Map<string, Known>()
  const byCard = new Map<string, CornerView>(view.corners.map((corner) => [corner.card.id, corner]))
  const corners = new Map<CornerId, CornerView>(view.corners.map((corner) => [corner.id, corner]))
  for (const { target, set } of changes) {
    if (target.kind !== 'mark' || !set.kind) continue
    const thing = {
      kind: 'mark',
      mark: set.kind.to as MarkKind,
      role: (set.role?.to ?? null) as BrakeRole | null,
      gear: (set.gear?.to ?? null) as number | null,
    } as const
    known.set(target.id, { corner: byCard.get(String(set.cardId?.to)) ?? null, thing })
  }
  for (const corner of view.corners) {
    known.set(corner.id, { corner, thing: { kind: 'corner' } })
    known.set(corner.card.id, { corner, thing: { kind: 'card' } })
    for (const { id, kind, role, gear } of corner.marks)
      known.set(id, { corner, thing: { kind: 'mark', mark: kind, role, gear } })
  }
  for (const { id, name, corner } of view.landmarks)
    known.set(id, { corner: (corner && corners.get(corner)) ?? null, thing: { kind: 'landmark', name } })
  for (const { id, name } of view.stretches) known.set(id, { corner: null, thing: { kind: 'stretch', name } })
  for (const { id, name } of view.conditions) known.set(id, { corner: null, thing: { kind: 'condition', name } })
  known.set(view.book.id, { corner: null, thing: { kind: 'book' } })
  known.set(view.layout.id, { corner: null, thing: { kind: 'layout' } })
  return new Map(
    [...known].map(([id, { corner, thing }]) => [id, { corner: corner && cornerOf(corner), thing }] as const),
  )
}

const cornerOf = ({ number, name, direction }: { number: string; name: string; direction: TurnDirection }) => ({
  number,
  name,
  direction,
})

/** Kinds of which the making goes without saying. */
const SILENT: readonly TargetKind[] = ['card', 'condition', 'corner', 'book', 'layout']

function deedOf(
  { target, set, undoes }: Pick<LoggedChange, 'target' | 'set' | 'undoes'>,
  frame: LapFrame,
): Deed | null {
  if (set.state) return stateDeed(target.kind, set.state)
  if (undoes) return { deed: 'undone' }
  for (const ground of GROUNDS) {
    const change = set[ground]
    if (change) return placeDeed(ground, change, frame)
  }
  if (set.name || set.number) return { deed: 'renamed' }
  const values = Object.entries(set).map(([field, { to }]) => [field, to] as const)
  return values.length > 0 ? { deed: 'set', set: Object.fromEntries(values) } : null
}

function stateDeed(kind: TargetKind, { from, to }: FieldChange): Deed | null {
  if (from === null) return SILENT.includes(kind) ? null : { deed: 'added' }
  if (to === 'live') return { deed: 'restored' }
  return { deed: to === 'archived' || to === 'merged' ? to : 'dropped' }
}

function placeDeed(ground: Ground, { from, to }: FieldChange, frame: LapFrame): Deed {
  const before = placeIn(from)
  const after = placeIn(to)
  if (!after) return { deed: 'cleared', ground }
  if (!before) return { deed: 'placed', ground }
  const ahead = frame.gap(frame.toStation(before.along), frame.toStation(after.along))
  const left = (after.across - before.across) * (frame.reversed ? -1 : 1)
  if (ahead === 0 && left === 0) return { deed: 'tied', ground }
  return { deed: 'moved', ground, ahead, left: metres(left) }
}

function placeIn(value: Json): { along: Along; across: number } | null {
  if (typeof value !== 'object' || value === null || !('along' in value)) return null
  const { along: at, across } = value as { along: number; across?: number | null }
  return { along: along(at), across: across ?? 0 }
}

import type { LandmarkKind } from '~/book/kinds'
import type { GroundChoice, LandmarkView, PlacementView } from '~/book/view'
import type { Point, Shape } from '~/draw/display-list'
import { overlap } from '~/draw/lines'
import { type Projection, sheetBox } from '~/draw/projection'
import type { Road } from '~/draw/road'
import type { Reader } from '~/draw/text-styles'
import { station } from '~/track/units'

/** A landmark where it stands on one ground. `sim` marks a place that only the simulator has: drawn hollow and dashed. */
export interface Thing {
  landmark: LandmarkView
  placement: PlacementView
  sim: boolean
}

/** Two placements nearer than this along and across are one, metres. */
const SAME = 0.5

function differs(a: PlacementView, b: PlacementView): boolean {
  const far = (one: number | null, other: number | null) => Math.abs((one ?? 0) - (other ?? 0)) > SAME
  return far(a.station, b.station) || far(a.until, b.until) || far(a.offset, b.offset) || far(a.offsetTo, b.offsetTo)
}

/** The landmarks of the grounds a reader looks at; one that stands alike on both is one real thing. */
export function thingsOf(landmarks: readonly LandmarkView[], show: GroundChoice): Thing[] {
  return landmarks.flatMap((landmark) => {
    const { real, sim } = landmark
    const own = sim && (!real || differs(real, sim)) ? [{ landmark, placement: sim, sim: true }] : []
    if (show === 'sim') return own.length > 0 ? own : sim && real ? [{ landmark, placement: real, sim: false }] : []
    const there = real ? [{ landmark, placement: real, sim: false }] : []
    return show === 'both' ? [...own, ...there] : there
  })
}

/** Where a thing stands in px: its own offset, or the road's middle. */
export const placeOf = ({ placement }: Thing, road: Road, projection: Projection): Point =>
  projection.toPx(road.at(placement.station, placement.offset ?? 0))

/** Things that come near the picture. */
export function thingsIn(things: readonly Thing[], road: Road, projection: Projection): Thing[] {
  const box = sheetBox(projection, 40)
  return things.filter((thing) => {
    const ends = [thing.placement.station, thing.placement.until ?? thing.placement.station]
    return ends.some((at) => {
      const [x, y] = projection.toPx(road.at(at, thing.placement.offset ?? 0))
      return overlap({ x, y, width: 0, height: 0 }, box)
    })
  })
}

/** How one kind of thing is drawn. */
export type Draw = (thing: Thing, road: Road, projection: Projection, reader: Reader) => Shape[]

/** Things of the kinds a table knows, in the order of the table. */
export function drawThings(
  kinds: Partial<Record<LandmarkKind, Draw>>,
  things: readonly Thing[],
  road: Road,
  projection: Projection,
  reader: Reader,
): Shape[] {
  return Object.entries(kinds).flatMap(([kind, draw]) =>
    things.filter(({ landmark }) => landmark.kind === kind).flatMap((thing) => draw(thing, road, projection, reader)),
  )
}

/** Its line along the road at its offset, px; a thing without length gets `least` metres. */
export function lineOf({ placement }: Thing, road: Road, projection: Projection, least = 0): Point[] {
  const { station: from, until, offset } = placement
  const end = until ?? station(from + least)
  return road.stretch(from, end, offset ?? 0).map(projection.toPx)
}

/** Offsets between which it lies across the road; half a metre to either side where only its middle is known. */
export function sidesOf({ placement }: Thing, road: Road): [left: number, right: number] {
  const { offset, offsetTo } = placement
  if (offset === null) return [road.width / 2, -road.width / 2]
  const [a, b] = offsetTo === null ? [offset + 0.5, offset - 0.5] : [offset, offsetTo]
  return [Math.max(a, b), Math.min(a, b)]
}

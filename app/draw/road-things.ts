import type { LandmarkKind } from '~/book/kinds'
import { linePath, type Point, path, polygon, type Shape, smoothRing } from '~/draw/display-list'
import { hatchLines } from '~/draw/hatch'
import type { Projection } from '~/draw/projection'
import type { Road } from '~/draw/road'
import { acrossRoad } from '~/draw/road-shapes'
import { type Draw, lineOf, sidesOf, type Thing } from '~/draw/things'
import { station } from '~/track/units'

/** Between two stations and two offsets, as a ring in px. */
function areaOf(thing: Thing, road: Road, projection: Projection): Point[] {
  const { station: from, until } = thing.placement
  const [left, right] = sidesOf(thing, road)
  const end = until ?? station(from + 1)
  const edge = (offset: number) => road.stretch(from, end, offset).map(projection.toPx)
  return [...edge(left), ...edge(right).reverse()]
}

const lineAlong: Draw = (thing, road, projection) => [path('road-line', linePath(lineOf(thing, road, projection)))]
const lineAcross: Draw = ({ placement }, road, projection) => [
  path('road-line', linePath(acrossRoad(road, projection, placement.station))),
]

/** Beams over the road: two lines that reach past the edges. */
const overhead: Draw = ({ placement }, road, projection) => {
  const d = linePath(acrossRoad(road, projection, placement.station, 7))
  return [path('gantry-casing', d), path('gantry', d)]
}

const CHEVRONS = 3
/** Chevrons across what rises, pointing the way of travel. */
const bump: Draw = (thing, road, projection) => {
  const [left, right] = sidesOf(thing, road)
  const gap = Math.max(2.2, 4 / projection.pxPerMetre)
  const at = (along: number, offset: number) =>
    projection.toPx(road.at(station(thing.placement.station + along), offset))
  const d = Array.from({ length: CHEVRONS }, (_, i) => {
    const from = (i - 1) * gap
    return linePath([at(from, left), at(from + gap * 0.8, (left + right) / 2), at(from, right)])
  })
  return [path('bump', d.join(''))]
}

const drain: Draw = (thing, road, projection) => {
  const { station: at, offset } = thing.placement
  const ends = [0.8, -0.8].map((side) => projection.toPx(road.at(at, (offset ?? 0) + side)))
  return [path('drain', linePath(ends))]
}

/** Water as a blob with ruled lines along the road. */
const standingWater: Draw = (thing, road, projection) => {
  const { station: from, until, offset } = thing.placement
  const [left, right] =
    thing.placement.offsetTo === null ? [(offset ?? 0) + 1.3, (offset ?? 0) - 1.3] : sidesOf(thing, road)
  const length = until === null ? 8 : road.frame.ahead(from, until)
  const ring = [
    [0, 0.5],
    [0.25, 0.06],
    [0.75, 0.12],
    [1, 0.5],
    [0.72, 0.94],
    [0.22, 0.88],
  ].map(([along, across]) => projection.toPx(road.at(station(from + along! * length), left + across! * (right - left))))
  const heading = road.headingAt(station(from + length / 2))
  const lines = hatchLines(ring, heading - 90, 4)
  return [path('standing-water', smoothRing(ring)), ...(lines === '' ? [] : [path('standing-water-line', lines)])]
}

const patch: Draw = (thing, road, projection) => [polygon('patch', areaOf(thing, road, projection))]
const seam: Draw = (thing, road, projection) => [path('seam', linePath(lineOf(thing, road, projection)))]

/** Things that lie on the road itself, in the order of paint: under the line driven. */
export const ROAD_THINGS: Partial<Record<LandmarkKind, Draw>> = {
  patch,
  seam,
  line: lineAlong,
  'pit-entry-line': lineAlong,
  'pit-exit-line': lineAlong,
  'timing-line': lineAcross,
  'safety-car-line': lineAcross,
  'standing-water': standingWater,
  bump,
  drain,
}

/** Things above the road, over everything painted on it. */
export const OVERHEAD_THINGS: Partial<Record<LandmarkKind, Draw>> = { gantry: overhead, bridge: overhead }

/** A kerb that only the simulator has so: its outline, dashed. */
export function simKerb(thing: Thing, road: Road, projection: Projection): Shape[] {
  const { station: from, until, offset, width } = thing.placement
  if (until === null || offset === null || offset === 0) return []
  const side = Math.sign(offset)
  const wide = Math.max(width ?? 1.3, 3 / projection.pxPerMetre)
  const edge = (out: number) => road.stretch(from, until, side * (road.width / 2 + out)).map(projection.toPx)
  return [polygon('thing-sim', [...edge(0.3), ...edge(0.3 + wide).reverse()])]
}

import type { Centreline } from '~/track/centreline'
import { wrap } from '~/track/lap-frame'
import { runOfRay } from '~/track/offset-rays'
import { nearestSegment } from '~/track/segment-grid'
import { type LngLat, type Offset, offset, type Position, type Station, station } from '~/track/units'

/** Where a point lies on a centreline: metres along it and metres to its left (+) or right (−). */
export interface Location {
  readonly station: Station
  readonly offset: Offset
}

/** How much a hint weighs: a metre along the road counts as a tenth of a metre across it, and 15 m across at the most. */
const hintWeight = 0.1
const hintLimit = 15
const hintReach = hintLimit / hintWeight

/** Distance squared in m² from (px, py) to segment i. */
function squaredDistance(line: Centreline, i: number, px: number, py: number): number {
  const x = px - line.x[i]!
  const y = py - line.y[i]!
  const east = line.east[i]!
  const north = line.north[i]!
  const foot = x * east + y * north
  const whole = line.stations[i + 1]! - line.stations[i]!
  const over = foot < 0 ? foot : foot > whole ? foot - whole : 0
  const across = x * north - y * east
  return across * across + over * over
}

/** Shorter way round in metres between two places along a ring. */
const gapBetween = (from: number, to: number, length: number) => {
  const ahead = wrap(to - from, length)
  return Math.min(ahead, length - ahead)
}

/** Distance to the point, plus what the hint holds against a place that far from it along the road. */
function hintedCost(line: Centreline, i: number, px: number, py: number, hint: number): number {
  const foot = (px - line.x[i]!) * line.east[i]! + (py - line.y[i]!) * line.north[i]!
  const place = line.stations[i]! + Math.max(0, Math.min(line.stations[i + 1]! - line.stations[i]!, foot))
  const against = Math.min(hintLimit, hintWeight * gapBetween(hint, place, line.length))
  return Math.sqrt(squaredDistance(line, i, px, py)) + against
}

/** From a segment of the right branch down to that branch's own nearest segment. */
function settle(line: Centreline, start: number, px: number, py: number): number {
  let best = start
  let least = squaredDistance(line, start, px, py)
  for (const step of [1, line.count - 1]) {
    for (let i = (best + step) % line.count; ; i = (i + step) % line.count) {
      const d = squaredDistance(line, i, px, py)
      if (!(d < least)) break
      least = d
      best = i
    }
  }
  return best
}

/** The segment of least hinted cost: outward from the hint while a place further off could still win, then the nearest of all. */
function hintedSegment(line: Centreline, px: number, py: number, hint: number): number {
  const home = segmentAt(line, hint)
  let best = home
  let least = Infinity
  const look = (i: number) => {
    const cost = hintedCost(line, i, px, py, hint)
    if (cost < least) {
      least = cost
      best = i
    }
  }
  look(home)
  for (const step of [1, line.count - 1]) {
    for (let i = (home + step) % line.count; i !== home; i = (i + step) % line.count) {
      const near = step === 1 ? line.stations[i]! : line.stations[i + 1]!
      const gap = step === 1 ? wrap(near - hint, line.length) : wrap(hint - near, line.length)
      if (gap > hintReach || gap * hintWeight >= least) break
      look(i)
    }
  }
  if (least > hintLimit) look(nearest(line, px, py))
  return settle(line, best, px, py)
}

const nearest = (line: Centreline, px: number, py: number) =>
  nearestSegment(line.grid, px, py, line.count, (i) => squaredDistance(line, i, px, py))

/** Number of the segment that holds a station, 0 ≤ station < length. */
export function segmentAt(line: Centreline, value: number): number {
  let low = 0
  let high = line.count - 1
  while (low < high) {
    const middle = (low + high + 1) >> 1
    if (line.stations[middle]! <= value) low = middle
    else high = middle - 1
  }
  return low
}

/** Beyond a vertex on its outer side two segments are equally near: the line that halves the angle decides. */
function sideOfVertex(line: Centreline, i: number, px: number, py: number): number {
  const x = px - line.x[i]!
  const y = py - line.y[i]!
  const foot = x * line.east[i]! + y * line.north[i]!
  const before = (i + line.count - 1) % line.count
  const after = (i + 1) % line.count
  if (foot < 0) {
    const along = x * (line.east[i]! + line.east[before]!) + y * (line.north[i]! + line.north[before]!)
    return along < 0 ? before : i
  }
  if (foot > line.stations[i + 1]! - line.stations[i]!) {
    const qx = px - line.x[after]!
    const qy = py - line.y[after]!
    const along = qx * (line.east[i]! + line.east[after]!) + qy * (line.north[i]! + line.north[after]!)
    return along > 0 ? after : i
  }
  return i
}

/**
 * Station and offset of a position: on the nearest part of the centreline, or, with a hint, on the branch that the hint
 * speaks for where the track passes close to itself or crosses. A hint (the station expected, the last one of a trace)
 * outweighs up to 15 m of distance, so a wrong one cannot pull a point off the road it lies on. The offset is the
 * distance from the segment's line, left positive; the station is that of the ray through the point (`offset-rays.ts`),
 * so that `pointAt` leads back to the same position. A position with NaN gives NaN.
 */
export function locate(line: Centreline, lngLat: LngLat | Position, hint?: Station): Location {
  const { x, y } = line.plane.toPlane(lngLat)
  const near = hint === undefined ? nearest(line, x, y) : hintedSegment(line, x, y, wrap(hint, line.length))
  const i = sideOfVertex(line, near, x, y)
  const dx = x - line.x[i]!
  const dy = y - line.y[i]!
  const across = line.east[i]! * dy - line.north[i]! * dx
  const foot = dx * line.east[i]! + dy * line.north[i]!
  return {
    station: station(wrap(line.stations[i]! + runOfRay(line, i, foot, across), line.length)),
    offset: offset(across),
  }
}

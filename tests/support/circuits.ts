import { makePlane } from '~/track/plane'
import type { LngLat, Position } from '~/track/units'

/** Invented circuits for tests: straights and arcs whose every corner is known, sampled as real files are. */

export type Point = readonly [x: number, y: number]

/** Evenly spread numbers 0 ≤ r < 1, the same for the same seed (the mulberry32 generator). */
export function seededRandom(seed: number): () => number {
  let state = seed | 0
  return () => {
    state = (state + 0x6d2b79f5) | 0
    let t = Math.imul(state ^ (state >>> 15), 1 | state)
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296
  }
}

/** Normally spread numbers of mean 0 and deviation 1 (Box and Muller). */
export const gaussian = (random: () => number) =>
  Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random())

/** Positions of points given in metres east and north of a middle. */
export function toPositions(points: readonly Point[], middle: LngLat = [-12.6, 54.2]): Position[] {
  const plane = makePlane([middle])
  return points.map(([x, y]) => plane.toLngLat({ x, y }))
}

interface Arc {
  readonly start: Point
  readonly direction: Point
  readonly end: Point
  /** Turn in radians, left positive. */
  readonly turn: number
  readonly radius: number
}

/** A corner of a ring: where its arc begins and ends, its middle, its turn in degrees (left positive) and radius. */
export interface TrueCorner {
  readonly from: number
  readonly apex: number
  readonly until: number
  readonly turn: number
  readonly radius: number
}

export interface Ring {
  readonly length: number
  readonly corners: readonly TrueCorner[]
  /** Where each straight begins and how long it is. */
  readonly straights: readonly { readonly from: number; readonly length: number }[]
  readonly at: (along: number) => Point
}

function arcAt(before: Point, [x, y]: Point, after: Point, radius: number): Arc {
  const lengthIn = Math.hypot(x - before[0], y - before[1])
  const lengthOut = Math.hypot(after[0] - x, after[1] - y)
  const direction: Point = [(x - before[0]) / lengthIn, (y - before[1]) / lengthIn]
  const onward: Point = [(after[0] - x) / lengthOut, (after[1] - y) / lengthOut]
  const turn = Math.atan2(
    direction[0] * onward[1] - direction[1] * onward[0],
    direction[0] * onward[0] + direction[1] * onward[1],
  )
  const tangent = radius * Math.tan(Math.abs(turn) / 2)
  return {
    start: [x - tangent * direction[0], y - tangent * direction[1]],
    end: [x + tangent * onward[0], y + tangent * onward[1]],
    direction,
    turn,
    radius,
  }
}

function alongArc({ start, direction, turn, radius }: Arc, run: number): Point {
  const side = Math.sign(turn)
  const forward = radius * Math.sin(run / radius)
  const aside = side * radius * (1 - Math.cos(run / radius))
  return [
    start[0] + forward * direction[0] - aside * direction[1],
    start[1] + forward * direction[1] + aside * direction[0],
  ]
}

/**
 * A closed line of straights and arcs: the polygon through the vertices, each one rounded by an arc of its radius. The
 * first arc begins at along 0.
 */
export function roundedRing(vertices: readonly (readonly [x: number, y: number, radius: number])[]): Ring {
  const n = vertices.length
  const point = (i: number): Point => [vertices[i]![0], vertices[i]![1]]
  const arcs = vertices.map(([, , radius], i) => arcAt(point((i + n - 1) % n), point(i), point((i + 1) % n), radius))
  const corners: TrueCorner[] = []
  const straights: { from: number; length: number }[] = []
  let along = 0
  arcs.forEach((arc, i) => {
    const length = Math.abs(arc.turn) * arc.radius
    const next = arcs[(i + 1) % n]!
    corners.push({
      from: along,
      apex: along + length / 2,
      until: along + length,
      turn: (arc.turn * 180) / Math.PI,
      radius: arc.radius,
    })
    along += length
    const straight = Math.hypot(next.start[0] - arc.end[0], next.start[1] - arc.end[1])
    straights.push({ from: along, length: straight })
    along += straight
  })
  const at = (value: number): Point => {
    const place = ((value % along) + along) % along
    let i = n - 1
    while (corners[i]!.from > place) i--
    if (place <= corners[i]!.until) return alongArc(arcs[i]!, place - corners[i]!.from)
    const [arc, next] = [arcs[i]!, arcs[(i + 1) % n]!]
    const share = (place - straights[i]!.from) / straights[i]!.length
    return [arc.end[0] + share * (next.start[0] - arc.end[0]), arc.end[1] + share * (next.start[1] - arc.end[1])]
  }
  return { length: along, corners, straights, at }
}

/** Points every `spacing` metres or a little less. */
export function evenPoints(ring: Ring, spacing: number): Point[] {
  const count = Math.ceil(ring.length / spacing)
  return Array.from({ length: count }, (_, k) => ring.at((k * ring.length) / count))
}

/** Points as community maps have them: 12 to 38 m apart, every straight over 60 m a single segment. */
export function sparsePoints(ring: Ring, seed: number): Point[] {
  const random = seededRandom(seed)
  const places: number[] = []
  ring.corners.forEach((corner, i) => {
    const pieces = (from: number, length: number) => {
      const count = Math.max(1, Math.round(length / (12 + 26 * random())))
      for (let k = 0; k < count; k++) places.push(from + (k * length) / count)
    }
    pieces(corner.from, corner.until - corner.from)
    const straight = ring.straights[i]!
    if (straight.length > 60) places.push(straight.from)
    else pieces(straight.from, straight.length)
  })
  return places.map(ring.at)
}

/** The points, each moved by noise of a deviation in metres. */
export function noisy(points: readonly Point[], deviation: number, seed: number): Point[] {
  const random = seededRandom(seed)
  return points.map(([x, y]) => [x + deviation * gaussian(random), y + deviation * gaussian(random)])
}

/**
 * Nine corners over 3 km: a fast right, a hairpin, a chicane left–right, a long sweep, and a straight of some 600 m; driven
 * anticlockwise.
 */
export const nineCorners = roundedRing([
  [0, 0, 60],
  [760, -40, 45],
  [820, 300, 90],
  [560, 380, 30],
  [640, 560, 40],
  [330, 640, 22],
  [250, 420, 35],
  [90, 470, 28],
  [-60, 260, 120],
])

/** A figure eight: the two long straights cross at right angles at (0, 0). */
export const figureEight = roundedRing([
  [-300, -300, 80],
  [300, 300, 90],
  [300, -300, 100],
  [-300, 300, 70],
])

/** Two straights 20 m apart joined by a hairpin at either end: the return leg of a long out-and-back. */
export const outAndBack = roundedRing([
  [0, 0, 9],
  [900, 0, 9.5],
  [900, 20, 9.5],
  [0, 20, 9],
])

import type { LayoutFrame } from '~/track/layout-frame'
import { type Metres, metres, type Offset, offset, type Station, station } from '~/track/units'
import type { DrivenDistance, Placed } from './distances'

/**
 * The line driven through a corner's marks: offsets between two marks follow a monotone cubic (harmonic mean of the two
 * secants as slope: Fritsch and Butland, SIAM J. Sci. Stat. Comput. 5, 1984; from memory), so that the line never swings wider than the marks it joins. Before the first and after the last
 * mark it keeps their offset.
 */
export interface DrivenLine {
  /** Offset of the line at a station. */
  offsetAt(at: Station): Offset
  /** Points from the first mark to the last, at most `step` metres of road apart. */
  points(step: number): { station: Station; offset: Offset }[]
  /** Metres along the line between two stations of it, forward. */
  distance(from: Station, to: Station): Metres
}

/** Distances are summed over chords of this many metres of road: 0.001 % short of an arc of 30 m radius. */
const CHORD = 1

interface Knot {
  /** Metres of road ahead of the first mark. */
  ahead: number
  offset: number
}

/**
 * @param places in any order, all within one corner; of places at one station the last counts
 * @returns null where there is no place at all
 */
export function makeDrivenLine(frame: LayoutFrame, places: readonly Placed[]): DrivenLine | null {
  const first = firstOf(frame, places)
  if (!first) return null
  const knots = knotsOf(frame, places, first.station)
  const slopes = monotoneSlopes(knots)
  const end = knots.at(-1)!.ahead
  const at = (ahead: number) => station((((first.station + ahead) % frame.length) + frame.length) % frame.length)
  const offsetOf = (ahead: number) => offset(interpolate(knots, slopes, ahead))
  const aheadOf = (value: Station) => frame.gap(first.station, value)
  return {
    offsetAt: (value) => offsetOf(aheadOf(value)),
    points: (step) => {
      const count = Math.max(1, Math.ceil(end / step))
      return Array.from({ length: count + 1 }, (_, index) => {
        const ahead = (end * index) / count
        return { station: at(ahead), offset: offsetOf(ahead) }
      })
    },
    distance: (from, to) => {
      const start = aheadOf(from)
      const road = frame.ahead(from, to)
      const count = Math.max(1, Math.ceil(road / CHORD))
      let sum = 0
      let before = frame.planePointAt(at(start), offsetOf(start))
      for (let index = 1; index <= count; index++) {
        const ahead = start + (road * index) / count
        const point = frame.planePointAt(at(ahead), offsetOf(ahead))
        sum += Math.hypot(point.x - before.x, point.y - before.y)
        before = point
      }
      return metres(sum)
    },
  }
}

/** `DrivenDistance` over the line through these places; the form that `markLines` asks for. */
export function drivenDistance(frame: LayoutFrame): (places: readonly Placed[]) => DrivenDistance {
  return (places) => {
    const line = makeDrivenLine(frame, places)
    return (from, to) => (line ? line.distance(from.station, to.station) : metres(0))
  }
}

/** The place that lies furthest back: no other lies behind it. */
function firstOf(frame: LayoutFrame, places: readonly Placed[]): Placed | undefined {
  return places.reduce<Placed | undefined>(
    (first, place) => (!first || frame.gap(first.station, place.station) < 0 ? place : first),
    undefined,
  )
}

function knotsOf(frame: LayoutFrame, places: readonly Placed[], first: Station): Knot[] {
  const byAhead = new Map(places.map((place) => [frame.gap(first, place.station) as number, place.offset as number]))
  return [...byAhead].map(([ahead, value]) => ({ ahead, offset: value })).sort((a, b) => a.ahead - b.ahead)
}

/** Slope of the offset at each knot, metres per metre; zero at the ends and wherever the offset turns back. */
function monotoneSlopes(knots: readonly Knot[]): number[] {
  const secants = knots.slice(1).map((knot, index) => {
    const before = knots[index]!
    return (knot.offset - before.offset) / (knot.ahead - before.ahead)
  })
  return knots.map((_, index) => {
    const left = secants[index - 1]
    const right = secants[index]
    if (left === undefined || right === undefined || left * right <= 0) return 0
    return (2 * left * right) / (left + right)
  })
}

function interpolate(knots: readonly Knot[], slopes: readonly number[], ahead: number): number {
  const last = knots.at(-1)!
  if (ahead <= knots[0]!.ahead) return knots[0]!.offset
  if (ahead >= last.ahead) return last.offset
  const next = knots.findIndex((knot) => knot.ahead > ahead)
  const a = knots[next - 1]!
  const b = knots[next]!
  const width = b.ahead - a.ahead
  const t = (ahead - a.ahead) / width
  const rest = 1 - t
  return (
    a.offset * rest * rest * (1 + 2 * t) +
    b.offset * t * t * (3 - 2 * t) +
    width * (slopes[next - 1]! * t * rest * rest - slopes[next]! * t * t * rest)
  )
}

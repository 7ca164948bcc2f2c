import { lineString, nearestPointOnLine } from '@turf/turf'
import { locate, makeCentreline, pointAt, straightDistance } from '~/track/centreline'
import { type LngLat, offset, type Position, station } from '~/track/units'
import { nineCorners, type Point, seededRandom, toPositions } from '../support/circuits'
import { type BenchRow, median } from './row'

const vertices = 2000
const points = 36_000
/** Turf needs a minute for all the points: it is timed on some of them, spread over the lap, and counted per point. */
const turfPoints = 300
const rounds = 5
/** Our station is that of the slanting ray through the point, so the places compared are those of points near the line. */
const mostAside = 5

/** The nine-corner circuit twice as large: 5.4 km with 2,000 vertices. */
function circuit(): Position[] {
  const twice = ([x, y]: Point): Point => [2 * x, 2 * y]
  return toPositions(
    Array.from({ length: vertices }, (_, k) => twice(nineCorners.at((k * nineCorners.length) / vertices))),
  )
}

function timed(work: () => void): number {
  const before = performance.now()
  work()
  return performance.now() - before
}

/**
 * `locate` without a hint for a trace of 36,000 points up to 5 m off a line of 2,000 vertices, against Turf's
 * `nearestPointOnLine` in the same run: time per point, and how far apart the two places on the line are.
 */
export async function run(): Promise<BenchRow[]> {
  const positions = circuit()
  const line = makeCentreline(positions)
  const random = seededRandom(36)
  const trace = Array.from({ length: points }, (_, k): LngLat => {
    const aside = offset(mostAside * (2 * random() - 1))
    return pointAt(line, station(((k + random()) * line.length) / points), aside)
  })
  const locateAll = () => {
    for (const point of trace) locate(line, point)
  }
  locateAll()
  const ours = median(Array.from({ length: rounds }, () => timed(locateAll))) / points

  const ring = lineString([...positions, positions[0]!].map(([longitude, latitude]) => [longitude, latitude]))
  const some = Array.from({ length: turfPoints }, (_, k) => trace[Math.floor((k * points) / turfPoints)]!)
  const onRing = (point: LngLat) => nearestPointOnLine(ring, [...point]).geometry.coordinates as [number, number]
  some.slice(0, turfPoints / 10).forEach(onRing)
  let found: LngLat[] = []
  const findAll = () => {
    found = some.map(onRing)
  }
  const theirs = timed(findAll) / turfPoints
  const apart = found.map((place, k) => straightDistance(place, pointAt(line, locate(line, some[k]!).station)))
  const furthest = Math.max(...apart)
  return [
    {
      name: `locate, µs a point (${points} points, ${vertices} vertices), times faster than Turf (${turfPoints} points)`,
      ours: ours * 1000,
      reference: theirs * 1000,
      ratio: theirs / ours,
      aim: '≥ 1000',
      met: theirs / ours >= 1000,
    },
    {
      name: 'locate, largest distance from the place that Turf finds, m, against 0.1 m',
      ours: furthest,
      reference: 0.1,
      ratio: furthest / 0.1,
      aim: '≤ 1',
      met: furthest <= 0.1,
    },
  ]
}

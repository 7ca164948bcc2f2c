import { knownHeights } from '~/track/height-cleaning'
import { wrap } from '~/track/lap-frame'
import { segmentAt } from '~/track/locate'
import { slantAt, slantBetween } from '~/track/offset-rays'
import { makePlane, type Plane, type PlanePoint } from '~/track/plane'
import { makeSegmentGrid, type SegmentGrid } from '~/track/segment-grid'
import {
  type Degrees,
  degrees,
  type LngLat,
  type Metres,
  metres,
  type Offset,
  type Position,
  type Station,
} from '~/track/units'

export { type Location, locate } from '~/track/locate'
export { straightDistance } from '~/track/plane'

/**
 * A closed centreline in its plane. Segment i runs from vertex i to the next; the last one closes the ring and counts
 * once. Here a station counts from the first position in the order the positions were given; `layout-frame.ts` moves
 * the start line and turns the direction.
 */
export interface Centreline {
  /** Length of the closed ring, measured along the straight segments. */
  readonly length: Metres
  readonly plane: Plane
  /** The positions kept: every one but repeats of the one before. */
  readonly positions: readonly Position[]
  readonly count: number
  /** Vertices, metres east and north of the plane's middle. */
  readonly x: Float64Array
  readonly y: Float64Array
  /** Station of each vertex, and the ring's length as one more. */
  readonly stations: Float64Array
  /** Unit direction of each segment. */
  readonly east: Float64Array
  readonly north: Float64Array
  /** tan of half the turn at each vertex, left positive. */
  readonly slants: Float64Array
  /** Height in metres of each vertex as given; NaN where the source has none (`knownHeights`). */
  readonly heights: Float64Array
  readonly grid: SegmentGrid
}

/** A position nearer than this to the one before says nothing about the road, and would give a segment no direction. */
const sameSpot = 0.01
const sameStation = 0.001
const radian = Math.PI / 180

/** The positions without repeats of the one before, the last one also against the first. */
function withoutRepeats(positions: readonly Position[], plane: Plane) {
  const kept: Position[] = []
  const points: PlanePoint[] = []
  const apart = (p: PlanePoint, q: PlanePoint) => Math.hypot(p.x - q.x, p.y - q.y) >= sameSpot
  for (const position of positions) {
    const point = plane.toPlane(position)
    const before = points.at(-1)
    if (before && !apart(before, point)) continue
    kept.push(position)
    points.push(point)
  }
  while (points.length > 1 && !apart(points[0]!, points.at(-1)!)) {
    kept.pop()
    points.pop()
  }
  return { kept, points }
}

/**
 * A centreline from positions in driving order, the first one repeated at the end or not. Repeated positions (nearer
 * than 1 cm to the one before) are left out. Throws a RangeError where fewer than three different positions remain.
 */
export function makeCentreline(positions: readonly Position[]): Centreline {
  const plane = makePlane(positions)
  const { kept, points } = withoutRepeats(positions, plane)
  const count = points.length
  if (!(count >= 3)) throw new RangeError('A centreline needs three different positions')
  const x = Float64Array.from(points, (point) => point.x)
  const y = Float64Array.from(points, (point) => point.y)
  const stations = new Float64Array(count + 1)
  const east = new Float64Array(count)
  const north = new Float64Array(count)
  for (let i = 0; i < count; i++) {
    const next = (i + 1) % count
    const dx = x[next]! - x[i]!
    const dy = y[next]! - y[i]!
    const whole = Math.hypot(dx, dy)
    stations[i + 1] = stations[i]! + whole
    east[i] = dx / whole
    north[i] = dy / whole
  }
  const slants = Float64Array.from(points, (_, i) => {
    const before = (i + count - 1) % count
    return slantBetween(east[before]!, north[before]!, east[i]!, north[i]!)
  })
  const heights = knownHeights(kept.map((position) => position[2]))
  const grid = makeSegmentGrid(x, y)
  return {
    length: metres(stations[count]!),
    plane,
    positions: kept,
    count,
    x,
    y,
    stations,
    east,
    north,
    slants,
    heights,
    grid,
  }
}

/** A station's segment and the metres into it; any station is taken modulo the length. */
function runAt(line: Centreline, station: Station) {
  const along = wrap(station, line.length)
  const segment = segmentAt(line, along)
  return { segment, run: along - line.stations[segment]! }
}

/** Place in the plane of a station and an offset in metres, left positive. */
export function planePointAt(line: Centreline, station: Station, offset: Offset | 0 = 0): PlanePoint {
  const { segment, run } = runAt(line, station)
  const forward = run + offset * slantAt(line, segment, run)
  const east = line.east[segment]!
  const north = line.north[segment]!
  return {
    x: line.x[segment]! + forward * east - offset * north,
    y: line.y[segment]! + forward * north + offset * east,
  }
}

/**
 * Position of a station and an offset in metres, left positive: the inverse of `locate` as long as the offset is less
 * than the local radius on the inner side.
 */
export function pointAt(line: Centreline, station: Station, offset: Offset | 0 = 0): LngLat {
  return line.plane.toLngLat(planePointAt(line, station, offset))
}

/**
 * Direction of travel in degrees clockwise from true north, 0 ≤ result < 360: square to the ray on which offsets are
 * laid off, so that it turns steadily through a vertex.
 */
export function headingAt(line: Centreline, station: Station): Degrees {
  const { segment, run } = runAt(line, station)
  const slant = slantAt(line, segment, run)
  const east = line.east[segment]! + slant * line.north[segment]!
  const north = line.north[segment]! - slant * line.east[segment]!
  const inPlane = Math.atan2(east, north) / radian
  return degrees(wrap(inPlane - line.plane.northAt(pointAt(line, station)), 360))
}

/** Height in metres as the source gives it, straight between two vertices; null where either has none. */
export function heightAt(line: Centreline, station: Station): Metres | null {
  const { segment, run } = runAt(line, station)
  const from = line.heights[segment]!
  const to = line.heights[(segment + 1) % line.count]!
  const share = run / (line.stations[segment + 1]! - line.stations[segment]!)
  const height = from + share * (to - from)
  return Number.isFinite(height) ? metres(height) : null
}

/** Metres forward along the road from one station to another, 0 ≤ result < length. */
export function roadDistance(line: Pick<Centreline, 'length'>, from: Station, to: Station): Metres {
  return metres(wrap(to - from, line.length))
}

/** Metres from one station to another the shorter way round: −L/2 < result ≤ L/2, positive where `to` lies ahead. */
export function signedGap(line: Pick<Centreline, 'length'>, from: Station, to: Station): Metres {
  const ahead = roadDistance(line, from, to)
  return metres(ahead > line.length / 2 ? ahead - line.length : ahead)
}

/** A vertex as given, with its height where that is known. */
function vertexAt(line: Centreline, i: number): Position {
  const [longitude, latitude] = line.positions[i]!
  const height = line.heights[i]!
  return Number.isNaN(height) ? [longitude, latitude] : [longitude, latitude, height]
}

/** Position on the line with its height, where it has one. */
function positionAt(line: Centreline, station: Station): Position {
  const [longitude, latitude] = pointAt(line, station)
  const height = heightAt(line, station)
  return height === null ? [longitude, latitude] : [longitude, latitude, height]
}

/**
 * The stretch of the line from one station forward to another, across the first position where need be: the place at
 * `from`, the vertices between, the place at `to`. The same station twice (to a millimetre) means the whole lap, closed.
 */
export function sliceOf(line: Centreline, from: Station, to: Station): Position[] {
  const between = roadDistance(line, from, to)
  const whole = between < sameStation ? line.length : between
  const start = runAt(line, from)
  const result = [positionAt(line, from)]
  for (let k = 1; k <= line.count; k++) {
    const vertex = (start.segment + k) % line.count
    const ahead = wrap(line.stations[vertex]! - from, line.length)
    if (ahead >= whole || (ahead === 0 && k > 1)) break
    if (ahead > 0) result.push(vertexAt(line, vertex))
  }
  result.push(positionAt(line, to))
  return result
}

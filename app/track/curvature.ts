import type { Centreline } from '~/track/centreline'
import { sampleSpline } from '~/track/periodic-spline'

/** A centreline's shape at even steps round the ring; sample k lies at station k·step. */
export interface Shape {
  readonly step: number
  readonly count: number
  /** Metres east and north of the plane's middle. */
  readonly x: Float64Array
  readonly y: Float64Array
  /** Turn per metre at each sample in 1/m, left positive (ISO 8855). */
  readonly turning: Float64Array
}

const resampleStep = 2

/** Angle from one direction to another in radians, −π < result ≤ π, left positive. */
export const turnBetween = (x1: number, y1: number, x2: number, y2: number) =>
  Math.atan2(x1 * y2 - y1 * x2, x1 * x2 + y1 * y2)

/** Turn per metre at each vertex of a closed line of even steps: the change of heading there over the step. */
export function turningOf(x: Float64Array, y: Float64Array, step: number): Float64Array {
  const n = x.length
  return x.map((here, i) => {
    const before = (i + n - 1) % n
    const after = (i + 1) % n
    const turn = turnBetween(here - x[before]!, y[i]! - y[before]!, x[after]! - here, y[after]! - y[i]!)
    return turn / step
  })
}

/** Weighted mean over the neighbours round the ring, by a Gaussian of `sigma` samples cut at four sigma; keeps the sum. */
export function smoothRound(values: Float64Array, sigma: number): Float64Array {
  const n = values.length
  const reach = Math.min(Math.ceil(4 * sigma), Math.floor((n - 1) / 2))
  const weights = Array.from({ length: 2 * reach + 1 }, (_, k) => Math.exp(-((k - reach) ** 2) / (2 * sigma * sigma)))
  const total = weights.reduce((sum, weight) => sum + weight, 0)
  return values.map((_, i) => {
    let sum = 0
    for (let k = -reach; k <= reach; k++) sum += weights[k + reach]! * values[(i + k + n) % n]!
    return sum / total
  })
}

/** A segment longer than this is a straight drawn as one piece. */
const longSegment = 50
const knotSpacing = 20

/** The vertices, and more knots every 20 m or so along straights drawn as one piece: without them the spline bulges there. */
function withKnotsOnStraights(line: Centreline) {
  const stations: number[] = []
  const x: number[] = []
  const y: number[] = []
  for (let i = 0; i < line.count; i++) {
    const whole = line.stations[i + 1]! - line.stations[i]!
    const pieces = whole > longSegment ? Math.round(whole / knotSpacing) : 1
    for (let k = 0; k < pieces; k++) {
      const run = (k * whole) / pieces
      stations.push(line.stations[i]! + run)
      x.push(line.x[i]! + run * line.east[i]!)
      y.push(line.y[i]! + run * line.north[i]!)
    }
  }
  return { stations: Float64Array.of(...stations, line.length), x: Float64Array.from(x), y: Float64Array.from(y) }
}

/** Closer spacing than this shows how much the vertices scatter about the road. */
const denseSpacing = 10

/**
 * Scatter of the vertices in metres: by how far each lies off its neighbours' chord beyond what the neighbours
 * themselves do (a bend moves all alike); median over the vertices with near neighbours, 0 where fewer than half are.
 */
function scatterOf(line: Centreline): number {
  const n = line.count
  const segment = (i: number) => line.stations[((i + n) % n) + 1]! - line.stations[(i + n) % n]!
  const off = line.x.map((x, i) => {
    const [b, a] = [(i + n - 1) % n, (i + 1) % n]
    const share = segment(b) / (segment(b) + segment(i))
    const dx = x - line.x[b]! - share * (line.x[a]! - line.x[b]!)
    const dy = line.y[i]! - line.y[b]! - share * (line.y[a]! - line.y[b]!)
    return dy * line.east[i]! - dx * line.north[i]!
  })
  const excess: number[] = []
  for (let i = 0; i < n; i++) {
    const near = [i - 2, i - 1, i, i + 1].every((k) => segment(k) < denseSpacing)
    if (near) excess.push(Math.abs(off[i]! - (off[(i + n - 1) % n]! + off[(i + 1) % n]!) / 2))
  }
  if (excess.length < n / 2) return 0
  return (1.4826 * excess.sort((p, q) => p - q)[excess.length >> 1]!) / Math.sqrt(4.375)
}

/** Metres of Gaussian smoothing for each metre of scatter, at most so many metres, and none below half a sample. */
const scatterSmoothing = 20
const mostScatterSmoothing = 10
const leastSigma = 0.5

/**
 * The centreline's shape: periodic cubic spline through its vertices, resampled at 2 m, closely spaced vertices that
 * scatter smoothed in proportion. For shape only, never for length: a spline through sparse vertices is too long.
 */
export function shapeOf(line: Centreline): Shape {
  const count = Math.max(8, Math.round(line.length / resampleStep))
  const step = line.length / count
  const knots = withKnotsOnStraights(line)
  const through = sampleSpline(knots.stations, knots.x, knots.y, count)
  const sigma = Math.min(mostScatterSmoothing, scatterSmoothing * scatterOf(line)) / step
  const x = sigma > leastSigma ? smoothRound(through.x, sigma) : through.x
  const y = sigma > leastSigma ? smoothRound(through.y, sigma) : through.y
  return { step, count, x, y, turning: turningOf(x, y, step) }
}

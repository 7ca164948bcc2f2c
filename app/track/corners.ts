import type { Centreline } from '~/track/centreline'
import { fitCircle } from '~/track/circle-fit'
import { type Shape, shapeOf, smoothRound } from '~/track/curvature'
import { wrap } from '~/track/lap-frame'
import type { LayoutFrame } from '~/track/layout-frame'
import { along, type Degrees, degrees, type Metres, metres, type Station, station } from '~/track/units'

/** A corner as the road's shape suggests it; numbers and names are people's. */
export interface ProposedCorner {
  readonly direction: 'left' | 'right'
  readonly entry: Station
  /** Where the road is tightest. */
  readonly apex: Station
  readonly exit: Station
  /** How far the road turns from entry to exit, without sign. */
  readonly turnDegrees: Degrees
  /** Radius of the centreline at the apex; no more than two significant figures of it are meant. */
  readonly leastRadius: Metres
}

/** Smoothing of the turn per metre, metres. */
const sigma = 15
/** A corner begins to count where the smoothed radius falls below this, and reaches as far as it stays below 1.5 times it. */
const cornerBend = 1 / 400
const leastBend = cornerBend / 1.5
const leastTurn = 20
/** Two peaks of one sign are two corners where the valley between falls below this share of the lower one. */
const valleyShare = 0.4
/** The tightest part of a corner is where the bend stays above this share of its peak; the apex is the middle of it. */
const tightShare = 0.8
/** Smoothing for the corner's ends, metres. */
const endSigma = 5
/** The circle at the apex is fitted over this many metres either way, or the tightest part where that is longer. */
const fitReach = 20

/** Samples `from` up to and including `to`, which may exceed the count: the ring runs on. */
interface Span {
  from: number
  to: number
}

const middleOf = ({ from, to }: Span) => Math.round((from + to) / 2)

/** Runs of neighbouring samples for which `holds` is true, round the ring from a sample where it is not, if there is one. */
function runsWhere(count: number, start: number, holds: (i: number) => boolean): Span[] {
  if (holds(start)) return [{ from: start, to: start + count - 1 }]
  const runs: Span[] = []
  let from = -1
  for (let i = start + 1; i <= start + count; i++) {
    const inside = holds(i)
    if (inside && from < 0) from = i
    if (!inside && from >= 0) {
      runs.push({ from, to: i - 1 })
      from = -1
    }
  }
  return runs
}

/** Cuts a run at its deepest valley while that lies below the share of the lower peak and both parts turn enough. */
function splitAtValleys(span: Span, bend: (i: number) => number, turnOf: (span: Span) => number): Span[] {
  const size = span.to - span.from + 1
  const peakAfter = new Float64Array(size + 1)
  for (let k = size - 1; k >= 0; k--) peakAfter[k] = Math.max(peakAfter[k + 1]!, bend(span.from + k))
  let peakBefore = 0
  let deepest = valleyShare
  let cut = -1
  for (let k = 0; k < size; k++) {
    const share = bend(span.from + k) / Math.min(peakBefore, peakAfter[k + 1]!)
    if (share < deepest) {
      const parts = [turnOf({ from: span.from, to: span.from + k }), turnOf({ from: span.from + k, to: span.to })]
      if (Math.min(...parts) >= leastTurn) {
        deepest = share
        cut = span.from + k
      }
    }
    peakBefore = Math.max(peakBefore, bend(span.from + k))
  }
  if (cut < 0) return [span]
  return [
    { from: span.from, to: cut },
    { from: cut, to: span.to },
  ].flatMap((part) => splitAtValleys(part, bend, turnOf))
}

/** The run round the peak in which the bend stays near it: a peak sample or a whole even arc. */
function tightestPart(span: Span, bend: (i: number) => number): Span & { peak: number } {
  let peak = span.from
  for (let i = span.from; i <= span.to; i++) if (bend(i) > bend(peak)) peak = i
  let from = peak
  let to = peak
  while (from > span.from && bend(from - 1) >= tightShare * bend(peak)) from--
  while (to < span.to && bend(to + 1) >= tightShare * bend(peak)) to++
  return { from, to, peak }
}

/**
 * Smoothing carries a corner's ends some 20 m out into the straights: they are drawn in to where the turn per metre,
 * smoothed over a few metres only, passes the same limit.
 */
function drawnIn(span: Span, apex: number, bend: (i: number) => number): Span {
  let { from, to } = span
  while (from < apex && bend(from) < leastBend) from++
  while (to > apex && bend(to) < leastBend) to--
  return { from, to }
}

/** Radius of the circle through the samples round the apex, at most that of the smoothed bend: smoothing only widens. */
function radiusAt(shape: Shape, tight: Span, bend: number): Metres {
  const apex = middleOf(tight)
  const reach = Math.round(Math.max(fitReach / shape.step, (tight.to - tight.from) / 2))
  const around = Array.from({ length: 2 * reach + 1 }, (_, k) => wrap(apex + k - reach, shape.count))
  const circle = fitCircle(
    around.map((i) => shape.x[i]!),
    around.map((i) => shape.y[i]!),
  )
  return metres(Math.min(circle?.radius ?? Infinity, 1 / bend))
}

/** The bends of one sign (left +1, right −1) that make corners; places are samples of the shape. */
function cornersOfSign(shape: Shape, sign: 1 | -1, smooth: Float64Array, fine: Float64Array, length: Metres) {
  const bend = (i: number) => Math.max(0, sign * smooth[i % shape.count]!)
  const turnOf = ({ from, to }: Span) => {
    let turn = 0
    for (let i = from; i <= to; i++) turn += bend(i) * shape.step
    return (turn * 180) / Math.PI
  }
  const stationOf = (i: number) => station(wrap(i * shape.step, length))
  let straightest = 0
  for (let i = 1; i < shape.count; i++) if (bend(i) < bend(straightest)) straightest = i
  return runsWhere(shape.count, straightest, (i) => bend(i) > leastBend)
    .flatMap((run) => splitAtValleys(run, bend, turnOf))
    .map((span) => ({ span, tight: tightestPart(span, bend), turn: turnOf(span) }))
    .filter(({ tight, turn }) => bend(tight.peak) > cornerBend && turn >= leastTurn)
    .map(({ span, tight, turn }): ProposedCorner => {
      const ends = drawnIn(span, middleOf(tight), (i) => sign * fine[i % shape.count]!)
      return {
        direction: sign > 0 ? 'left' : 'right',
        entry: stationOf(ends.from),
        apex: stationOf(middleOf(tight)),
        exit: stationOf(ends.to),
        turnDegrees: degrees(turn),
        leastRadius: radiusAt(shape, tight, bend(tight.peak)),
      }
    })
}

const byApex = (one: ProposedCorner, other: ProposedCorner) => one.apex - other.apex

/**
 * The corners of a centreline in the order of its positions, by apex station. The turn per metre of the splined line is
 * smoothed by a Gaussian of 15 m; a corner is where the radius falls below 400 m, as far as it stays below 600 m, and
 * turns by 20° at least. Left and right are kept apart, so a chicane is two corners; so are two peaks with a valley
 * between them. A line that bends one way all round is one corner.
 */
export function proposeCorners(line: Centreline): ProposedCorner[] {
  const shape = shapeOf(line)
  const smooth = smoothRound(shape.turning, sigma / shape.step)
  const fine = smoothRound(shape.turning, endSigma / shape.step)
  return ([1, -1] as const).flatMap((sign) => cornersOfSign(shape, sign, smooth, fine, line.length)).sort(byApex)
}

/** The corners in a layout's own frame, in driving order from its start line. */
export function proposeCornersInFrame(frame: LayoutFrame): ProposedCorner[] {
  const toStation = (value: Station) => frame.toStation(along(value))
  const mirrored = { left: 'right', right: 'left' } as const
  return proposeCorners(frame.centreline)
    .map((corner) => ({
      ...corner,
      direction: frame.reversed ? mirrored[corner.direction] : corner.direction,
      entry: toStation(frame.reversed ? corner.exit : corner.entry),
      apex: toStation(corner.apex),
      exit: toStation(frame.reversed ? corner.entry : corner.exit),
    }))
    .sort(byApex)
}

/** A corner's stretch of road: from where the corner before it ends to its own end. */
export interface Stretch {
  readonly from: Station
  readonly until: Station
}

/**
 * Each corner's stretch, in the order of the corners: together they cover the lap once. With a single corner the
 * stretch begins and ends at its exit: the whole lap (as `sliceOf` takes it).
 */
export function cornerStretches(corners: readonly Pick<ProposedCorner, 'exit'>[]): Stretch[] {
  return corners.map((corner, i) => ({
    from: corners[(i + corners.length - 1) % corners.length]!.exit,
    until: corner.exit,
  }))
}

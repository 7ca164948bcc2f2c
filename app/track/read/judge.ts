import { makePlane, straightDistance } from '~/track/plane'
import { clean, pick } from '~/track/read/clean'
import { type Crossing, crossingsOf } from '~/track/read/crossings'
import { closingGap } from '~/track/read/laps'
import { cornersOf, type Flat, gapBetween, onPlane } from '~/track/read/on-plane'
import type { Points } from '~/track/read/points'
import { inMetres, type Problem, problem, several } from '~/track/read/problems'

const fewestPositions = 8
const shortest = 300
const longest = 30_000
const mostCrossings = 2
/** A bridge crosses at least at this angle in degrees, and the two passes are this many metres of road apart. */
const flattest = 20
const nearest = 100

export type Judgement =
  | { readonly ok: true; readonly points: Points; readonly warnings: readonly Problem[] }
  | { readonly ok: false; readonly problems: readonly Problem[] }

/**
 * Judges one line as a circuit's centreline: repeated positions out, ring closed, 8 positions or more, 300 m to 30 km
 * long, at most two crossings of itself, each at 20° or more with its passes 100 m or more apart along the lap.
 * @param isLap whether the line is a lap cut from a trace, whose last position is followed by its first
 * @param close whether a gap of any width is to be closed
 */
export function judge(points: Points, { isLap, close }: { isLap: boolean; close: boolean }): Judgement {
  const refuse = (found: Problem): Judgement => ({ ok: false, problems: [found] })
  if (points.length < fewestPositions) return refuse(tooFew(points.length))
  const corners = cornersOf(points)
  const spread = straightDistance(...corners)
  if (spread > longest) {
    const says = `The line spreads over ${inMetres(spread)}; a circuit is at most ${inMetres(longest)} long. Save one lap alone, or take the stray position out.`
    return refuse(problem('too-long', says))
  }
  const whole = onPlane(points, makePlane([...corners]))
  const { kept, closed, warnings } = clean(whole)
  if (kept.length < fewestPositions) return refuse(tooFew(kept.length))
  const chosen = pick(points, whole, kept)
  const gap = gapBetween(chosen.flat, kept.length - 1, 0)
  const mended = !closed && !isLap
  const found: Problem[] = []
  if (mended && gap >= closingGap && !close) found.push(openProblem(gap))
  const along = alongOf(chosen.flat)
  const length = along.at(-1)!
  if (length < shortest) found.push(tooShort(length))
  if (length > longest) found.push(tooLong(length))
  if (found.length === 0) found.push(...crossingProblems(chosen.flat, along))
  if (found.length > 0) return { ok: false, problems: found }
  return { ok: true, points: chosen.points, warnings: mended ? [...warnings, closedWarning(gap)] : warnings }
}

/** Metres from the first position to each, and round to the first again. */
function alongOf(flat: Flat): Float64Array {
  const n = flat.x.length
  const along = new Float64Array(n + 1)
  for (let i = 1; i <= n; i++) along[i] = along[i - 1]! + gapBetween(flat, i - 1, i === n ? 0 : i)
  return along
}

function crossingProblems(flat: Flat, along: Float64Array): Problem[] {
  const { crossings, tangle } = crossingsOf(flat, along, mostCrossings + 1)
  const [first] = crossings
  if (tangle || crossings.length > mostCrossings) {
    const says = `The line crosses itself more than ${several(mostCrossings, 'time')}, so it is no single lap. Bring one lap, or draw it again.`
    return [problem('too-many-crossings', says, first && placeOf(first))]
  }
  const length = along.at(-1)!
  const found: Problem[] = []
  for (const crossing of crossings) {
    const way = crossing.second - crossing.first
    const apart = Math.min(way, length - way)
    if (crossing.angle < flattest) {
      const says = `The line crosses itself at ${Math.round(crossing.angle)}°; a bridge crosses at ${flattest}° or more. Move the positions there apart.`
      found.push(problem('crossing-too-flat', says, placeOf(crossing)))
    }
    if (apart < nearest) {
      const says = `The line makes a loop of ${inMetres(apart)} there; the passes over and under a bridge are ${nearest}\u00A0m of road apart or more. Take the loop out.`
      found.push(problem('crossing-too-near', says, placeOf(crossing)))
    }
  }
  return found
}

const placeOf = ({ first, second }: Crossing) =>
  `${inMetres(first)} and ${inMetres(second)} along the line from its first position`

const tooFew = (positions: number) =>
  problem(
    'too-few-positions',
    `The line has ${several(positions, 'position')}; a circuit needs at least ${fewestPositions}. Draw it with more.`,
  )

const openProblem = (gap: number) =>
  problem(
    'ring-open',
    `The centreline does not close. The last point is ${inMetres(gap)} from the first. Add the missing stretch, or have the gap closed straight.`,
    undefined,
    'close',
  )

const closedWarning = (gap: number) =>
  problem(
    'ring-closed',
    `The centreline does not close. The last point is ${inMetres(gap)} from the first. The gap is closed straight.`,
  )

const tooShort = (length: number) =>
  problem(
    'too-short',
    `The lap is ${inMetres(length)} long; a circuit has at least ${shortest}\u00A0m. Bring the whole lap.`,
  )

const tooLong = (length: number) =>
  problem(
    'too-long',
    `The line is ${inMetres(length)} long; a circuit has at most ${inMetres(longest)}. Bring one lap alone.`,
  )

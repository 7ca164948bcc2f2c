import { findRounds, type Round } from '~/track/read/gate'
import { type Flat, flatten, gapBetween, lengthAlong } from '~/track/read/on-plane'
import type { Content, Line, Points } from '~/track/read/points'
import { inMetres, inSeconds, type Problem, problem, several } from '~/track/read/problems'
import { type Metres, metres, type Seconds, seconds } from '~/track/units'

/** Longest pause between two positions of a lap that is taken unasked, in seconds. */
const longestGap = 2
/** No car is faster, in m/s: a longer way between two positions is a jump of the receiver. */
const fastest = 150
/** A line closes by itself where its ends lie within this many metres. */
export const closingGap = 60
/** A round shorter than this part of a line that closes by itself is a loop in it, not the lap. */
const wholeLap = 0.8

/** One lap of a trace, as offered. */
export interface Lap {
  /** Number of the lap as a driver counts, from 1: what `options.lap` takes. */
  readonly index: number
  readonly lengthMetres: Metres
  /** How long it took, where the trace has times. */
  readonly seconds?: Seconds
  /** Longest time between two of its positions. */
  readonly gapSeconds?: Seconds
}

/** A lap with its positions. */
interface Found extends Lap {
  readonly round: Round
  readonly jumps: boolean
}

/** What a trace came to: the positions `start` ≤ i < `end` of one lap, or of a line that is no lap. */
export interface Choice {
  readonly start: number
  readonly end: number
  readonly name?: string
  /** Whether these positions go once round, so that the last is followed by the first. */
  readonly isLap: boolean
  readonly laps?: readonly Lap[]
  readonly lapTaken?: number
  readonly warnings: readonly Problem[]
}

/**
 * Chooses the lap of a trace: of the laps without a time gap over 2 s, a jump or a lost fix the one of median length (of
 * an even number the shorter of the middle two), or the one wanted. Never an average. Without any round the line of the
 * trace itself: the one that closes, else the longest. Nothing for an untimed trace in several pieces that do not close,
 * which is a drawing.
 */
export function chooseLap(content: Content, wanted?: number): Choice | Problem | undefined {
  const { points, lines } = content
  const flat = flatten(points)
  const { rounds, interrupted } = findRounds(flat, lines)
  const closed = lines.filter(({ start, end }) => isClosed(flat, start, end))
  const found = isWhole(rounds, closed, lines, flat) ? [] : rounds
  const whole = closed.map(({ start, end }) => ({ start, end, next: undefined, from: start, to: end - 1 }))
  const laps = (found.length > 0 ? found : whole).map((round, i) => measure(points, flat, round, i + 1))
  if (laps.length > 0) {
    const warnings = interrupted > 0 && found.length > 0 ? [leftOutLaps(interrupted)] : []
    return pick(content, flat, laps, found.length > 0, wanted, warnings)
  }
  if (wanted !== undefined) return noSuchLap(wanted, 0)
  const timed = points.time.subarray(0, points.length).some((time) => !Number.isNaN(time))
  if (!timed && lines.length > 1) return undefined
  return longest(flat, lines)
}

const isClosed = (flat: Flat, start: number, end: number) =>
  gapBetween(flat, start, end - 1) < closingGap && lengthAlong(flat, start, end) >= 300

/**
 * Whether a line that closes by itself is to be taken whole although one round was found in it: the round is a loop within
 * it, or goes to the line's end, so that nothing is driven twice.
 */
function isWhole(rounds: readonly Round[], closed: readonly Line[], lines: readonly Line[], flat: Flat): boolean {
  const [only, another] = rounds
  const [line, other] = lines
  if (!only || another || !line || other || closed.length === 0) return false
  const toTheEnd = (only.next ?? line.end) >= line.end - 1
  return toTheEnd || lengthAlong(flat, only.start, only.end) < wholeLap * lengthAlong(flat, line.start, line.end)
}

function measure(points: Points, flat: Flat, round: Round, index: number): Found {
  const { time } = points
  const { start, end, next, from, to } = round
  const last = next ?? end - 1
  let gap = 0
  let jumps = false
  let before = start
  for (let i = start + 1; i <= last; i++) {
    if (Number.isNaN(time[i]!)) continue
    const pause = Math.abs(time[i]! - time[before]!)
    gap = Math.max(gap, pause)
    jumps ||= gapBetween(flat, before, i) > fastest * Math.max(1, pause)
    before = i
  }
  const took = timeAt(time, to) - timeAt(time, from)
  const lengthMetres = metres(lengthAlong(flat, start, end) + gapBetween(flat, end - 1, start))
  const timed = Number.isFinite(took) && took > 0
  return {
    index,
    lengthMetres,
    ...(timed && { seconds: seconds(thousandths(took)), gapSeconds: seconds(thousandths(gap)) }),
    round,
    jumps,
  }
}

/** Time at a place between two positions. */
function timeAt(time: Float64Array, place: number): number {
  const before = time[Math.floor(place)]!
  return before + (place % 1) * ((time[Math.ceil(place)] ?? before) - before)
}

const thousandths = (value: number) => Math.round(value * 1000) / 1000

function pick(
  content: Content,
  flat: Flat,
  laps: readonly Found[],
  areRounds: boolean,
  wanted: number | undefined,
  before: readonly Problem[],
): Choice | Problem {
  const sound = laps.filter((lap) => !lap.jumps && (lap.gapSeconds ?? 0) <= longestGap)
  const field = (sound.length > 0 ? sound : laps).toSorted((p, q) => p.lengthMetres - q.lengthMetres)
  const median = field[Math.floor((field.length - 1) / 2)]!
  const lap = wanted === undefined ? median : laps.find(({ index }) => index === wanted)
  if (!lap) return noSuchLap(wanted!, laps.length)
  const { start, end } = lap.round
  const line = content.lines.find((some) => some.start <= start && start < some.end)
  const driven = content.lines.reduce((sum, some) => sum + lengthAlong(flat, some.start, some.end), 0)
  const warnings = [...before]
  if (laps.length > 1 || driven - lap.lengthMetres > closingGap) warnings.push(takenWarning(lap, laps, wanted))
  if (sound.length === 0 && laps.some((some) => (some.gapSeconds ?? 0) > longestGap)) warnings.push(gapWarning(lap))
  return {
    start,
    end,
    ...(line?.name && { name: line.name }),
    isLap: areRounds,
    laps: laps.map(({ round: _, jumps: __, ...offered }) => offered),
    lapTaken: lap.index,
    warnings,
  }
}

function takenWarning(lap: Found, laps: readonly Found[], wanted: number | undefined): Problem {
  const time = lap.seconds === undefined ? '' : ` in ${inSeconds(lap.seconds)}`
  const length = `${inMetres(lap.lengthMetres)}${time}`
  if (laps.length === 1) {
    return problem('lap-taken', `The trace holds one whole lap, ${length}. What lies before and after it is left out.`)
  }
  const why = wanted === undefined ? ', the middle one by length. Choose another where it fits better.' : ', as chosen.'
  return problem(
    'lap-taken',
    `The trace holds ${laps.length} laps. Lap ${lap.index} is taken: ${length}${why}`,
    undefined,
    'choose-lap',
  )
}

const gapWarning = (lap: Found) =>
  problem(
    'laps-with-gaps',
    `No lap is free of gaps. In lap ${lap.index} up to ${inSeconds(lap.gapSeconds!)} pass without a position: corners may be cut short.`,
  )

const leftOutLaps = (number: number) =>
  problem(
    'segments-left-out',
    `${several(number, 'lap has', 'laps have')} a lost fix. Nothing is drawn across it, and such a lap is left out.`,
  )

const noSuchLap = (wanted: number, laps: number) =>
  problem(
    'no-such-lap',
    `There is no lap ${wanted}: the trace holds ${several(laps, 'lap')}. Choose one of them.`,
    undefined,
    'choose-lap',
  )

function longest(flat: Flat, lines: readonly Line[]): Choice {
  const lengths = lines.map(({ start, end }) => lengthAlong(flat, start, end))
  const { start, end, name } = lines[lengths.indexOf(Math.max(...lengths))]!
  const says = `The track is interrupted ${several(lines.length - 1, 'time')}. Only its longest stretch is read, ${inMetres(Math.max(...lengths))}: nothing is drawn across a lost fix.`
  const warnings = lines.length > 1 ? [problem('segments-left-out', says)] : []
  return { start, end, ...(name && { name }), isLap: false, warnings }
}

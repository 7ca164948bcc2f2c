import Flatbush from 'flatbush'
import { type Flat, gapBetween } from '~/track/read/on-plane'
import type { Line } from '~/track/read/points'

/** A lap is over where the trace returns within this many metres and degrees of heading. */
const returnMetres = 15
const returnDegrees = 30
const leastCosine = Math.cos((returnDegrees * Math.PI) / 180)
/** Shortest way round that counts as a return: no shorter circuit is read. */
const shortestLap = 300
/** Laps this near the median length speak for a gate. */
const alike = 0.05
/** Places tried as a gate, and pieces of the trace near a place beyond which it is not tried. */
const gatesTried = 160
const mostNear = 5000
/** The trace is looked at in steps of this many metres, more where that would be too many steps. */
const stepMetres = 5
const mostSteps = 100_000
const jumpMetres = 1000

/** Every few metres of a trace: which position stands there, in which stretch, and how far along. */
interface Steps {
  readonly at: number[]
  readonly stretch: number[]
  readonly along: number[]
}

/** A stretch of the trace from a gate back to it: positions `start` ≤ i < `end`. */
export interface Round {
  readonly start: number
  readonly end: number
  /** First position after the round, where the stretch goes on. */
  readonly next: number | undefined
  /** Where the gate is crossed at the beginning and at the end: 17.25 is a quarter of the way from position 17 to 18. */
  readonly from: number
  readonly to: number
}

/** What the best gate gives. */
export interface Rounds {
  readonly rounds: readonly Round[]
  /** Ways round that a lost fix interrupts. */
  readonly interrupted: number
}

interface Pass {
  readonly step: number
  readonly along: number
  readonly stretch: number
  readonly distance: number
}

/**
 * Finds the laps of a trace: the place that it passes again and again, within 15 m and 30° of heading, and the rounds from
 * one pass to the next. Of all places tried the one wins at which most rounds are alike in length, then the one passed most
 * often, then the one where the passes lie closest. Nothing is bridged between stretches.
 */
export function findRounds(flat: Flat, stretches: readonly Line[]): Rounds {
  const steps = takeSteps(flat, stretches)
  const pieces = indexOf(flat, steps)
  if (!pieces) return { rounds: [], interrupted: 0 }
  let best: Gate | undefined
  for (const gate of gatesOf(steps)) {
    const passes = passesAt(flat, steps, pieces, gate)
    const lengths = roundLengths(passes)
    if (lengths.length === 0) continue
    const median = [...lengths].sort((p, q) => p - q)[Math.floor((lengths.length - 1) / 2)]!
    const near = lengths.filter((length) => Math.abs(length - median) <= alike * median).length
    const score = 2 * near - lengths.length
    const spread = passes.reduce((sum, pass) => sum + pass.distance, 0) / (passes.length - 1)
    const found = { passes, gate, score, spread }
    if (!best || isBetter(found, best)) best = found
  }
  return best ? cut(flat, steps, stretches, best.passes, best.gate) : { rounds: [], interrupted: 0 }
}

interface Gate {
  readonly passes: readonly Pass[]
  readonly gate: number
  /** Rounds alike in length less the others, and metres between the passes. */
  readonly score: number
  readonly spread: number
}

function isBetter(a: Gate, b: Gate): boolean {
  if (a.score !== b.score) return a.score > b.score
  if (a.passes.length !== b.passes.length) return a.passes.length > b.passes.length
  return a.spread < b.spread - 1e-6
}

function takeSteps(flat: Flat, stretches: readonly Line[]): Steps {
  const steps: Steps = { at: [], stretch: [], along: [] }
  const metres = Math.max(stepMetres, driven(flat, stretches) / mostSteps)
  const add = (i: number, stretch: number, along: number) => {
    steps.at.push(i)
    steps.stretch.push(stretch)
    steps.along.push(along)
  }
  for (const [stretch, { start, end }] of stretches.entries()) {
    let along = 0
    let last = start
    add(start, stretch, along)
    for (let i = start + 1; i < end && steps.at.length < 2 * mostSteps; i++) {
      const gap = gapBetween(flat, last, i)
      if (gap === 0 || (gap < metres && i < end - 1)) continue
      along += gap
      last = i
      add(i, stretch, along)
    }
  }
  return steps
}

/** Metres driven in all, a jump counted as `jumpMetres`. */
function driven(flat: Flat, stretches: readonly Line[]): number {
  let sum = 0
  for (const { start, end } of stretches) {
    for (let i = start + 1; i < end; i++) sum += Math.min(jumpMetres, gapBetween(flat, i - 1, i))
  }
  return sum
}

/** Index of the pieces between one step and the next; piece k begins at step k. */
function indexOf({ x, y }: Flat, { at, stretch }: Steps): Flatbush | undefined {
  if (at.length < 3) return undefined
  const index = new Flatbush(at.length - 1, 16, Float32Array)
  for (let k = 0; k + 1 < at.length; k++) {
    const [i, j] = stretch[k] === stretch[k + 1] ? [at[k]!, at[k + 1]!] : [at[k]!, at[k]!]
    index.add(Math.min(x[i]!, x[j]!), Math.min(y[i]!, y[j]!), Math.max(x[i]!, x[j]!), Math.max(y[i]!, y[j]!))
  }
  index.finish()
  return index
}

/** Steps tried as gates: evenly over the trace, the first of it among them. */
function gatesOf({ at, stretch }: Steps): number[] {
  const pieces = at.length - 1
  const stride = Math.max(1, pieces / gatesTried)
  const gates: number[] = []
  for (let place = 0; place < pieces; place += stride) {
    const k = Math.floor(place)
    if (stretch[k] === stretch[k + 1]) gates.push(k)
  }
  return gates
}

function passesAt({ x, y }: Flat, steps: Steps, pieces: Flatbush, gate: number): Pass[] {
  const { at, stretch, along } = steps
  const px = x[at[gate]!]!
  const py = y[at[gate]!]!
  const gx = x[at[gate + 1]!]! - px
  const gy = y[at[gate + 1]!]! - py
  const [r, few] = [returnMetres, atMost(mostNear)]
  const near = pieces.search(px - r, py - r, px + r, py + r, few)
  if (near.length === mostNear) return []
  const passes: Pass[] = []
  for (const k of near.sort((p, q) => p - q)) {
    if (stretch[k] !== stretch[k + 1]) continue
    const [ax, ay] = [x[at[k]!]!, y[at[k]!]!]
    const [dx, dy] = [x[at[k + 1]!]! - ax, y[at[k + 1]!]! - ay]
    const length = Math.sqrt(dx * dx + dy * dy)
    if (!(dx * gx + dy * gy >= leastCosine * length * Math.hypot(gx, gy))) continue
    const t = Math.min(1, Math.max(0, ((px - ax) * dx + (py - ay) * dy) / (length * length)))
    const distance = Math.hypot(ax + t * dx - px, ay + t * dy - py)
    if (distance > returnMetres) continue
    const pass = { step: k, along: along[k]! + t * length, stretch: stretch[k]!, distance }
    const last = passes.at(-1)
    if (!last || last.stretch !== pass.stretch || pass.along - last.along >= shortestLap) passes.push(pass)
    else if (distance < last.distance) passes[passes.length - 1] = pass
  }
  return passes
}

/** A filter that lets only so many through. */
function atMost(number: number): () => boolean {
  let passed = 0
  return () => passed++ < number
}

function roundLengths(passes: readonly Pass[]): number[] {
  const lengths: number[] = []
  for (let i = 1; i < passes.length; i++) {
    if (passes[i]!.stretch === passes[i - 1]!.stretch) lengths.push(passes[i]!.along - passes[i - 1]!.along)
  }
  return lengths
}

/** Cuts the trace where it crosses the line through the gate square to the heading there. */
function cut(flat: Flat, steps: Steps, stretches: readonly Line[], passes: readonly Pass[], gate: number): Rounds {
  const { at } = steps
  const { x, y } = flat
  const [px, py] = [x[at[gate]!]!, y[at[gate]!]!]
  const [gx, gy] = [x[at[gate + 1]!]! - px, y[at[gate + 1]!]! - py]
  const ahead = (i: number) => (x[i]! - px) * gx + (y[i]! - py) * gy
  const crossing = ({ step }: Pass) => {
    for (let i = at[step]!; i <= at[step + 1]!; i++) {
      if (ahead(i) < 0) continue
      const before = i > at[step]! ? ahead(i - 1) : 0
      return { first: i, place: before < 0 ? i - 1 + before / (before - ahead(i)) : i }
    }
    return { first: at[step + 1]! + 1, place: at[step + 1]! }
  }
  const rounds: Round[] = []
  let interrupted = 0
  for (let k = 1; k < passes.length; k++) {
    if (passes[k]!.stretch !== passes[k - 1]!.stretch) {
      interrupted++
      continue
    }
    const { first: start, place: from } = crossing(passes[k - 1]!)
    const { first: next, place: to } = crossing(passes[k]!)
    let end = next
    while (end - 1 > start && gapBetween(flat, start, end - 1) < 1) end--
    if (end - start < 2) continue
    rounds.push({ start, end, next: next < stretches[passes[k]!.stretch]!.end ? next : undefined, from, to })
  }
  return { rounds, interrupted }
}

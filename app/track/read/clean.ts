import { type Flat, gapBetween } from '~/track/read/on-plane'
import { Points } from '~/track/read/points'
import { count, type Problem, problem, several } from '~/track/read/problems'

/** Positions nearer than this to the one before are the same place: 1 cm, the seventh decimal of a degree. */
export const samePosition = 0.01
/** A line of more positions than this is thinned, to one every so many metres. */
const dense = 20_000
const thinnedMetres = 0.5

/** A line without positions that say nothing. */
export interface Cleaned {
  /** Indexes of the positions kept, in order. */
  readonly kept: Int32Array
  /** Whether the last position stood at the place of the first. */
  readonly closed: boolean
  readonly warnings: readonly Problem[]
}

/**
 * Leaves out positions at the same place as the one before, and, of a line denser than any circuit needs, all but one
 * each half metre: the chord of 0.5 m is short of an arc of 10 m radius by 0.01 % (Δ²/24R²), less on any wider one. A
 * last position at the place of the first closes the ring and is left out without a word.
 */
export function clean(flat: Flat): Cleaned {
  const n = flat.x.length
  let kept = spaced(flat, n, undefined, samePosition)
  const repeated = n - kept.length
  const beforeClosing = kept.length
  let last = kept.length - 1
  while (last > 0 && gapBetween(flat, kept[0]!, kept[last]!) < samePosition) last--
  kept = kept.subarray(0, last + 1)
  const closed = kept.length < beforeClosing
  const warnings: Problem[] = []
  if (repeated > 0) {
    const says = `${several(repeated, 'position repeats', 'positions repeat')} the one before. They are left out.`
    warnings.push(problem('duplicate-positions', says))
  }
  if (kept.length > dense) {
    const all = kept.length
    kept = spaced(flat, kept.length, kept, thinnedMetres)
    const says = `Of ${count(all)} positions ${count(kept.length)} are kept, one about every half metre. The length stays the same within 0.01\u00A0%.`
    warnings.push(problem('thinned', says))
  }
  return { kept, closed, warnings }
}

/** Those of `n` positions, all or the ones of a list, that lie so many metres or more from the one kept before. */
function spaced(flat: Flat, n: number, list: Int32Array | undefined, metres: number): Int32Array {
  const kept = new Int32Array(n)
  let length = 0
  for (let k = 0; k < n; k++) {
    const i = list ? list[k]! : k
    if (length === 0 || gapBetween(flat, kept[length - 1]!, i) >= metres) kept[length++] = i
  }
  return kept.subarray(0, length)
}

/** The positions kept, as columns of their own. */
export function pick(points: Points, flat: Flat, kept: Int32Array): { points: Points; flat: Flat } {
  const chosen = new Points(kept.length, points.hasWidths)
  const x = new Float64Array(kept.length)
  const y = new Float64Array(kept.length)
  kept.forEach((i, k) => {
    chosen.copy(points, i)
    x[k] = flat.x[i]!
    y[k] = flat.y[i]!
  })
  return { points: chosen, flat: { x, y } }
}

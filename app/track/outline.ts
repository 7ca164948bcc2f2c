import { type Centreline, planePointAt } from '~/track/centreline'
import { station } from '~/track/units'

/** Places of an outline. */
export const OUTLINE_PLACES = 120

/**
 * A centreline in the small, for a drawing a few centimetres wide: places at equal distances along it, in drawing order, the
 * first not repeated. East and north by turns, metres of the line's own plane, to 0.1 m.
 */
export function outlineOf(line: Centreline): number[] {
  const step = line.length / OUTLINE_PLACES
  return Array.from({ length: OUTLINE_PLACES }, (_, i) => planePointAt(line, station(i * step))).flatMap(({ x, y }) => [
    tenth(x),
    tenth(y),
  ])
}

const tenth = (value: number) => Math.round(value * 10) / 10 + 0

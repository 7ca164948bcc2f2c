import type { Centreline } from '~/track/centreline'

/** Which way round a lap goes, seen from above; `crossing` where it crosses itself so that left and right turns cancel. */
export type TurningSense = 'clockwise' | 'anticlockwise' | 'crossing'

/**
 * The sense of a closed line in the order of its positions, by its turning number: the sum of the turns at its vertices in
 * whole turns, +1 anticlockwise, −1 clockwise, 0 for a figure of eight. An area would tell a crossing line wrong.
 */
export function turningSense(line: Pick<Centreline, 'east' | 'north' | 'count'>): TurningSense {
  const { east, north, count } = line
  let turned = 0
  for (let i = 0; i < count; i++) {
    const before = (i + count - 1) % count
    const cross = east[before]! * north[i]! - north[before]! * east[i]!
    const dot = east[before]! * east[i]! + north[before]! * north[i]!
    turned += Math.atan2(cross, dot)
  }
  const turns = Math.round(turned / (2 * Math.PI))
  if (turns === 0) return 'crossing'
  return turns > 0 ? 'anticlockwise' : 'clockwise'
}

const REVERSED: Record<TurningSense, TurningSense> = {
  clockwise: 'anticlockwise',
  anticlockwise: 'clockwise',
  crossing: 'crossing',
}

/** The sense of the same line driven, or driven the other way. */
export const senseDriven = (sense: TurningSense, reversed: boolean): TurningSense => (reversed ? REVERSED[sense] : sense)

import * as fc from 'fast-check'

/** Numbers spread evenly from `least` to `most` in steps of a thousandth: `fc.double` crowds round 0. */
export const evenly = (least: number, most: number) =>
  fc.integer({ min: Math.round(least * 1000), max: Math.round(most * 1000) }).map((thousandths) => thousandths / 1000)

/** A share of a lap: 0 ≤ share < 1, in millionths. */
export const shareOfLap = fc.integer({ min: 0, max: 999_999 }).map((millionths) => millionths / 1e6)

import { describe, expect, it } from 'vitest'
import { makeCentreline } from '~/track/centreline'
import { turningNumber } from '~/track/turning-number'
import type { Position } from '~/track/units'

/** Positions at equal steps of a parameter around 12.6° W, 54.2° N. */
const ring = (shape: (t: number) => readonly [x: number, y: number], count = 60): Position[] =>
  Array.from({ length: count }, (_, i) => {
    const [x, y] = shape((2 * Math.PI * i) / count)
    return [-12.6 + x * 0.006, 54.2 + y * 0.0035]
  })

const anticlockwise = ring((t) => [Math.cos(t), Math.sin(t) * (1 + 0.4 * Math.cos(3 * t))])
const eight = ring((t) => [Math.sin(2 * t), Math.cos(t)])

describe('how often a lap turns round', () => {
  it('once, by the way it is drawn', () => {
    expect(turningNumber(makeCentreline(anticlockwise))).toBe(1)
    expect(turningNumber(makeCentreline([...anticlockwise].reverse()))).toBe(-1)
  })

  it('not at all where the lap crosses itself once', () => {
    expect(turningNumber(makeCentreline(eight))).toBe(0)
  })

  it('wherever the drawing begins', () => {
    const begun = [...anticlockwise.slice(23), ...anticlockwise.slice(0, 23)]
    expect(turningNumber(makeCentreline(begun))).toBe(1)
  })
})

import { expect, test } from 'vitest'
import { makeCentreline } from '~/track/centreline'
import { senseDriven, turningSense } from '~/track/turning-sense'
import type { Position } from '~/track/units'

const ring = (points: readonly (readonly [number, number])[]) =>
  makeCentreline(points.map(([x, y]): Position => [-31.2 + x / 1000, 42.6 + y / 1000]))

const square = [
  [0, 0],
  [5, 0.2],
  [5.3, 4],
  [0.4, 4.6],
] as const

test('a lap that turns left in all is anticlockwise, the same positions backwards are clockwise', () => {
  expect(turningSense(ring(square))).toBe('anticlockwise')
  expect(turningSense(ring([...square].reverse()))).toBe('clockwise')
})
test('a figure of eight has neither sense, whatever its areas', () => {
  const eight = [
    [0, 0],
    [3, 3],
    [6, 2.5],
    [6.2, 0.3],
    [3, 0.1],
    [-1, 4],
    [-2, 1],
  ] as const
  expect(turningSense(ring(eight))).toBe('crossing')
})
test('driving the other way turns the sense, but not that of a figure of eight', () => {
  expect(senseDriven('clockwise', true)).toBe('anticlockwise')
  expect(senseDriven('anticlockwise', false)).toBe('anticlockwise')
  expect(senseDriven('crossing', true)).toBe('crossing')
})

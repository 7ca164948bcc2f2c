import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fitCircle, radiusThrough } from '~/track/circle-fit'
import { gaussian, seededRandom } from '../../tests/support/circuits'

describe('the circle of least squares', () => {
  it('is the circle itself for points on one, wherever it lies and however short the arc', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 8, max: 900 }),
        fc.integer({ min: -6000, max: 6000 }),
        fc.integer({ min: 5, max: 350 }),
        (radius, x, degrees) => {
          const turn = (k: number) => 1 + (k * degrees * Math.PI) / 180 / 20
          const k = Array.from({ length: 21 }, (_, i) => i)
          const circle = fitCircle(
            k.map((i) => x + radius * Math.cos(turn(i))),
            k.map((i) => -x + radius * Math.sin(turn(i))),
          )
          expect(Math.abs((circle?.radius ?? 0) / radius - 1)).toBeLessThan(1e-6)
          expect(Math.hypot((circle?.x ?? 0) - x, (circle?.y ?? 0) + x)).toBeLessThan(1e-6 * radius)
        },
      ),
    )
  })

  it('is right in the middle of many under noise, also on a short arc: 40 m of a circle of 100 m, 0.3 m of noise', () => {
    const random = seededRandom(12)
    const radii = Array.from({ length: 400 }, () => {
      const turns = Array.from({ length: 21 }, (_, k) => k / 50)
      const noise = () => 0.3 * gaussian(random)
      const circle = fitCircle(
        turns.map((turn) => 100 * Math.cos(turn) + noise()),
        turns.map((turn) => 100 * Math.sin(turn) + noise()),
      )
      return circle?.radius ?? Number.NaN
    }).sort((one, other) => one - other)
    expect(radii[200]).toBeGreaterThan(97)
    expect(radii[200]).toBeLessThan(103)
  })

  it('is null for points on a straight line and for fewer than three', () => {
    expect(fitCircle([0, 1, 2, 3.5], [1, 3, 5, 8])).toBeNull()
    expect(fitCircle([4, 4, 4], [1, 2, 9])).toBeNull()
    expect(fitCircle([0, 3], [4, 0])).toBeNull()
    expect(fitCircle([7, 7, 7], [2, 2, 2])).toBeNull()
  })
})

describe('the circle through three points', () => {
  it('is infinite for three points on a straight line', () => {
    expect(radiusThrough([0, 0], [1, 2], [3, 6])).toBe(Infinity)
  })
})

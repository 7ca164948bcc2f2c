import { describe, expect, it } from 'vitest'
import { makeCentreline } from '~/track/centreline'
import { shapeOf, smoothRound, turnBetween, turningOf } from '~/track/curvature'
import { evenPoints, nineCorners, noisy, sparsePoints, toPositions } from '../../tests/support/circuits'

const whole = (values: Float64Array, step: number) => values.reduce((sum, value) => sum + value * step, 0)

describe('turn per metre', () => {
  it('is positive to the left and negative to the right', () => {
    expect(turnBetween(1, 0, 0, 1)).toBeCloseTo(Math.PI / 2, 12)
    expect(turnBetween(0, 1, 1, 0)).toBeCloseTo(-Math.PI / 2, 12)
  })

  it('changes its sign and nothing else when the line is driven the other way', () => {
    const points = evenPoints(nineCorners, 5)
    const x = Float64Array.from(points, (point) => point[0])
    const y = Float64Array.from(points, (point) => point[1])
    const forward = turningOf(x, y, 5)
    const backward = turningOf(x.slice().reverse(), y.slice().reverse(), 5)
    forward.forEach((value, i) => {
      expect(backward[points.length - 1 - i]).toBeCloseTo(-value, 12)
    })
  })

  it('adds up to one turn round a circuit driven anticlockwise, sparse and noisy or not', () => {
    for (const points of [
      evenPoints(nineCorners, 3),
      sparsePoints(nineCorners, 2),
      noisy(evenPoints(nineCorners, 9), 1, 5),
    ]) {
      const shape = shapeOf(makeCentreline(toPositions(points)))
      expect(whole(shape.turning, shape.step)).toBeCloseTo(2 * Math.PI, 6)
    }
  })

  it('stays nothing along a straight drawn as one segment', () => {
    const shape = shapeOf(makeCentreline(toPositions(sparsePoints(nineCorners, 2))))
    // The first straight runs from 77 m to 753 m.
    for (let s = 150; s < 680; s += 10)
      expect(Math.abs(shape.turning[Math.round(s / shape.step)]!)).toBeLessThan(1 / 2000)
  })
})

describe('smoothing round the ring', () => {
  it('keeps the sum and spreads a peak evenly to both sides, across the first sample too', () => {
    const peak = new Float64Array(200)
    peak[0] = 7
    const smooth = smoothRound(peak, 6)
    expect(whole(smooth, 1)).toBeCloseTo(7, 9)
    expect(smooth[5]).toBeCloseTo(smooth[195]!, 12)
    // Peak of a Gaussian: 1/(σ√2π).
    expect(smooth[0]).toBeCloseTo(7 / (6 * Math.sqrt(2 * Math.PI)), 3)
  })
})

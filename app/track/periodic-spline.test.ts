import { describe, expect, it } from 'vitest'
import { sampleSpline } from '~/track/periodic-spline'

/** A circle of 80 m radius by 24 knots, the parameter along the chords. */
const turn = (k: number) => (2 * Math.PI * k) / 24
const chord = 2 * 80 * Math.sin(Math.PI / 24)
const knots = Float64Array.from({ length: 25 }, (_, k) => k * chord)
const x = Float64Array.from({ length: 24 }, (_, k) => 80 * Math.cos(turn(k)))
const y = Float64Array.from({ length: 24 }, (_, k) => 80 * Math.sin(turn(k)))

describe('the periodic cubic spline', () => {
  it('goes through its knots', () => {
    const sampled = sampleSpline(knots, x, y, 96)
    for (let k = 0; k < 24; k++) {
      expect(sampled.x[4 * k]).toBeCloseTo(x[k]!, 9)
      expect(sampled.y[4 * k]).toBeCloseTo(y[k]!, 9)
    }
  })

  it('keeps to a circle between them, the closing piece too', () => {
    const sampled = sampleSpline(knots, x, y, 1000)
    sampled.x.forEach((value, k) => {
      expect(Math.hypot(value, sampled.y[k]!)).toBeCloseTo(80, 2)
    })
  })

  it('takes uneven steps', () => {
    const places = [0, 0.4, 1.1, 1.3, 2.2, 2.9, 3.3, 4.1, 4.6, 5.2, 5.9]
    const uneven = Float64Array.of(...places, 2 * Math.PI)
    const wave = Float64Array.from(places, Math.sin)
    const sampled = sampleSpline(uneven, wave, wave, 500)
    sampled.x.forEach((value, k) => {
      expect(value).toBeCloseTo(Math.sin((2 * Math.PI * k) / 500), 1)
    })
  })
})

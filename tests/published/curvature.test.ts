import { describe, expect, it } from 'vitest'
import { makeCentreline } from '~/track/centreline'
import { fitCircle, radiusThrough } from '~/track/circle-fit'
import { proposeCorners } from '~/track/corners'
import { shapeOf, turningOf } from '~/track/curvature'
import { evenPoints, nineCorners, type Point, toPositions } from '../support/circuits'

describe('the circle through three points (Menger: R = abc/4Δ; derived values)', () => {
  it('is 3.125 for (0, 0), (3, 4), (6, 0)', () => {
    expect(radiusThrough([0, 0], [3, 4], [6, 0])).toBe(3.125)
  })

  it('is 5 for three points on the circle of 5', () => {
    expect(Math.abs(radiusThrough([5, 0], [3, 4], [-4, 3]) - 5)).toBeLessThan(1e-12)
  })

  it.each([
    [20, 0.5, 100.25],
    [100, 12.5, 106.25],
  ] as const)('is c²/8h + h/2 for a chord of %d m and a rise of %d m: %d m', (chord, rise, radius) => {
    expect(radiusThrough([-chord / 2, 0], [0, rise], [chord / 2, 0])).toBeCloseTo(radius, 9)
  })
})

describe('the circle of least squares on exact points (derived)', () => {
  it('gives radius and middle to a billionth of the radius', () => {
    const circle = fitCircle([5, 3, -4, 0, -3], [0, 4, 3, -5, -4])
    expect(Math.abs(circle!.radius - 5)).toBeLessThan(5e-9)
    expect(Math.hypot(circle!.x, circle!.y)).toBeLessThan(5e-9)
  })

  it('gives nothing for points on a straight line', () => {
    expect(fitCircle([0, 1, 2, 3], [0, 2, 4, 6])).toBeNull()
  })
})

describe('an ellipse of 150 m by 100 m (derived)', () => {
  const points = Array.from({ length: 4000 }, (_, k): Point => {
    const turn = (2 * Math.PI * k) / 4000
    return [150 * Math.cos(turn), 100 * Math.sin(turn)]
  })
  const line = makeCentreline(toPositions(points, [9, 48]))

  it('is 793.27197946 m round: 4a·E(e²)', () => {
    expect(Math.abs(line.length - 793.27197946)).toBeLessThan(0.001)
  })

  it('bends with b²/a = 66.6667 m at its ends and a²/b = 225 m between', () => {
    const shape = shapeOf(line)
    const radiusNear = (share: number) => 1 / shape.turning[Math.round(share * shape.count) % shape.count]!
    expect(Math.abs(radiusNear(0) / 66.6667 - 1)).toBeLessThan(0.002)
    expect(Math.abs(radiusNear(0.5) / 66.6667 - 1)).toBeLessThan(0.002)
    expect(Math.abs(radiusNear(0.25) / 225 - 1)).toBeLessThan(0.002)
    expect(Math.abs(radiusNear(0.75) / 225 - 1)).toBeLessThan(0.002)
  })

  it('is proposed with the ends as tightest places: radius within 5 %, since the circle is fitted over the whole tight part', () => {
    const corners = proposeCorners(line)
    expect(corners).toHaveLength(2)
    for (const { leastRadius } of corners) expect(Math.abs(leastRadius / 66.6667 - 1)).toBeLessThan(0.05)
    expect(corners[0]!.apex).toBeCloseTo(0, -1)
    expect(corners[1]!.apex / line.length).toBeCloseTo(0.5, 2)
  })
})

describe('a clothoid, κ = s/A²', () => {
  /** Places by series in τ = s²/2A² (X = s(1 − τ²/10 + τ⁴/216 − …), Y = s(τ/3 − τ³/42 + τ⁵/1320 − …)). */
  const place = (a: number, s: number): Point => {
    const tau = (s * s) / (2 * a * a)
    let [x, y, term] = [0, 0, s]
    for (let k = 0; k < 12; k++) {
      x += term / (4 * k + 1)
      term *= tau / (2 * k + 1)
      y += term / (4 * k + 3)
      term *= -tau / (2 * k + 2)
    }
    return [x, y]
  }

  // A, L, R, X, Y: first terms at https://so-okada.github.io/math_teaching_materials/clothoid_highway_demo.html,
  // integrated numerically; the first row is the exercise at https://mat.geogebra.org/m/pPu6Kb3z (r = 9 m, L = 16 m).
  const table = [
    [12, 16, 9, 14.7812, 4.4798],
    [100, 50, 200, 49.9219, 2.081],
    [100, 100, 100, 97.5288, 16.3714],
    [150, 112.5, 200, 111.6134, 10.4874],
  ] as const

  it.each(table)('A %d, L %d ends at R %d, X %d, Y %d', (a, length, radius, x, y) => {
    expect((a * a) / length).toBeCloseTo(radius, 9)
    expect(place(a, length)[0]).toBeCloseTo(x, 3)
    expect(place(a, length)[1]).toBeCloseTo(y, 3)
  })

  it('turns by 50.9296° over 16 m at A 12 (the exercise prints 50,92°, cut off)', () => {
    const steps = Array.from({ length: 1601 }, (_, k) => place(12, k / 100))
    const turning = turningOf(
      Float64Array.from(steps, (p) => p[0]),
      Float64Array.from(steps, (p) => p[1]),
      0.01,
    )
    const turn = turning.slice(1, -1).reduce((sum, value) => sum + value * 0.01, 0)
    expect((turn * 180) / Math.PI).toBeCloseTo(50.93, 1)
  })

  it('has a turn per metre in proportion to the distance: κ = s/10⁴ at A 100 within 1 %', () => {
    const steps = Array.from({ length: 201 }, (_, k) => place(100, k))
    const turning = turningOf(
      Float64Array.from(steps, (p) => p[0]),
      Float64Array.from(steps, (p) => p[1]),
      1,
    )
    for (let s = 10; s <= 190; s++) expect(Math.abs(turning[s]! / (s / 1e4) - 1)).toBeLessThan(0.01)
  })
})

describe('signs (ISO 8855: left positive)', () => {
  it('change when the line is driven the other way, magnitudes do not', () => {
    const points = evenPoints(nineCorners, 4)
    const x = Float64Array.from(points, (point) => point[0])
    const y = Float64Array.from(points, (point) => point[1])
    const forward = turningOf(x, y, 4)
    const backward = turningOf(x.slice().reverse(), y.slice().reverse(), 4).reverse()
    expect(Math.max(...forward)).toBeGreaterThan(0.01)
    forward.forEach((value, i) => {
      expect(backward[i]).toBeCloseTo(-value, 12)
    })
  })
})

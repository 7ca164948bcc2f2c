import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { makePlane, normalLongitude, straightDistance } from '~/track/plane'
import { evenly } from '../../tests/support/arbitraries'

const middles = fc.tuple(fc.double({ min: -180, max: 180, noNaN: true }), fc.double({ min: -60, max: 70, noNaN: true }))
const places = fc.record({
  x: evenly(-20_000, 20_000),
  y: evenly(-20_000, 20_000),
})

describe('the tangent plane', () => {
  it('leads from metres to degrees and back to the same metres, anywhere from 60° S to 70° N', () => {
    fc.assert(
      fc.property(middles, places, (middle, place) => {
        const plane = makePlane([middle])
        const back = plane.toPlane(plane.toLngLat(place))
        expect(Math.hypot(back.x - place.x, back.y - place.y)).toBeLessThan(1e-6)
      }),
    )
  })

  it('leads from degrees to metres and back to the same degrees within a billionth', () => {
    fc.assert(
      fc.property(middles, evenly(-0.2, 0.2), ([longitude, latitude], aside) => {
        const plane = makePlane([[longitude, latitude]])
        const position = [normalLongitude(longitude + aside), latitude - aside / 3] as const
        const back = plane.toLngLat(plane.toPlane(position))
        expect(Math.abs(normalLongitude(back[0] - position[0]))).toBeLessThan(1e-9)
        expect(Math.abs(back[1] - position[1])).toBeLessThan(1e-9)
      }),
    )
  })

  it('has its zero at the middle of the bounding box, x to the east and y to the north', () => {
    const plane = makePlane([
      [7, 50],
      [7.02, 50.01],
    ])
    expect(plane.toLngLat({ x: 0, y: 0 })[0]).toBeCloseTo(7.01, 12)
    expect(plane.toLngLat({ x: 0, y: 0 })[1]).toBeCloseTo(50.005, 12)
    expect(plane.toPlane([7.02, 50.005]).x).toBeGreaterThan(700)
    expect(plane.toPlane([7.01, 50.01]).y).toBeGreaterThan(500)
  })

  it('takes the short way across 180° of longitude', () => {
    const plane = makePlane([
      [179.99, -17],
      [-179.97, -17.01],
    ])
    expect(plane.toLngLat({ x: 0, y: 0 })[0]).toBeCloseTo(-179.99, 12)
    expect(plane.toPlane([179.99, -17]).x).toBeCloseTo(-plane.toPlane([-179.97, -17]).x, 6)
    expect(Math.abs(plane.toPlane([179.99, -17]).x)).toBeLessThan(3000)
  })

  it('says how far true north leans away from the y axis: west of it on the eastern side of the northern half', () => {
    const plane = makePlane([[10, 60]])
    expect(plane.northAt([10, 60.05])).toBeCloseTo(0, 12)
    // Convergence of the meridians: Δλ·sin φ to first order (derived).
    expect(plane.northAt([10.1, 60])).toBeCloseTo(-0.1 * Math.sin(Math.PI / 3), 4)
    expect(makePlane([[10, -40]]).northAt([10.1, -40])).toBeCloseTo(0.1 * Math.sin((40 * Math.PI) / 180), 4)
  })

  it('refuses to be made of nothing', () => {
    expect(() => makePlane([])).toThrow(RangeError)
  })
})

describe('the straight distance', () => {
  it('is the same both ways, nothing between a position and itself, and takes the short way across 180°', () => {
    expect(straightDistance([1, 2], [1.3, 2.2])).toBe(straightDistance([1.3, 2.2], [1, 2]))
    expect(straightDistance([5, 6], [5, 6])).toBe(0)
    expect(straightDistance([179.999, 10], [-179.998, 10])).toBeCloseTo(straightDistance([0.001, 10], [0.004, 10]), 6)
  })
})

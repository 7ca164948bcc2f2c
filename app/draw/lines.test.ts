import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Point } from '~/draw/display-list'
import { clipLine, clipRing, insideRing, segmentDistance2, simplifyLine, simplifyRing } from '~/draw/lines'

const box = { x: 10, y: 20, width: 200, height: 90 }
const point = fc.tuple(fc.double({ min: -300, max: 400, noNaN: true }), fc.double({ min: -300, max: 400, noNaN: true }))
const line = fc.array(point, { minLength: 2, maxLength: 30 })

const inBox = ([x, y]: Point) => x >= 9.999 && x <= 210.001 && y >= 19.999 && y <= 110.001
const distance = (at: Point, points: readonly Point[]) =>
  Math.sqrt(Math.min(...points.slice(1).map((to, i) => segmentDistance2(at, points[i]!, to))))

/** Twice the area between a ring and the y axis. */
const area2 = (ring: readonly Point[]) =>
  Math.abs(
    ring.reduce((sum, [x, y], i) => {
      const [nx, ny] = ring[(i + 1) % ring.length]!
      return sum + x * ny - nx * y
    }, 0),
  )

describe('a line cut to a box', () => {
  it('stays in the box and on the line', () => {
    fc.assert(
      fc.property(line, (points) => {
        for (const at of clipLine(points, box).flat()) {
          expect(inBox(at)).toBe(true)
          expect(distance(at, points)).toBeLessThan(1e-6)
        }
      }),
    )
  })

  it('keeps every point that lay in the box', () => {
    fc.assert(
      fc.property(line, (points) => {
        const kept = clipLine(points, box).flat()
        for (const at of points.filter(([x, y]) => x > 10 && x < 210 && y > 20 && y < 110)) {
          expect(kept.some(([x, y]) => x === at[0] && y === at[1])).toBe(true)
        }
      }),
    )
  })
})

describe('a ring cut to a box', () => {
  it('covers of a square what both share', () => {
    const square: Point[] = [
      [100, 50],
      [300, 50],
      [300, 260],
      [100, 260],
    ]
    expect(area2(clipRing(square, box)) / 2).toBeCloseTo(110 * 60, 6)
    expect(clipRing(square, { x: 310, y: 50, width: 5, height: 5 })).toEqual([])
  })
})

describe('a thinned line', () => {
  it('leaves the given one by no more than the tolerance, and keeps its ends', () => {
    fc.assert(
      fc.property(line, fc.double({ min: 0.1, max: 40, noNaN: true }), (points, tolerance) => {
        const thinned = simplifyLine(points, tolerance)
        expect(thinned[0]).toEqual(points[0])
        expect(thinned.at(-1)).toEqual(points.at(-1))
        for (const at of points) expect(distance(at, thinned)).toBeLessThanOrEqual(tolerance + 1e-6)
      }),
    )
  })

  it('keeps a ring a ring', () => {
    const circle = Array.from({ length: 180 }, (_, i): Point => {
      const angle = (i * Math.PI) / 90
      return [50 + 40 * Math.cos(angle), 60 + 40 * Math.sin(angle)]
    })
    const thinned = simplifyRing(circle, 0.5)
    expect(thinned.length).toBeLessThan(40)
    expect(area2(thinned) / 2).toBeGreaterThan(0.97 * Math.PI * 1600)
    expect(insideRing([50, 60], thinned)).toBe(true)
    expect(insideRing([95, 60], thinned)).toBe(false)
  })
})

import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { makeSegmentGrid, nearestSegment } from '~/track/segment-grid'
import { evenly } from '../../tests/support/arbitraries'

/** Distance squared from (px, py) to the segment between two vertices of a ring. */
function toSegment(x: Float64Array, y: Float64Array, i: number, px: number, py: number): number {
  const j = (i + 1) % x.length
  const [dx, dy] = [x[j]! - x[i]!, y[j]! - y[i]!]
  const along = ((px - x[i]!) * dx + (py - y[i]!) * dy) / (dx * dx + dy * dy || 1)
  const share = Math.max(0, Math.min(1, along))
  return (px - x[i]! - share * dx) ** 2 + (py - y[i]! - share * dy) ** 2
}

describe('the grid of segments', () => {
  it('finds what looking at every segment finds, near the ring, far from it and off the grid', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(evenly(-400, 400), evenly(-300, 300)), { minLength: 3, maxLength: 40, size: 'max' }),
        fc.oneof(
          fc.tuple(evenly(-420, 420), evenly(-320, 320)),
          fc.tuple(evenly(-900_000, 900_000), evenly(-900_000, 900_000)),
        ),
        (vertices, [px, py]) => {
          const x = Float64Array.from(vertices, (v) => v[0])
          const y = Float64Array.from(vertices, (v) => v[1])
          const distance = (i: number) => toSegment(x, y, i, px, py)
          const found = nearestSegment(makeSegmentGrid(x, y), px, py, x.length, distance)
          const least = Math.min(...vertices.map((_, i) => distance(i)))
          expect(Math.sqrt(distance(found))).toBeCloseTo(Math.sqrt(least), 6)
        },
      ),
      { numRuns: 500 },
    )
  })

  it('stays small for a ring as wide as a country road circuit', () => {
    const grid = makeSegmentGrid(Float64Array.of(0, 9000, 9100), Float64Array.of(0, 0, 8000))
    expect(grid.columns * grid.rows).toBeLessThan(70_000)
    expect(grid.cell).toBeGreaterThan(25)
  })
})

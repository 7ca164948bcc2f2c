import { describe, expect, it } from 'vitest'
import { makeCentreline } from './centreline'
import { OUTLINE_PLACES, outlineOf } from './outline'
import type { Position } from './units'

/** A ring round a place in open sea, of as many positions as asked for. */
const ring = (positions: number) =>
  makeCentreline(
    Array.from({ length: positions }, (_, i): Position => {
      const angle = (i / positions) * 2 * Math.PI
      return [-31 + 0.013 * Math.cos(angle), 39 + 0.007 * Math.sin(angle)]
    }),
  )

const pairs = (outline: readonly number[]) =>
  Array.from({ length: outline.length / 2 }, (_, i) => [outline[2 * i]!, outline[2 * i + 1]!] as const)

describe('an outline', () => {
  it.each([9, 2400])('has the same number of places for a line of %i positions', (positions) => {
    expect(outlineOf(ring(positions))).toHaveLength(2 * OUTLINE_PLACES)
  })

  it('begins where the line begins, and each place is as far along from the one before', () => {
    const line = ring(3000)
    const places = pairs(outlineOf(line))
    expect(places[0]![0]).toBeCloseTo(line.x[0]!, 0)
    expect(places[0]![1]).toBeCloseTo(line.y[0]!, 0)
    const step = line.length / OUTLINE_PLACES
    for (const [i, [x, y]] of places.entries()) {
      const [nextX, nextY] = places[(i + 1) % places.length]!
      const apart = Math.hypot(nextX - x, nextY - y)
      expect(apart).toBeLessThan(step + 0.2)
      expect(apart).toBeGreaterThan(step - 0.7)
    }
  })

  it('is as wide and as high as its line', () => {
    const line = ring(3000)
    const places = pairs(outlineOf(line))
    const extent = (values: readonly number[]) => Math.max(...values) - Math.min(...values)
    expect(Math.abs(extent(places.map(([x]) => x)) - extent([...line.x]))).toBeLessThan(2)
    expect(Math.abs(extent(places.map(([, y]) => y)) - extent([...line.y]))).toBeLessThan(2)
  })
})

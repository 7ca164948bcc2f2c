import { describe, expect, it } from 'vitest'
import type { Point } from '~/draw/display-list'
import { contourStep, type GroundFeature, readGround, watersOf } from '~/draw/ground'
import { dotRows, hatchLines, marshTufts } from '~/draw/hatch'
import { insideRing, segmentDistance2 } from '~/draw/lines'
import { parallelLine, WATER_LINES } from '~/draw/water-lines'
import { drawnGround, drawnRoad } from '../../tests/support/drawings'

const road = drawnRoad()
const features = readGround(drawnGround(road), road.frame.centreline.plane)
const asPoints = (ring: readonly { x: number; y: number }[]): Point[] => ring.map(({ x, y }) => [x, y])

const coast = (points: Point[]): GroundFeature => ({
  kind: 'coast',
  name: null,
  height: null,
  rings: [],
  lines: [points.map(([x, y]) => ({ x, y }))],
  points: [],
})

/** Starts and ends of the strokes of path data made of M, L and h. */
function strokes(d: string): Point[] {
  return d
    .split('M')
    .slice(1)
    .flatMap((piece): Point[] => {
      const [x, y, run] = piece.split(/[ hL]/).map(Number) as [number, number, number]
      return piece.includes('h')
        ? [
            [x, y],
            [x + run, y],
          ]
        : [[x, y]]
    })
}

const bean: Point[] = Array.from({ length: 60 }, (_, i) => {
  const angle = (i * Math.PI) / 30
  const r = 60 + 22 * Math.cos(3 * angle)
  return [200 + r * Math.cos(angle), 150 + r * Math.sin(angle)]
})

describe('the ground of a layout', () => {
  it('has the step of its contours, none where there is one height alone', () => {
    expect(contourStep(features)).toBe(5)
    expect(contourStep(features.filter(({ height }) => height === null || height === 10))).toBeNull()
  })

  it('leaves out what it does not know', () => {
    const odd = {
      type: 'Feature' as const,
      properties: { kind: 'volcano' },
      geometry: { type: 'Point' as const, coordinates: [1, 2] },
    }
    const read = readGround({ type: 'FeatureCollection', features: [odd] }, road.frame.centreline.plane)
    expect(read).toEqual([])
    expect(readGround(null, road.frame.centreline.plane)).toEqual([])
  })

  it('has the sea on the side of the coast away from the road, whichever way the coast was drawn', () => {
    const line = features.find(({ kind }) => kind === 'coast')!.lines[0]!
    for (const drawn of [line, [...line].reverse()]) {
      const [water] = watersOf([coast(asPoints(drawn))], road.lap())
      const sea = asPoints(water!.area)
      const south = Math.min(...line.map(({ y }) => y)) - 300
      expect(insideRing([line[20]!.x, south], sea)).toBe(true)
      for (const { x, y } of road.lap()) expect(insideRing([x, y], sea)).toBe(false)
    }
  })
})

describe('water lines', () => {
  const shore: Point[] = Array.from({ length: 60 }, (_, i) => [i * 9, 60 + 35 * Math.sin(i / 6)])

  it.each(WATER_LINES)('run %s px from the shore on its one side', (distance) => {
    const points = parallelLine(shore, distance, 1).flat()
    expect(points.length).toBeGreaterThan(20)
    for (const at of points) {
      const nearest = Math.sqrt(Math.min(...shore.slice(1).map((to, i) => segmentDistance2(at, shore[i]!, to))))
      expect(nearest).toBeGreaterThanOrEqual(distance - 0.3)
      expect(nearest).toBeLessThanOrEqual(distance + 1e-6)
    }
  })

  it('lie right of a shore drawn to the right on a picture whose y points down', () => {
    const level: Point[] = [
      [0, 100],
      [400, 100],
    ]
    expect(parallelLine(level, 17, 1)[0]!.every(([, y]) => y === 117)).toBe(true)
    expect(parallelLine(level, 17, -1)[0]!.every(([, y]) => y === 83)).toBe(true)
  })
})

describe('hatches', () => {
  it('set every dot inside the ring', () => {
    const dots = strokes(dotRows(bean, 7))
    expect(dots.length).toBeGreaterThan(60)
    for (const [x, y] of dots) expect(insideRing([x - 0.05, y], bean)).toBe(true)
  })

  it('lie on one grid, whatever the ring', () => {
    const moved = bean.map(([x, y]): Point => [x + 3, y + 2])
    const rows = (ring: Point[]) => new Set(strokes(dotRows(ring, 7)).map(([, y]) => Math.round((y / 3.5) * 10) % 10))
    expect(rows(moved)).toEqual(rows(bean))
  })

  it('draw tufts inside the marsh alone', () => {
    const { blades, water } = marshTufts(bean)
    const feet = strokes(water)
    expect(feet.length).toBeGreaterThan(10)
    expect(blades.split('M').length - 1).toBe(1.5 * feet.length)
    for (const [x, y] of feet) expect(insideRing([x, y - 2], bean)).toBe(true)
  })

  it('cross a ring at the given angle', () => {
    const d = hatchLines(bean, 45, 6)
    for (const stroke of d.split('M').slice(1)) {
      const [x1, y1, x2, y2] = stroke.split(/[L ]/).map(Number) as [number, number, number, number]
      if (Math.hypot(x2 - x1, y2 - y1) > 20) expect((y2 - y1) / (x2 - x1)).toBeCloseTo(1, 1)
    }
  })
})

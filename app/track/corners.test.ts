import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { makeCentreline, roadDistance, signedGap } from '~/track/centreline'
import { cornerStretches, type ProposedCorner, proposeCorners, proposeCornersInFrame } from '~/track/corners'
import { frameAsDrawn, makeFrame } from '~/track/layout-frame'
import { along, metres, type Station, station } from '~/track/units'
import {
  evenPoints,
  figureEight,
  nineCorners,
  noisy,
  outAndBack,
  type Point,
  type Ring,
  roundedRing,
  sparsePoints,
  toPositions,
} from '../../tests/support/circuits'

const lineOf = (points: readonly Point[]) => makeCentreline(toPositions(points))

/** Compares proposals with the ring's own corners one by one: a sampled line is a little shorter, so places are scaled. */
function expectCorners(points: readonly Point[], ring: Ring, reach: { apex: number; turn: number; radius: number }) {
  const line = lineOf(points)
  const found = proposeCorners(line)
  expect(found.map((corner) => corner.direction)).toEqual(
    ring.corners.map((corner) => (corner.turn > 0 ? 'left' : 'right')),
  )
  const scale = line.length / ring.length
  found.forEach((corner, i) => {
    const truth = ring.corners[i]!
    expect(Math.abs(signedGap(line, station(truth.apex * scale), corner.apex))).toBeLessThan(reach.apex)
    expect(Math.abs(corner.turnDegrees - Math.abs(truth.turn))).toBeLessThan(reach.turn)
    expect(Math.abs(corner.leastRadius / truth.radius - 1)).toBeLessThan(reach.radius)
  })
}

describe('corners proposed', () => {
  it('are those of the road on a closely drawn line: apex within 3 m, turn within 3°, radius within 3 %', () => {
    expectCorners(evenPoints(nineCorners, 2), nineCorners, { apex: 3, turn: 3, radius: 0.03 })
    expectCorners(evenPoints(nineCorners, 5), nineCorners, { apex: 4, turn: 3, radius: 0.04 })
  })

  it('are those of the road on sparse lines whose straights are single segments', () => {
    for (const seed of [1, 2, 3, 4, 5, 6]) {
      expectCorners(sparsePoints(nineCorners, seed), nineCorners, { apex: 12, turn: 6, radius: 0.45 })
    }
  })

  it('are those of the road on lines with 1 m of noise, one corner more or less', () => {
    for (const seed of [1, 2, 3, 4, 5, 6]) {
      for (const points of [sparsePoints(nineCorners, seed), evenPoints(nineCorners, 9), evenPoints(nineCorners, 3)]) {
        const line = lineOf(noisy(points, 1, seed + 50))
        const found = proposeCorners(line)
        expect(Math.abs(found.length - 9)).toBeLessThanOrEqual(1)
        const scale = line.length / nineCorners.length
        for (const truth of nineCorners.corners) {
          const near = found.filter((c) => Math.abs(signedGap(line, station(truth.apex * scale), c.apex)) < 50)
          expect(near.map((corner) => corner.direction)).toContain(truth.turn > 0 ? 'left' : 'right')
        }
      }
    }
  })

  it('are found on a circuit that crosses itself, two to the left and two to the right', () => {
    expectCorners(evenPoints(figureEight, 4), figureEight, { apex: 3, turn: 3, radius: 0.02 })
  })

  it('begin and end within 12 m of the arc on a closely drawn line', () => {
    const line = lineOf(evenPoints(nineCorners, 2))
    proposeCorners(line).forEach((corner, i) => {
      expect(Math.abs(signedGap(line, station(nineCorners.corners[i]!.from), corner.entry))).toBeLessThan(12)
      expect(Math.abs(signedGap(line, station(nineCorners.corners[i]!.until), corner.exit))).toBeLessThan(12)
    })
  })

  it('take a hairpin of two close arcs as one corner and a chicane as two', () => {
    expect(proposeCorners(lineOf(evenPoints(outAndBack, 3)))).toHaveLength(2)
    const chicane = roundedRing([
      [0, 0, 70],
      [300, 0, 40],
      [360, 40, 40],
      [700, 40, 80],
      [700, 500, 90],
      [0, 500, 60],
    ])
    const directions = proposeCorners(lineOf(evenPoints(chicane, 4))).map((corner) => corner.direction)
    expect(directions).toEqual(['left', 'left', 'right', 'left', 'left', 'left'])
  })

  it('are two where the road opens between two tight parts of the same hand', () => {
    const double = roundedRing([
      [0, 0, 60],
      [500, 0, 50],
      [560, 110, 45],
      [540, 420, 80],
      [0, 400, 70],
    ])
    expect(proposeCorners(lineOf(evenPoints(double, 3)))).toHaveLength(5)
  })

  it('leave out bends wider than 400 m and kinks under 20°', () => {
    const gentle = roundedRing([
      [0, 0, 80],
      [700, 0, 90],
      [770, 300, 600],
      [700, 600, 100],
      [350, 560, 60],
      [0, 600, 70],
    ])
    const found = proposeCorners(lineOf(evenPoints(gentle, 4)))
    expect(found.map((corner) => Math.round(corner.turnDegrees / 10))).not.toContain(1)
    expect(found).toHaveLength(4)
  })

  it('stay the same, turned round, when the line is drawn the other way', () => {
    const points = sparsePoints(nineCorners, 8)
    const line = lineOf(points)
    const turned = lineOf([points[0]!, ...points.slice(1).reverse()])
    const mirrored = proposeCorners(turned).reverse()
    proposeCorners(line).forEach((corner, i) => {
      expect(mirrored[i]!.direction).not.toBe(corner.direction)
      expect(Math.abs(signedGap(line, corner.apex, station(line.length - mirrored[i]!.apex)))).toBeLessThan(5)
      expect(mirrored[i]!.turnDegrees).toBeCloseTo(corner.turnDegrees, 0)
    })
  })

  it('are found wherever the first position lies, one across the start line too', () => {
    const points = evenPoints(nineCorners, 4)
    fc.assert(
      fc.property(fc.nat({ max: points.length - 1 }), (k) => {
        expect(proposeCorners(lineOf([...points.slice(k), ...points.slice(0, k)]))).toHaveLength(9)
      }),
      { numRuns: 20 },
    )
  })

  it('are one on a ring that bends one way all round, and none on one too wide', () => {
    const circle = (radius: number) =>
      Array.from({ length: 200 }, (_, k): Point => [radius * Math.cos(k * 0.0314159), radius * Math.sin(k * 0.0314159)])
    expect(proposeCorners(lineOf(circle(100)))).toHaveLength(1)
    expect(proposeCorners(lineOf(circle(500)))).toEqual([])
  })
})

describe('corners in a layout', () => {
  const line = lineOf(evenPoints(nineCorners, 4))
  const drawn = proposeCorners(line)

  it('keep their places on the ground when the start line moves or the direction turns', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 999 }), fc.boolean(), (thousandth, reversed) => {
        const frame = makeFrame(line, { startAlong: along((thousandth / 1000) * line.length), reversed })
        const found = proposeCornersInFrame(frame)
        const places = (corner: ProposedCorner) =>
          [corner.entry, corner.apex, corner.exit].map((s): number => frame.toAlong(s))
        const expected = drawn.map((c) => (reversed ? [c.exit, c.apex, c.entry] : [c.entry, c.apex, c.exit]))
        expect(found).toHaveLength(expected.length)
        for (const corner of found) {
          const [entry, apex, exit] = places(corner) as [number, number, number]
          const match = expected.find((places) => Math.abs(places[1]! - apex) < 1e-6)
          expect(match?.[0]).toBeCloseTo(entry, 6)
          expect(match?.[2]).toBeCloseTo(exit, 6)
        }
        expect(found.map((corner) => corner.apex)).toEqual(found.map((corner) => corner.apex).sort((a, b) => a - b))
      }),
      { numRuns: 20 },
    )
  })

  it('turn to the other hand in the other direction', () => {
    const hands = (corners: ProposedCorner[]) => corners.map((corner) => corner.direction)
    const backward = makeFrame(line, { startAlong: along(0), reversed: true })
    const other = { left: 'right', right: 'left' }
    expect(hands(proposeCornersInFrame(backward)).reverse()).toEqual(hands(drawn).map((hand) => other[hand]))
    expect(proposeCornersInFrame(frameAsDrawn(line))).toEqual(drawn)
  })
})

describe("corners' stretches", () => {
  it('begin where the corner before ends and cover the lap once', () => {
    const line = lineOf(evenPoints(nineCorners, 4))
    const corners = proposeCorners(line)
    const stretches = cornerStretches(corners)
    expect(stretches[0]!.from).toBe(corners.at(-1)!.exit)
    stretches.forEach((stretch, i) => {
      expect(stretch.until).toBe(corners[i]!.exit)
      expect(stretch.from).toBe(corners.at(i - 1)!.exit)
    })
    const covered = stretches.reduce((sum, { from, until }) => sum + roadDistance(line, from, until), 0)
    expect(covered).toBeCloseTo(line.length, 6)
  })

  it('are the whole lap for a single corner and none for none', () => {
    const exit: Station = station(metres(321))
    expect(cornerStretches([{ exit }])).toEqual([{ from: exit, until: exit }])
    expect(cornerStretches([])).toEqual([])
  })
})

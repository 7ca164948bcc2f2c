import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  type Centreline,
  headingAt,
  heightAt,
  locate,
  makeCentreline,
  pointAt,
  roadDistance,
  signedGap,
  sliceOf,
  straightDistance,
} from '~/track/centreline'
import { makePlane } from '~/track/plane'
import { type Offset, offset, type Position, type Station, station } from '~/track/units'
import { evenly, shareOfLap as share } from '../../tests/support/arbitraries'
import {
  evenPoints,
  figureEight,
  nineCorners,
  noisy,
  type Point,
  sparsePoints,
  toPositions,
} from '../../tests/support/circuits'

const dense = makeCentreline(toPositions(evenPoints(nineCorners, 2)))
const sparse = makeCentreline(toPositions(sparsePoints(nineCorners, 7)))
/** 500 m to the east, 400 m to the north and back, round the middle. */
const rectangle = makeCentreline(
  toPositions([
    [-250, -200],
    [250, -200],
    [250, 200],
    [-250, 200],
  ]),
)
const metresAside = (reach: number) => evenly(-reach, reach).map(offset)

const at = (line: Centreline, part: number): Station => station(part * line.length)

function expectRoundTrip(line: Centreline, from: Station, aside: Offset) {
  const found = locate(line, pointAt(line, from, aside))
  expect(Math.abs(signedGap(line, from, found.station))).toBeLessThan(1e-6)
  expect(found.offset).toBeCloseTo(aside, 6)
}

describe('station and offset', () => {
  it('lead to a point and back, as far out as the tightest corner is round, on a line of 2 m steps', () => {
    fc.assert(fc.property(share, metresAside(20), (part, aside) => expectRoundTrip(dense, at(dense, part), aside)))
  })

  it('lead to a point and back on a sparse line with a single segment for each straight', () => {
    fc.assert(fc.property(share, metresAside(12), (part, aside) => expectRoundTrip(sparse, at(sparse, part), aside)))
  })

  it('lead to a point and back at every vertex', () => {
    for (const vertex of sparse.stations.slice(0, -1)) {
      for (const aside of [-11, -4, 0, 5, 12]) expectRoundTrip(sparse, station(vertex), offset(aside))
    }
  })

  it('lead from a point to the same point: a mark stays where it was put', () => {
    fc.assert(
      fc.property(share, metresAside(11), metresAside(3), (part, aside, along) => {
        const ahead = station(at(sparse, part) + along)
        const point = pointAt(dense, ahead, aside)
        const found = locate(sparse, point)
        expect(straightDistance(pointAt(sparse, found.station, found.offset), point)).toBeLessThan(1e-6)
      }),
    )
  })

  it('count the offset as the distance from the line, left positive', () => {
    const { toLngLat } = makePlane([[-12.6, 54.2]])
    const left = locate(rectangle, toLngLat({ x: -50, y: -193 }))
    expect(left.station).toBeCloseTo(200, 1)
    expect(left.offset).toBeCloseTo(7, 1)
    expect(locate(rectangle, toLngLat({ x: 70, y: -208 })).offset).toBeCloseTo(-8, 1)
    expect(locate(rectangle, toLngLat({ x: 241, y: 30 })).offset).toBeCloseTo(9, 1)
  })

  it('stay below the lap length and not below 0 round the start line', () => {
    fc.assert(
      fc.property(metresAside(3), metresAside(6), (along, aside) => {
        const found = locate(dense, pointAt(dense, station(along), aside))
        expect(found.station).toBeGreaterThanOrEqual(0)
        expect(found.station).toBeLessThan(dense.length)
        expect(Math.abs(signedGap(dense, station(along), found.station))).toBeLessThan(1e-6)
      }),
    )
  })

  it('are taken round the lap: one lap on is the same point', () => {
    const lapOn = pointAt(dense, station(dense.length + 123))
    expect(straightDistance(lapOn, pointAt(dense, station(123)))).toBeLessThan(1e-6)
    expect(straightDistance(pointAt(dense, station(-50)), pointAt(dense, station(dense.length - 50)))).toBeLessThan(
      1e-6,
    )
  })

  it('take a far point and a point of NaN without ado', () => {
    expect(Math.abs(locate(dense, [-12.6, 60]).offset)).toBeGreaterThan(500_000)
    expect(locate(dense, [Number.NaN, 54]).station).toBeNaN()
  })

  it('have no gap and no fold along a parallel at six metres: small steps stay small', () => {
    for (const aside of [-6, 6]) {
      let before = pointAt(sparse, station(0), offset(aside))
      for (let s = 0.5; s < sparse.length; s += 0.5) {
        const here = pointAt(sparse, station(s), offset(aside))
        const step = straightDistance(before, here)
        expect(step).toBeGreaterThan(0.2)
        expect(step).toBeLessThan(0.9)
        before = here
      }
    }
  })
})

describe('the length', () => {
  const lengthOf = (points: readonly Point[]) => makeCentreline(toPositions(points)).length

  it('counts the closing segment once, whether or not the first position comes again at the end', () => {
    const square: Point[] = [
      [0, 0],
      [300, 0],
      [300, 200],
      [0, 200],
    ]
    expect(lengthOf(square)).toBeCloseTo(1000, 5)
    expect(lengthOf([...square, square[0]!])).toBeCloseTo(1000, 5)
    expect(lengthOf([...square, square[0]!, square[0]!])).toBeCloseTo(1000, 5)
  })

  it('is the same from whichever position the ring begins, and in either direction', () => {
    const points = noisy(sparsePoints(nineCorners, 3), 2, 4)
    fc.assert(
      fc.property(fc.nat({ max: points.length - 1 }), (k) => {
        const turned = [...points.slice(k), ...points.slice(0, k)]
        expect(lengthOf(turned)).toBeCloseTo(lengthOf(points), 6)
        expect(lengthOf(turned.reverse())).toBeCloseTo(lengthOf(points), 6)
      }),
    )
  })

  it('does not grow by repeated positions, and no heading becomes NaN there', () => {
    const points = evenPoints(nineCorners, 25)
    const repeated = makeCentreline(toPositions(points.flatMap((point) => [point, point, point])))
    expect(repeated.length).toBeCloseTo(lengthOf(points), 6)
    expect(repeated.count).toBe(points.length)
    for (let s = 0; s < repeated.length; s += 10) expect(headingAt(repeated, station(s))).not.toBeNaN()
  })

  it('is refused for fewer than three different positions', () => {
    expect(() =>
      makeCentreline(
        toPositions([
          [0, 0],
          [100, 0],
          [0, 0],
        ]),
      ),
    ).toThrow(RangeError)
    expect(() => makeCentreline([])).toThrow(RangeError)
  })
})

describe('distances along the road', () => {
  it('add up: there and back is one lap, and a place is nothing from itself', () => {
    fc.assert(
      fc.property(share, share, (one, other) => {
        const [from, to] = [at(dense, one), at(dense, other)]
        const there = roadDistance(dense, from, to)
        expect(there).toBeGreaterThanOrEqual(0)
        expect(there).toBeLessThan(dense.length)
        if (there > 1e-9) expect(there + roadDistance(dense, to, from)).toBeCloseTo(dense.length, 6)
      }),
    )
    expect(roadDistance(dense, station(77), station(77))).toBe(0)
  })

  it('run on across the start line', () => {
    expect(roadDistance(dense, station(dense.length - 30), station(45))).toBeCloseTo(75, 9)
    expect(signedGap(dense, station(45), station(dense.length - 30))).toBeCloseTo(-75, 9)
    expect(signedGap(dense, station(0), station(dense.length / 2))).toBeCloseTo(dense.length / 2, 9)
  })
})

describe('the heading', () => {
  it('is clockwise from north: 90° on a road to the east, 0° to the north', () => {
    expect(headingAt(rectangle, station(250))).toBeCloseTo(90, 1)
    expect(headingAt(rectangle, station(700)) % 359.9).toBeCloseTo(0, 1)
    expect(headingAt(rectangle, station(1150))).toBeCloseTo(270, 1)
  })

  it('turns steadily through the vertices of a sparse line', () => {
    let before = headingAt(sparse, station(0))
    for (let s = 0.5; s < sparse.length; s += 0.5) {
      const here = headingAt(sparse, station(s))
      expect(Math.abs(((here - before + 540) % 360) - 180)).toBeLessThan(4)
      before = here
    }
  })
})

describe('heights on the line', () => {
  const withHeights = (heights: readonly (number | undefined)[]): Centreline => {
    const corners = toPositions([
      [0, 0],
      [100, 0],
      [100, 60],
      [0, 60],
    ])
    return makeCentreline(
      corners.map(([x, y], i): Position => (heights[i] === undefined ? [x, y] : [x, y, heights[i]])),
    )
  }

  it('run straight from vertex to vertex', () => {
    const line = withHeights([10, 14, 20, 30])
    expect(heightAt(line, station(25))).toBeCloseTo(11, 6)
    expect(heightAt(line, station(130))).toBeCloseTo(17, 6)
    expect(heightAt(line, station(275))).toBeCloseTo(25, 6)
  })

  it('are null where either end has none, a void or a 0 among heights', () => {
    const line = withHeights([10, undefined, 0, -32768])
    expect([25, 130, 200, 290].map((s) => heightAt(line, station(s)))).toEqual([null, null, null, null])
  })
})

describe('a stretch cut from the line', () => {
  const inLength = (positions: readonly Position[]) =>
    positions.slice(1).reduce((sum, position, i) => sum + straightDistance(positions[i]!, position), 0)

  it('is as long as the road between its ends, also across the first position', () => {
    fc.assert(
      fc.property(share, share, (one, other) => {
        const [from, to] = [at(sparse, one), at(sparse, other)]
        const cut = sliceOf(sparse, from, to)
        expect(inLength(cut)).toBeCloseTo(roadDistance(sparse, from, to) || sparse.length, 4)
        expect(straightDistance(cut[0]!, pointAt(sparse, from))).toBeLessThan(1e-6)
        expect(straightDistance(cut.at(-1)!, pointAt(sparse, to))).toBeLessThan(1e-6)
      }),
    )
  })

  it('is the whole lap, closed, where both ends are the same', () => {
    const lap = sliceOf(sparse, station(40), station(40))
    expect(inLength(lap)).toBeCloseTo(sparse.length, 4)
    expect(lap).toHaveLength(sparse.count + 2)
  })

  it('has no position twice where it begins or ends on a vertex', () => {
    const [from, to] = [station(sparse.stations[3]!), station(sparse.stations[6]!)]
    expect(sliceOf(sparse, from, to)).toHaveLength(4)
  })

  it('carries heights where the line has them and none where not', () => {
    const ring: Position[] = toPositions([
      [0, 0],
      [80, 0],
      [80, 50],
      [0, 50],
    ]).map(([x, y], i) => (i < 2 ? [x, y, 5 + i] : [x, y]))
    const cut = sliceOf(makeCentreline(ring), station(40), station(100))
    expect(cut.map((position) => position[2])).toEqual([expect.closeTo(5.5, 6), 6, undefined])
  })
})

describe('a figure eight', () => {
  it('has a length and stations like any other ring', () => {
    const line = makeCentreline(toPositions(evenPoints(figureEight, 3)))
    expect(line.length / figureEight.length).toBeCloseTo(1, 3)
    fc.assert(
      fc.property(share, metresAside(8), (part, aside) => {
        const from = at(line, part)
        const found = locate(line, pointAt(line, from, aside), from)
        expect(Math.abs(signedGap(line, from, found.station))).toBeLessThan(1e-6)
        expect(found.offset).toBeCloseTo(aside, 6)
      }),
    )
  })
})

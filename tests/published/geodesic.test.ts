import { distance as turfDistance } from '@turf/turf'
import * as fc from 'fast-check'
import proj4 from 'proj4'
import { describe, expect, it } from 'vitest'
import { headingAt, makeCentreline, roadDistance, sliceOf, straightDistance } from '~/track/centreline'
import { makePlane } from '~/track/plane'
import { type LngLat, station } from '~/track/units'
import { evenPoints, nineCorners, type Point, roundedRing, sparsePoints, toPositions } from '../support/circuits'
import { geodesic, lengthAlong, wgs84 } from '../support/geodesic'

/** What every length a reader sees must keep to: 0.02 % of the geodesic. */
const tolerance = 0.0002

describe('Flinders Peak to Buninyong', () => {
  // GDA94 Technical Manual, test line on GRS 80, as quoted by others; WGS 84 differs by less than 1 µm.
  const dms = (degrees: number, minutes: number, seconds: number) => degrees + minutes / 60 + seconds / 3600
  const flindersPeak: LngLat = [dms(144, 25, 29.5244), -dms(37, 57, 3.7203)]
  const buninyong: LngLat = [dms(143, 55, 35.3839), -dms(37, 39, 10.1561)]

  it('is 54,972.271 m at 306°52′05.37″ by the reference', () => {
    const there = geodesic(flindersPeak, buninyong)
    expect(Math.abs(there.length - 54_972.271)).toBeLessThan(0.001)
    expect(Math.abs(there.azimuth + 360 - dms(306, 52, 5.37))).toBeLessThan(0.01 / 3600)
    expect(Math.abs(geodesic(buninyong, flindersPeak).azimuth - dms(127, 10, 25.07))).toBeLessThan(0.01 / 3600)
  })

  it('is that within 0.02 % by the straight distance and by the plane', () => {
    expect(Math.abs(straightDistance(flindersPeak, buninyong) / 54_972.271 - 1)).toBeLessThan(tolerance)
    const plane = makePlane([flindersPeak, buninyong])
    const [from, to] = [plane.toPlane(flindersPeak), plane.toPlane(buninyong)]
    expect(Math.abs(Math.hypot(to.x - from.x, to.y - from.y) / 54_972.271 - 1)).toBeLessThan(tolerance)
  })
})

describe('distances of a track’s size', () => {
  // Derived: geodesics on WGS 84, computed with GeographicLib. From, to, length in metres, azimuth in degrees.
  const vectors: [LngLat, LngLat, number, number][] = [
    [[-1, 52], [-0.99, 52], 686.7802, 89.99606],
    [[-1, 52], [-1, 52.01], 1112.6745, 0],
    [[-1, 52], [-0.99, 52.01], 1307.5192, 31.677488],
    [[50.5, 26], [50.51, 26.01], 1493.2081, 42.100306],
    [[144.97, -37.85], [144.98, -37.84], 1416.5649, 38.417207],
    [[0, 0], [0.01, 0.01], 1569.0347, 45.192423],
  ]

  it.each(vectors)('%j to %j', (from, to, length, azimuth) => {
    expect(geodesic(from, to).length).toBeCloseTo(length, 4)
    expect(straightDistance(from, to)).toBeCloseTo(length, 3)
    const plane = makePlane([from, to])
    const [a, b] = [plane.toPlane(from), plane.toPlane(to)]
    expect(Math.hypot(b.x - a.x, b.y - a.y)).toBeCloseTo(length, 3)
    const inPlane = (Math.atan2(b.x - a.x, b.y - a.y) * 180) / Math.PI
    expect(inPlane - plane.northAt(from)).toBeCloseTo(azimuth, 3)
  })

  it('a heading on the line is the azimuth of the geodesic', () => {
    const line = makeCentreline(toPositions(sparsePoints(nineCorners, 4), [25.3, 61.2]))
    for (let i = 0; i < line.count; i++) {
      const middle = station((line.stations[i]! + line.stations[i + 1]!) / 2)
      const { azimuth } = geodesic(line.positions[i]!, line.positions[(i + 1) % line.count]!)
      if (line.stations[i + 1]! - line.stations[i]! < 45) continue
      expect(Math.abs(((headingAt(line, middle) - azimuth + 540) % 360) - 180)).toBeLessThan(0.01)
    }
  })
})

describe('the sphere and the web map’s plane', () => {
  // Derived: relative error of the haversine with R = 6,371,008.8 m, percent: latitude, north–south, 45°, east–west.
  const errors = [
    [0, 0.561, 0.225, -0.112],
    [15, 0.494, 0.18, -0.134],
    [30, 0.309, 0.057, -0.195],
    [40, 0.144, -0.053, -0.25],
    [45, 0.057, -0.111, -0.279],
    [50, -0.031, -0.169, -0.308],
    [52, -0.065, -0.192, -0.32],
    [60, -0.195, -0.279, -0.363],
    [70, -0.329, -0.368, -0.407],
  ] as const

  it.each(errors)(
    'at %d° Turf’s sphere is off as published, the straight distance is not',
    (latitude, north, diagonal, east) => {
      const from: LngLat = [8.4, latitude]
      for (const [azimuth, percent] of [
        [0, north],
        [45, diagonal],
        [90, east],
      ] as const) {
        for (const length of [100, 5000]) {
          const there = wgs84.Direct(latitude, 8.4, azimuth, length)
          const to: LngLat = [there.lon2!, there.lat2!]
          const sphere = turfDistance([...from], [...to], { units: 'meters' })
          expect(Math.abs((sphere / length - 1) * 100 - percent)).toBeLessThan(0.0012)
          expect(Math.abs(straightDistance(from, to) / length - 1)).toBeLessThan(1e-6)
        }
      }
    },
  )

  it.each([
    [0, 1.006],
    [26, 1.118],
    [45, 1.417],
    [52, 1.626],
    [60, 1.999],
  ] as const)(
    'at %d° the web map’s metres are %d times too long to be used (derived; the mean of both directions)',
    (latitude, factor) => {
      const [from, north]: LngLat[] = [
        [3, latitude],
        [3, latitude + 0.01],
      ] as const
      const [a, b] = [from!, north!].map((position) => proj4('EPSG:3857', [...position]) as [number, number])
      const ratio = Math.hypot(b![0] - a![0], b![1] - a![1]) / straightDistance(from!, north!)
      expect(ratio).toBeCloseTo(factor, 2)
    },
  )
})

describe('the local plane', () => {
  // Derived: radii of curvature of WGS 84 in metres: latitude, meridian M, prime vertical N.
  it.each([
    [45, 6367381.816, 6388838.29],
    [52, 6375149.741, 6391435.268],
  ] as const)('at %d° has the scale of the ellipsoid’s own radii', (latitude, m, n) => {
    const plane = makePlane([[7, latitude]])
    const step = 1e-4
    const radians = (step * Math.PI) / 180
    const north = plane.toPlane([7, latitude + step]).y - plane.toPlane([7, latitude - step]).y
    const east = plane.toPlane([7 + step, latitude]).x - plane.toPlane([7 - step, latitude]).x
    expect(north / (2 * radians)).toBeCloseTo(m, -1)
    expect(east / (2 * radians) / Math.cos((latitude * Math.PI) / 180)).toBeCloseTo(n, -1)
  })

  it('has 68.7 mm for a millionth of a degree of longitude at 52° (derived)', () => {
    expect(makePlane([[-1, 52]]).toPlane([-1 + 1e-6, 52]).x).toBeCloseTo(0.0687, 4)
  })

  it('lies within 2 mm of a transverse Mercator centred on the circuit, 2.5 km out (proj4)', () => {
    const mercator = proj4('+proj=tmerc +lat_0=61.5 +lon_0=23.8 +k=1 +ellps=WGS84 +units=m')
    const plane = makePlane([[23.8, 61.5]])
    for (const azimuth of [0, 30, 75, 140, 200, 265, 310]) {
      const there = wgs84.Direct(61.5, 23.8, azimuth, 2500)
      const ours = plane.toPlane([there.lon2!, there.lat2!])
      const [x, y] = mercator.forward([there.lon2!, there.lat2!])
      expect(Math.hypot(ours.x - x!, ours.y - y!)).toBeLessThan(0.002)
    }
  })
})

describe('every stretch and straight distance is within 0.02 % of the geodesic', () => {
  const share = fc.integer({ min: 0, max: 9999 }).map((part) => part / 10_000)
  const middles = fc
    .tuple(fc.integer({ min: -180_000, max: 179_999 }), fc.integer({ min: -60_000, max: 70_000 }))
    .map(([longitude, latitude]): LngLat => [longitude / 1000, latitude / 1000])
  /** A circuit of 30 km, the longest taken: 14.4 km there and back. */
  const outAndBack = roundedRing([
    [-7200, -60, 50],
    [7200, -200, 60],
    [7200, 200, 60],
    [-7200, 90, 50],
  ])
  const shapes: Record<string, readonly Point[]> = {
    'a circuit of 2.7 km': evenPoints(nineCorners, 30),
    'a ring of 30 km': Array.from(
      { length: 300 },
      (_, k): Point => [4770 * Math.cos(k * 0.020944), 4770 * Math.sin(k * 0.020944)],
    ),
    'a circuit of 29 km, 14 km there and back': evenPoints(outAndBack, 400),
    'the same from north to south': evenPoints(outAndBack, 400).map(([x, y]): Point => [y, -x]),
  }

  it.each(Object.keys(shapes))('%s, anywhere from 60° S to 70° N', (name) => {
    fc.assert(
      fc.property(middles, share, share, (middle, one, other) => {
        const line = makeCentreline(toPositions(shapes[name]!, middle))
        expect(Math.abs(line.length / lengthAlong([...line.positions, line.positions[0]!]) - 1)).toBeLessThan(tolerance)
        const [from, to] = [station(one * line.length), station(other * line.length)]
        const cut = sliceOf(line, from, to)
        const road = roadDistance(line, from, to) || line.length
        expect(Math.abs(road - lengthAlong(cut))).toBeLessThan(tolerance * road + 1e-4)
        const straight = geodesic(cut[0]!, cut.at(-1)!).length
        expect(Math.abs(straightDistance(cut[0]!, cut.at(-1)!) - straight)).toBeLessThan(tolerance * straight + 1e-4)
        const [a, b] = [line.plane.toPlane(cut[0]!), line.plane.toPlane(cut.at(-1)!)]
        expect(Math.abs(Math.hypot(b.x - a.x, b.y - a.y) - straight)).toBeLessThan(tolerance * straight + 1e-4)
      }),
      { numRuns: 60 },
    )
  })
})

describe('closed lines', () => {
  const polygon = (sides: number, radius: number) =>
    Array.from({ length: sides }, (_, k): Point => {
      const turn = (2 * Math.PI * k) / sides
      return [radius * Math.cos(turn), radius * Math.sin(turn)]
    })

  it('a regular 1,000-gon of 100 m radius is 628.317497 m round, its closing side counted once (derived)', () => {
    const { length } = makeCentreline(toPositions(polygon(1000, 100)))
    expect(Math.abs(length - 628.317497)).toBeLessThan(1e-5)
    expect(length).toBeLessThan(628.318531)
  })

  it.each([
    [5, 4.17e-4],
    [10, 1.67e-3],
  ] as const)(
    'chords of %d m on a bend of 50 m are short by %d of its length (Δ²/24R², derived)',
    (chord, shortfall) => {
      const sides = Math.round((2 * Math.PI * 50) / chord)
      const { length } = makeCentreline(toPositions(polygon(sides, 50)))
      expect(Math.abs(1 - length / (2 * Math.PI * 50) - shortfall)).toBeLessThan(shortfall * 0.03)
    },
  )

  it('the distance from one mark to another is (s₂ − s₁) modulo the length', () => {
    const line = makeCentreline(toPositions(polygon(1000, 100)))
    expect(roadDistance(line, station(600), station(20))).toBeCloseTo(48.317497, 5)
    expect(roadDistance(line, station(20), station(600))).toBeCloseTo(580, 9)
  })
})

import { describe, expect, it } from 'vitest'
import { makeCentreline } from '~/track/centreline'
import { cornerStretches, proposeCorners } from '~/track/corners'
import { cornerFeature, featureCollection, lineFeature, pointFeature, polygonFeature } from '~/track/geojson'
import { frameAsDrawn, makeFrame } from '~/track/layout-frame'
import { along, type LngLat, type Position, station } from '~/track/units'
import { evenPoints, nineCorners, toPositions } from '../../tests/support/circuits'

const positions = toPositions(evenPoints(nineCorners, 8)).map(([x, y], i): Position => [x, y, 20 + i / 8])
const line = makeCentreline(positions)

/** Twice the signed area of a closed ring, counter-clockwise positive. */
const area = (ring: readonly number[][]) =>
  ring.slice(1).reduce((sum, q, i) => sum + ring[i]![0]! * q[1]! - q[0]! * ring[i]![1]!, 0)

describe("a corner's segment", () => {
  const corners = proposeCorners(line)
  const stretches = cornerStretches(corners)

  it('is a LineString in driving order from the corner before to its own exit, longitude first, height third', () => {
    const frame = frameAsDrawn(line)
    const segment = cornerFeature(frame, stretches[2]!, { number: '3' }, 'c-3')
    expect(segment).toMatchObject({
      type: 'Feature',
      id: 'c-3',
      properties: { number: '3' },
      geometry: { type: 'LineString' },
    })
    const points = segment.geometry.coordinates as number[][]
    expect(points[0]![0]).toBeCloseTo(frame.pointAt(corners[1]!.exit)[0], 6)
    expect(points.at(-1)![1]).toBeCloseTo(frame.pointAt(corners[2]!.exit)[1], 6)
    expect(points.every((point) => point.length === 3)).toBe(true)
    expect(segment).not.toHaveProperty('crs')
  })

  it('has seven decimals and no position twice', () => {
    const points = cornerFeature(frameAsDrawn(line), stretches[0]!, null).geometry.coordinates as number[][]
    for (const [i, [longitude, latitude]] of points.entries()) {
      expect(longitude).toBe(Number(longitude!.toFixed(7)))
      expect(latitude).toBe(Number(latitude!.toFixed(7)))
      if (i > 0) expect(points[i]).not.toEqual(points[i - 1])
    }
  })

  it('runs the other way in a layout driven the other way', () => {
    const backward = makeFrame(line, { startAlong: along(0), reversed: true })
    const stretch = { from: station(100), until: station(400) }
    const there = cornerFeature(backward, stretch, null).geometry.coordinates as number[][]
    const mirrored = { from: station(line.length - 400), until: station(line.length - 100) }
    const here = cornerFeature(frameAsDrawn(line), mirrored, null).geometry.coordinates as number[][]
    expect(there.length).toBe(here.length)
    expect(there[0]![0]).toBeCloseTo(here.at(-1)![0]!, 6)
    expect(there.at(-1)![1]).toBeCloseTo(here[0]![1]!, 6)
  })

  it('has no heights where the line has none', () => {
    const flat = frameAsDrawn(makeCentreline(toPositions(evenPoints(nineCorners, 8))))
    const points = cornerFeature(flat, stretches[1]!, null).geometry.coordinates as number[][]
    expect(points.every((point) => point.length === 2)).toBe(true)
  })
})

describe('a line across 180° of longitude', () => {
  it('is cut there into two (RFC 7946, 3.1.9: its own example)', () => {
    expect(
      lineFeature(
        [
          [170, 45],
          [-170, 45],
        ],
        null,
      ).geometry,
    ).toEqual({
      type: 'MultiLineString',
      coordinates: [
        [
          [170, 45],
          [180, 45],
        ],
        [
          [-180, 45],
          [-170, 45],
        ],
      ],
    })
  })

  it('is cut at every crossing, either way, latitude and height in proportion', () => {
    const there: Position[] = [
      [179.9, 10, 4],
      [-179.9, 11, 8],
      [-179.8, 12, 9],
      [179.8, 14, 1],
    ]
    expect(lineFeature(there, null).geometry.coordinates).toEqual([
      [
        [179.9, 10, 4],
        [180, 10.5, 6],
      ],
      [
        [-180, 10.5, 6],
        [-179.9, 11, 8],
        [-179.8, 12, 9],
        [-180, 13, 5],
      ],
      [
        [180, 13, 5],
        [179.8, 14, 1],
      ],
    ])
  })

  it('is not cut where it only touches', () => {
    expect(
      lineFeature(
        [
          [179.5, 1],
          [-180, 2],
        ],
        null,
      ).geometry,
    ).toEqual({
      type: 'LineString',
      coordinates: [
        [179.5, 1],
        [180, 2],
      ],
    })
    expect(
      lineFeature(
        [
          [-180, 3],
          [-179.5, 4],
        ],
        null,
      ).geometry,
    ).toEqual({
      type: 'LineString',
      coordinates: [
        [-180, 3],
        [-179.5, 4],
      ],
    })
  })

  it('needs two positions that differ', () => {
    expect(() =>
      lineFeature(
        [
          [1, 2],
          [1, 2],
        ],
        null,
      ),
    ).toThrow(RangeError)
    expect(() => lineFeature([], null)).toThrow(RangeError)
  })
})

describe('a polygon', () => {
  const clockwise: LngLat[] = [
    [5, 50],
    [5, 50.1],
    [5.2, 50.1],
    [5.2, 50],
  ]
  const hole: LngLat[] = [
    [5.05, 50.02],
    [5.15, 50.02],
    [5.15, 50.08],
    [5.05, 50.08],
    [5.05, 50.02],
  ]

  it('is closed, its exterior counter-clockwise and its holes clockwise, whichever way it was drawn', () => {
    for (const exterior of [clockwise, [...clockwise].reverse(), [...clockwise, clockwise[0]!]]) {
      const { geometry } = polygonFeature([exterior, hole], { kind: 'gravel' })
      expect(geometry.type).toBe('Polygon')
      const [outer, inner] = geometry.coordinates as number[][][]
      expect(outer).toHaveLength(5)
      expect(outer![0]).toEqual(outer!.at(-1))
      expect(area(outer!)).toBeGreaterThan(0)
      expect(area(inner!)).toBeLessThan(0)
      expect(inner!.at(-1)).toEqual(inner![0])
    }
  })

  it('is cut at 180° of longitude into two, each counter-clockwise (RFC 7946, 3.1.9: its own example)', () => {
    const { geometry } = polygonFeature(
      [
        [
          [170, 40],
          [-170, 40],
          [-170, 50],
          [170, 50],
        ],
      ],
      null,
    )
    expect(geometry.type).toBe('MultiPolygon')
    const polygons = geometry.coordinates as number[][][][]
    expect(polygons).toHaveLength(2)
    for (const [ring] of polygons) expect(area(ring!)).toBeCloseTo(200, 9)
    expect(polygons.flat(2).every(([longitude]) => longitude! >= -180 && longitude! <= 180)).toBe(true)
  })

  it('keeps a hole in the part it lies in', () => {
    const outer: LngLat[] = [
      [179, -20],
      [-179, -20],
      [-179, -18],
      [179, -18],
    ]
    const { geometry } = polygonFeature(
      [
        outer,
        [
          [-179.6, -19.5],
          [-179.4, -19.5],
          [-179.5, -19],
        ],
      ],
      null,
    )
    expect((geometry.coordinates as number[][][][]).map((polygon) => polygon.length).sort()).toEqual([1, 2])
  })
})

describe('features', () => {
  it('carry properties and an id only where there is one, and gather in a collection', () => {
    const post = pointFeature([5.123456789, 50.987654321, 12.345], { name: 'Post 9' })
    expect(post).toEqual({
      type: 'Feature',
      geometry: { type: 'Point', coordinates: [5.1234568, 50.9876543, 12.35] },
      properties: { name: 'Post 9' },
    })
    expect(featureCollection([post])).toEqual({ type: 'FeatureCollection', features: [post] })
    expect(featureCollection([])).toEqual({ type: 'FeatureCollection', features: [] })
    expect(pointFeature([1, 2], null, 'a').id).toBe('a')
  })
})

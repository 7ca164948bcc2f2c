import type {
  Feature,
  FeatureCollection,
  GeoJsonProperties,
  Geometry,
  LineString,
  MultiLineString,
  MultiPolygon,
  Point,
  Polygon,
} from 'geojson'
import type { Stretch } from '~/track/corners'
import type { LayoutFrame } from '~/track/layout-frame'
import type { LngLat, Position } from '~/track/units'

/*
 * GeoJSON for others, as RFC 7946 asks of a writer: longitude, latitude, height; no crs member (4); exterior rings
 * counter-clockwise, holes clockwise, both closed (3.1.6); nothing across ±180° (3.1.9).
 */

type Coordinates = [longitude: number, latitude: number, height?: number]

/** 1e-7° is about 1 cm on the ground; heights are given to 1 cm. */
const rounded = (value: number, decimals: number) => Number(value.toFixed(decimals)) + 0
const coordinates = ([longitude, latitude, height]: LngLat | Position): Coordinates =>
  height === undefined
    ? [rounded(longitude, 7), rounded(latitude, 7)]
    : [rounded(longitude, 7), rounded(latitude, 7), rounded(height, 2)]

const feature = <G extends Geometry>(geometry: G, properties: GeoJsonProperties, id?: string): Feature<G> =>
  id === undefined ? { type: 'Feature', geometry, properties } : { type: 'Feature', id, geometry, properties }

const same = (p: Coordinates, q: Coordinates) => p[0] === q[0] && p[1] === q[1]

/** Where the segment meets longitude `meridian`, the longitudes counted on past 180°; height only where both ends have one. */
function crossing(p: Coordinates, q: Coordinates, meridian: number): Coordinates {
  const share = (meridian - p[0]) / (q[0] - p[0])
  const between = (from: number, to: number) => from + share * (to - from)
  const latitude = between(p[1], q[1])
  return p[2] === undefined || q[2] === undefined ? [meridian, latitude] : [meridian, latitude, between(p[2], q[2])]
}

/** Each longitude moved by whole turns to lie within 180° of the one before, so that a line runs on across ±180°. */
function runningOn(positions: readonly (LngLat | Position)[]): Coordinates[] {
  let before = positions[0]![0]
  return positions.map(([longitude, latitude, height]) => {
    before += longitude - before - 360 * Math.round((longitude - before) / 360)
    return height === undefined ? [before, latitude] : [before, latitude, height]
  })
}

const shifted = (points: readonly Coordinates[], turns: number) =>
  points.map((point): Coordinates => [point[0] - 360 * turns, point[1], ...(point.slice(2) as [number?])])

/** The number of the turn that a longitude counted past 180° falls in: 0 from −180° to 180°. */
const turnOf = (longitude: number) => Math.floor((longitude + 180) / 360)

/** The pieces of a line between crossings of ±180°, each within −180…180. */
function linePieces(positions: readonly (LngLat | Position)[]): Coordinates[][] {
  const points = runningOn(positions)
  const pieces: Coordinates[][] = []
  let piece = [points[0]!]
  let turn = turnOf(points[0]![0])
  for (let i = 1; i < points.length; i++) {
    const next = turnOf(points[i]![0])
    if (next !== turn) {
      const edge = crossing(points[i - 1]!, points[i]!, 360 * Math.max(turn, next) - 180)
      pieces.push(shifted([...piece, edge], turn))
      piece = [edge]
      turn = next
    }
    piece.push(points[i]!)
  }
  pieces.push(shifted(piece, turn))
  return pieces
    .map((line) => line.map(coordinates).filter((point, i, all) => i === 0 || !same(point, all[i - 1]!)))
    .filter((line) => line.length > 1)
}

/**
 * A line as a feature: a LineString, or a MultiLineString cut at ±180° where it crosses. Needs two positions that differ;
 * throws a RangeError without.
 */
export function lineFeature(
  positions: readonly (LngLat | Position)[],
  properties: GeoJsonProperties,
  id?: string,
): Feature<LineString | MultiLineString> {
  const pieces = positions.length > 0 ? linePieces(positions) : []
  if (pieces.length === 0) throw new RangeError('A line needs two different positions')
  const geometry: LineString | MultiLineString =
    pieces.length === 1
      ? { type: 'LineString', coordinates: pieces[0] as number[][] }
      : { type: 'MultiLineString', coordinates: pieces as number[][][] }
  return feature(geometry, properties, id)
}

/** A corner's stretch of the centreline in driving order, with heights where the centreline has them. */
export function cornerFeature(
  frame: Pick<LayoutFrame, 'sliceOf'>,
  stretch: Stretch,
  properties: GeoJsonProperties,
  id?: string,
): Feature<LineString | MultiLineString> {
  return lineFeature(frame.sliceOf(stretch.from, stretch.until), properties, id)
}

export const pointFeature = (position: LngLat | Position, properties: GeoJsonProperties, id?: string): Feature<Point> =>
  feature({ type: 'Point', coordinates: coordinates(position) as number[] }, properties, id)

/** Twice the signed area of a closed ring in square degrees: positive counter-clockwise. */
const signedArea = (ring: readonly Coordinates[]) =>
  ring.reduce((sum, p, i) => {
    const q = ring[(i + 1) % ring.length]!
    return sum + p[0] * q[1] - q[0] * p[1]
  }, 0)

/** Rounded, without repeats, closed, and turned the way asked for. */
function closedRing(points: readonly Coordinates[], counterClockwise: boolean): Coordinates[] {
  const ring = points.map(coordinates).filter((point, i, all) => !same(point, all.at(i - 1)!))
  if (signedArea(ring) > 0 !== counterClockwise) ring.reverse()
  return [...ring, ring[0]!]
}

/** The part of a ring on one side of a meridian (Sutherland and Hodgman, Comm. ACM 17, 1974, 32–42). */
function clipped(ring: readonly Coordinates[], meridian: number, side: 1 | -1): Coordinates[] {
  const inside = (point: Coordinates) => side * (point[0] - meridian) >= 0
  return ring.flatMap((point, i) => {
    const before = ring.at(i - 1)!
    const entering = inside(point) !== inside(before) ? [crossing(before, point, meridian)] : []
    return inside(point) ? [...entering, point] : entering
  })
}

/**
 * A polygon from its exterior ring and its holes, closed or not, in either winding: exterior counter-clockwise, holes
 * clockwise; a MultiPolygon cut at ±180° where the exterior crosses. Rings need three positions that differ.
 */
export function polygonFeature(
  rings: readonly (readonly (LngLat | Position)[])[],
  properties: GeoJsonProperties,
  id?: string,
): Feature<Polygon | MultiPolygon> {
  const running = rings.map((ring) => runningOn([rings[0]![0]!, ...ring]).slice(1))
  const turns = running[0]!.map((point) => turnOf(point[0]))
  const west = Math.min(...turns)
  const polygons: number[][][][] = []
  for (let turn = west; turn <= Math.max(...turns); turn++) {
    const parts = running
      .map((ring) => clipped(clipped(ring, 360 * turn - 180, 1), 360 * turn + 180, -1))
      .map((ring, k) => closedRing(shifted(ring, turn), k === 0))
    if (parts[0]!.length > 3) polygons.push(parts.filter((ring) => ring.length > 3) as number[][][])
  }
  const geometry: Polygon | MultiPolygon =
    polygons.length === 1
      ? { type: 'Polygon', coordinates: polygons[0]! }
      : { type: 'MultiPolygon', coordinates: polygons }
  return feature(geometry, properties, id)
}

export const featureCollection = <G extends Geometry>(features: readonly Feature<G>[]): FeatureCollection<G> => ({
  type: 'FeatureCollection',
  features: [...features],
})

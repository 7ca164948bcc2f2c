import type { Feature, FeatureCollection, Position as GeoPosition } from 'geojson'
import type { Plane, PlanePoint } from '~/track/plane'
import { type Metres, metres } from '~/track/units'

/** What `properties.kind` of a ground feature may be. Anything else is left out of a drawing. */
export const GROUND_KINDS = [
  'coast',
  'inlet',
  'marsh',
  'contour',
  'gravel',
  'paddock',
  'pit-lane',
  'pit-building',
  'grandstand',
  'groyne',
  'breakwater',
  'lane',
  'building',
  'mast',
] as const
export type GroundKind = (typeof GROUND_KINDS)[number]

/** One thing on the ground in plane metres: the rings of an area, or lines, or points. */
export interface GroundFeature {
  kind: GroundKind
  name: string | null
  /** Of a contour, metres. */
  height: number | null
  rings: PlanePoint[][]
  lines: PlanePoint[][]
  points: PlanePoint[]
}

const isKind = (value: unknown): value is GroundKind => (GROUND_KINDS as readonly unknown[]).includes(value)

/** Read once for each collection and plane: both are immutable, and a page draws from them many times. */
const read = new WeakMap<FeatureCollection, { plane: Plane; features: GroundFeature[] }>()

/**
 * The ground of a layout in its plane. Features of an unknown `properties.kind`, and geometry collections, are left out.
 * @param collection WGS 84, RFC 7946 axis order; null where a layout has no ground
 */
export function readGround(collection: FeatureCollection | null, plane: Plane): readonly GroundFeature[] {
  if (!collection) return []
  const known = read.get(collection)
  if (known?.plane === plane) return known.features
  const features = collection.features.flatMap((feature) => {
    const kind = feature.properties?.kind
    return isKind(kind) ? [inPlane(feature, kind, plane)] : []
  })
  read.set(collection, { plane, features })
  return features
}

function inPlane(feature: Feature, kind: GroundKind, plane: Plane): GroundFeature {
  const { name, height } = feature.properties ?? {}
  const line = (positions: GeoPosition[]) => positions.map(([lng, lat]) => plane.toPlane([lng!, lat!]))
  const ring = (positions: GeoPosition[]) => line(positions.slice(0, -1))
  const inside: GroundFeature = {
    kind,
    name: typeof name === 'string' ? name : null,
    height: typeof height === 'number' ? height : null,
    rings: [],
    lines: [],
    points: [],
  }
  const { geometry } = feature
  if (geometry.type === 'Polygon') inside.rings = geometry.coordinates.map(ring)
  if (geometry.type === 'MultiPolygon') inside.rings = geometry.coordinates.flat().map(ring)
  if (geometry.type === 'LineString') inside.lines = [line(geometry.coordinates)]
  if (geometry.type === 'MultiLineString') inside.lines = geometry.coordinates.map(line)
  if (geometry.type === 'Point') inside.points = line([geometry.coordinates])
  if (geometry.type === 'MultiPoint') inside.points = line(geometry.coordinates)
  return inside
}

/** Metres between one contour and the next; null where there are none, or one alone. */
export function contourStep(features: readonly GroundFeature[]): Metres | null {
  const heights = [...new Set(features.flatMap(({ kind, height }) => (kind === 'contour' ? (height ?? []) : [])))]
  const sorted = heights.sort((a, b) => a - b)
  const steps = sorted.slice(1).map((height, i) => height - sorted[i]!)
  return steps.length === 0 ? null : metres(Math.min(...steps))
}

/** A ring is where a line comes back to its first point. */
export function isClosed(line: readonly PlanePoint[]): boolean {
  const first = line[0]
  const last = line.at(-1)
  return line.length > 3 && first !== undefined && last !== undefined && first.x === last.x && first.y === last.y
}

/** Water: an area to fill, and its shore as far as it was drawn. */
export interface Water {
  name: string | null
  area: PlanePoint[]
  shore: PlanePoint[]
}

/**
 * The waters among the features. A coast drawn as a line is closed far outside on the side away from the land.
 * @param land a point known to be dry: any one of the road
 */
export function watersOf(features: readonly GroundFeature[], land: readonly PlanePoint[]): Water[] {
  return features
    .filter(({ kind }) => kind === 'coast' || kind === 'inlet')
    .flatMap(({ name, rings, lines }) => [
      ...rings.map((ring) => ({ name, area: ring, shore: [...ring, ring[0]!] })),
      ...lines.map((line) => ({ name, area: isClosed(line) ? line.slice(0, -1) : closeFar(line, land), shore: line })),
    ])
}

/** Cross product of the line's step at i with the way from it to a point: positive where the point lies left. */
function sideOf(line: readonly PlanePoint[], i: number, point: PlanePoint): number {
  const a = line[i]!
  const b = line[i + 1]!
  return (b.x - a.x) * (point.y - a.y) - (b.y - a.y) * (point.x - a.x)
}

/** Whether the land lies left of a line: judged where the two come nearest, by both steps that meet there. */
function landIsLeft(line: readonly PlanePoint[], land: readonly PlanePoint[]): boolean {
  let nearest = Infinity
  let at = 0
  let dry = land[0]!
  for (const [i, shore] of line.entries()) {
    for (let k = 0; k < land.length; k += 8) {
      const distance = (land[k]!.x - shore.x) ** 2 + (land[k]!.y - shore.y) ** 2
      if (distance < nearest) {
        nearest = distance
        at = i
        dry = land[k]!
      }
    }
  }
  const before = sideOf(line, Math.max(at - 1, 0), dry)
  const after = sideOf(line, Math.min(at, line.length - 2), dry)
  return before + after > 0
}

/** The line with both ends carried on to a far circle, and closed along that circle round the water. */
function closeFar(line: readonly PlanePoint[], land: readonly PlanePoint[]): PlanePoint[] {
  const middle = line[Math.floor(line.length / 2)]!
  const far = 4 * Math.max(...[...line, ...land].map(({ x, y }) => Math.hypot(x - middle.x, y - middle.y)))
  const angleOf = (point: PlanePoint, from: PlanePoint) => Math.atan2(point.y - from.y, point.x - from.x)
  const start = angleOf(line[0]!, line[1]!)
  const end = angleOf(line.at(-1)!, line.at(-2)!)
  const turn = 2 * Math.PI
  // Water on the right of the line is walked round clockwise, water on the left the other way.
  const clockwise = landIsLeft(line, land)
  const sweep = clockwise ? -((((end - start) % turn) + turn) % turn) : (((start - end) % turn) + turn) % turn
  const arc = Array.from({ length: 17 }, (_, i): PlanePoint => {
    const angle = end + (sweep * i) / 16
    return { x: middle.x + far * Math.cos(angle), y: middle.y + far * Math.sin(angle) }
  })
  return [...line, ...arc]
}

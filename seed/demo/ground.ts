import type { Feature, FeatureCollection, Geometry } from 'geojson'
import { toLngLat } from './road'
import { type LocalPoint, source } from './source'

const degrees = (points: readonly LocalPoint[]) => points.map((point) => [...toLngLat(point)])

/** Twice the signed area in square metres; positive where the ring runs anticlockwise. */
const turn = (ring: readonly LocalPoint[]) =>
  ring.reduce((sum, [x, y], at) => {
    const [nextX, nextY] = ring[(at + 1) % ring.length]!
    return sum + x * nextY - nextX * y
  }, 0)

/** An area with its outer ring closed and anticlockwise (RFC 7946, 3.1.6). */
function polygon(points: readonly LocalPoint[]): Geometry {
  const [first, last] = [points[0]!, points.at(-1)!]
  const open = first[0] === last[0] && first[1] === last[1] ? points.slice(0, -1) : [...points]
  const ring = turn(open) < 0 ? [...open].reverse() : open
  return { type: 'Polygon', coordinates: [degrees([...ring, ring[0]!])] }
}

const line = (points: readonly LocalPoint[]): Geometry => ({ type: 'LineString', coordinates: degrees(points) })

function feature(kind: string, geometry: Geometry, more: { name?: string; height?: number } = {}): Feature {
  return { type: 'Feature', properties: { kind, ...more }, geometry }
}

/** Names of the buildings that a driver knows by one, in the order of the source. */
const BUILDING_NAMES: Record<number, { name: string }> = {
  2: { name: 'fog signal' },
  3: { name: 'quay' },
  5: { name: 'hut' },
}

/** What surrounds the road. `kind` and, where it has one, `name` are a feature's properties; a contour has its `height`. */
export function marramHeadGround(): FeatureCollection {
  const { ground, corners } = source
  const nameOf = new Map(corners.map(({ number, name }) => [number, name]))
  return {
    type: 'FeatureCollection',
    features: [
      feature('coast', line(ground.coast), { name: 'Marram Bay' }),
      feature('inlet', line(ground.inlet), { name: 'Marram Inlet' }),
      feature('marsh', polygon(ground.marsh), { name: 'Salt marsh' }),
      ...ground.contours.map(({ height, rings }) =>
        feature('contour', { type: 'MultiLineString', coordinates: rings.map(degrees) }, { height }),
      ),
      ...ground.gravel.map(({ corner, ring }) =>
        feature('gravel', polygon(ring), { name: `${nameOf.get(corner)} gravel` }),
      ),
      feature('paddock', polygon(ground.paddock), { name: 'Pits and paddock' }),
      feature('pit-lane', line(ground.pitLane), { name: 'Pit lane' }),
      feature('pit-building', polygon(ground.pitBuilding), { name: 'Pit building' }),
      feature('grandstand', polygon(ground.grandstand), { name: 'Grandstand' }),
      feature('lane', line(ground.lane), { name: 'Marram Lane' }),
      feature('breakwater', line(ground.breakwater), { name: 'Breakwater' }),
      ...ground.groynes.map((points) => feature('groyne', line(points))),
      ...ground.buildings.map((points, at) => feature('building', polygon(points), BUILDING_NAMES[at])),
      feature('mast', { type: 'Point', coordinates: [...toLngLat(ground.mast)] }, { name: 'Mast' }),
    ],
  }
}

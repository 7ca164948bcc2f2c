import type { FeatureCollection } from 'geojson'
import type { LandmarkId } from '~/book/ids'
import type { LandmarkView, PlacementView } from '~/book/view'
import type { LapCorner } from '~/draw/lap-map'
import { roadOf } from '~/draw/road'
import { makeCentreline } from '~/track/centreline'
import { proposeCornersInFrame } from '~/track/corners'
import { frameAsDrawn } from '~/track/layout-frame'
import { metres, type Offset, type Position, type Station } from '~/track/units'
import { nineCorners, type Point, seededRandom, toPositions } from './circuits'

/** What drawings are tried on: an invented ring with heights, its corners, its ground and its landmarks. */

const SPACING = 6

/** The ring of nine corners, stretched to other shapes, with rolling heights. */
export function drawnRoad({ east = 1, north = 1, heights = true, roadWidth = 11 } = {}) {
  const count = Math.round(nineCorners.length / SPACING)
  const points = Array.from({ length: count }, (_, i): Point => {
    const [x, y] = nineCorners.at((i * nineCorners.length) / count)
    return [x * east, y * north]
  })
  const positions = toPositions(points).map(
    ([longitude, latitude], i): Position =>
      heights ? [longitude, latitude, 31 + 17 * Math.sin((2 * Math.PI * i) / count)] : [longitude, latitude],
  )
  return roadOf(frameAsDrawn(makeCentreline(positions)), roadWidth)
}

export type DrawnRoad = ReturnType<typeof drawnRoad>

const NAMES = [
  'Tern',
  'Oystercatcher',
  'Dunlin',
  'Knot',
  'Sanderling Bend',
  'Plover',
  'Curlew',
  'Whimbrel Corner',
  'Avocet',
]

/** The corners of a road, with names of different lengths. */
export const drawnCorners = (road: DrawnRoad): LapCorner[] =>
  proposeCornersInFrame(road.frame).map(({ direction, apex }, i) => ({
    id: `corner-${i + 1}`,
    number: String(i + 1),
    name: NAMES[i % NAMES.length]!,
    direction,
    apex,
    href: `/corners/${i + 1}`,
  }))

/** Sea in the south, three contours, gravel, a paddock with its name and a mast, round any road. */
export function drawnGround(road: DrawnRoad): FeatureCollection {
  const { plane } = road.frame.centreline
  const lngLat = ([x, y]: Point) => [...plane.toLngLat({ x, y })]
  const xs = road.lap().map(({ x }) => x)
  const ys = road.lap().map(({ y }) => y)
  const [west, east, south, north] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)]
  const random = seededRandom(41)
  const wavy = Array.from({ length: 40 }, (_, i): Point => {
    const share = i / 39
    return [west - 300 + share * (east - west + 600), south - 90 - 40 * Math.sin(share * 9) - 12 * random()]
  })
  const ring = (x: number, y: number, r: number) =>
    Array.from({ length: 25 }, (_, i): Point => {
      const angle = (2 * Math.PI * (i % 24)) / 24
      return [x + r * Math.cos(angle), y + r * Math.sin(angle)]
    })
  const [midX, midY] = [(west + east) / 2, (south + north) / 2]
  const feature = (kind: string, geometry: unknown, more = {}) => ({
    type: 'Feature',
    properties: { kind, ...more },
    geometry,
  })
  return {
    type: 'FeatureCollection',
    features: [
      feature('coast', { type: 'LineString', coordinates: wavy.map(lngLat) }, { name: 'Sandpiper Bay' }),
      ...[5, 10, 25].map((height) =>
        feature('contour', { type: 'LineString', coordinates: ring(midX, midY, 40 * height).map(lngLat) }, { height }),
      ),
      feature('gravel', { type: 'Polygon', coordinates: [ring(east - 20, midY, 34).map(lngLat)] }),
      feature('paddock', { type: 'Polygon', coordinates: [ring(midX, midY, 47).map(lngLat)] }, { name: 'Paddock' }),
      feature('mast', { type: 'Point', coordinates: lngLat([east + 60, north]) }, { name: 'Mast' }),
    ],
  } as FeatureCollection
}

const placement = (station: number, offset: number, until: number | null = null): PlacementView => ({
  station: station as Station,
  until: until as Station | null,
  offset: offset as Offset,
  offsetTo: null,
  edgeLength: null,
  blockLength: metres(3),
  width: metres(1.3),
  words: null,
})

/** Kerbs, boards, a wall and a post round a corner; the post stands 7 m further on in the simulator. */
export function drawnLandmarks(road: DrawnRoad, apex: Station): LandmarkView[] {
  const half = road.width / 2
  const thing = (
    kind: LandmarkView['kind'],
    name: string,
    real: PlacementView,
    more: Partial<LandmarkView> = {},
  ): LandmarkView => ({
    id: `landmark-${name}` as LandmarkId,
    kind,
    name,
    text: null,
    corner: null,
    height: null,
    real,
    sim: real,
    ...more,
  })
  return [
    thing('kerb', 'apex kerb', placement(apex - 11, -half, apex + 12)),
    thing('distance-board', '100 board', placement(apex - 104, half + 3), { text: '100' }),
    thing('wall', 'wall', placement(apex - 80, -half - 3, apex - 52)),
    thing('marshal-post', 'post 4', placement(apex + 33, half + 2.5), { sim: placement(apex + 40, half + 2.5) }),
  ]
}

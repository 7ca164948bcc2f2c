import { type Point, path, rect, type Shape, smoothLine, smoothRing } from '~/draw/display-list'
import { type GroundFeature, isClosed, type Water } from '~/draw/ground'
import { clipLine, clipRing, simplifyLine, simplifyRing } from '~/draw/lines'
import { type Projection, sheetBox } from '~/draw/projection'
import type { StyleKey } from '~/draw/style-keys'
import { parallelLine, WATER_LINES } from '~/draw/water-lines'
import type { PlanePoint } from '~/track/plane'

/** Contours every 5 m; every 25 m a heavier one. */
const HEAVY_EVERY = 25
const BORDER = 12
/** px by which a thinned line may leave the given one. */
const TOLERANCE = 0.5
const WATER_STYLES: readonly StyleKey[] = [
  'water-line-1',
  'water-line-2',
  'water-line-3',
  'water-line-4',
  'water-line-5',
]

interface Extent {
  west: number
  east: number
  south: number
  north: number
}

/** Extents of lines met before: ground is immutable, and every view asks for all of it. */
const extents = new WeakMap<readonly PlanePoint[], Extent>()

function extentOf(line: readonly PlanePoint[]): Extent {
  const known = extents.get(line)
  if (known) return known
  const extent = { west: Infinity, east: -Infinity, south: Infinity, north: -Infinity }
  for (const { x, y } of line) {
    extent.west = Math.min(extent.west, x)
    extent.east = Math.max(extent.east, x)
    extent.south = Math.min(extent.south, y)
    extent.north = Math.max(extent.north, y)
  }
  extents.set(line, extent)
  return extent
}

/** Whether anything of a line may come within `border` px of the picture. */
function comesNear(line: readonly PlanePoint[], projection: Projection, border: number): boolean {
  const { middle, pxPerMetre, width, height } = projection
  const reachX = (width / 2 + border) / pxPerMetre
  const reachY = (height / 2 + border) / pxPerMetre
  const { west, east, south, north } = extentOf(line)
  return east > middle.x - reachX && west < middle.x + reachX && north > middle.y - reachY && south < middle.y + reachY
}

/** Lines in px that come near the picture, cut to it and thinned. */
function linesIn(lines: readonly (readonly PlanePoint[])[], projection: Projection, border: number): Point[][] {
  const box = sheetBox(projection, border)
  return lines
    .filter((line) => comesNear(line, projection, border))
    .flatMap((line) => clipLine(line.map(projection.toPx), box).map((piece) => simplifyLine(piece, TOLERANCE)))
}

/** Rings in px that come near the picture, cut to it and thinned. */
function ringsIn(rings: readonly (readonly PlanePoint[])[], projection: Projection, border: number): Point[][] {
  const box = sheetBox(projection, border)
  return rings
    .filter((ring) => comesNear(ring, projection, border))
    .map((ring) => clipRing(ring.map(projection.toPx), box))
    .filter((cut) => cut.length > 2)
    .map((cut) => simplifyRing(cut, TOLERANCE))
}

/** Corners that come from cutting at the picture's border are not rounded. */
function onBorder(projection: Projection, border: number): (corner: Point) => boolean {
  // A thousandth within: a cut point may come to lie a rounding error inside.
  const box = sheetBox(projection, border - 0.001)
  const right = box.x + box.width
  const bottom = box.y + box.height
  return ([x, y]) => x <= box.x || x >= right || y <= box.y || y >= bottom
}

/** Rings as lines back to their first point, made once. */
const closedRings = new WeakMap<readonly PlanePoint[], PlanePoint[]>()

function closed(ring: readonly PlanePoint[]): PlanePoint[] {
  const line = closedRings.get(ring) ?? [...ring, ring[0]!]
  closedRings.set(ring, line)
  return line
}

/** Paper, the tint of the lowest contour, the contours. */
export function reliefShapes(features: readonly GroundFeature[], projection: Projection): Shape[] {
  const contours = features.filter(({ kind, height }) => kind === 'contour' && height !== null)
  const linesOf = ({ rings, lines }: GroundFeature) => [...lines, ...rings.map(closed)]
  const lowest = Math.min(...contours.map(({ height }) => height!))
  const tinted = contours
    .filter(({ height }) => height === lowest)
    .flatMap(({ rings, lines }) => [...rings, ...lines.filter(isClosed)])
  const isHeavy = ({ height }: GroundFeature) => height! % HEAVY_EVERY === 0
  const drawn = (style: StyleKey, some: readonly GroundFeature[]) => {
    const d = linesIn(some.flatMap(linesOf), projection, BORDER).map(smoothLine).join('')
    return d === '' ? [] : [path(style, d)]
  }
  const tint = ringsIn(tinted, projection, BORDER).map((ring) => smoothRing(ring, onBorder(projection, BORDER)))
  return [
    rect('paper', sheetBox(projection)),
    ...(tint.length === 0 ? [] : [path('tint', tint.join(''))]),
    ...drawn(
      'contour',
      contours.filter((contour) => !isHeavy(contour)),
    ),
    ...drawn('contour-heavy', contours.filter(isHeavy)),
  ]
}

/** Sea, its water lines, the coast. */
export function waterShapes(waters: readonly Water[], projection: Projection): Shape[] {
  const areas = ringsIn(
    waters.map(({ area }) => area),
    projection,
    BORDER,
  )
  if (areas.length === 0) return []
  const reach = WATER_LINES.at(-1)! + BORDER
  const shores = waters.flatMap((water) => {
    const side = waterIsRight(water.area) ? 1 : -1
    return linesIn([water.shore], projection, reach).map((shore) => ({ shore, side: side as 1 | -1 }))
  })
  const waterLines = WATER_LINES.flatMap((distance, i) => {
    const d = shores
      .flatMap(({ shore, side }) => parallelLine(shore, distance, side))
      .map((line) => smoothLine(simplifyLine(line, 0.4)))
      .join('')
    return d === '' ? [] : [path(WATER_STYLES[i]!, d)]
  })
  const coast = shores.map(({ shore }) => smoothLine(shore)).join('')
  return [
    ...areas.map((area) => path('sea', smoothRing(area, onBorder(projection, BORDER)))),
    ...waterLines,
    ...(coast === '' ? [] : [path('coast', coast)]),
  ]
}

/** A ring walked clockwise (y north) has its inside on the right. */
function waterIsRight(area: readonly PlanePoint[]): boolean {
  let twice = 0
  for (const [i, a] of area.entries()) {
    const b = area[(i + 1) % area.length]!
    twice += a.x * b.y - b.x * a.y
  }
  return twice < 0
}

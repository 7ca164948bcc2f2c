import { linePath, type Point, path, polygon, rect, type Shape, smoothPath } from '~/draw/display-list'
import { type GroundFeature, isClosed, type Water } from '~/draw/ground'
import { boundsOf, clipLine, clipRing, overlap, simplifyLine, simplifyRing } from '~/draw/lines'
import { type Projection, sheetBox } from '~/draw/projection'
import type { StyleKey } from '~/draw/style-keys'
import { parallelLine, WATER_LINES } from '~/draw/water-lines'
import type { PlanePoint } from '~/track/plane'

/** Contours every 5 m; every 25 m a heavier one. */
const HEAVY_EVERY = 25
const BORDER = 12
const WATER_STYLES: readonly StyleKey[] = [
  'water-line-1',
  'water-line-2',
  'water-line-3',
  'water-line-4',
  'water-line-5',
]

/** Lines in px that come near the picture, cut to it and thinned. */
function linesIn(lines: readonly (readonly PlanePoint[])[], projection: Projection, border: number): Point[][] {
  const box = sheetBox(projection, border)
  return lines.flatMap((line) => {
    const points = line.map(projection.toPx)
    if (!overlap(boundsOf(points), box)) return []
    return clipLine(points, box).map((piece) => simplifyLine(piece, 0.6))
  })
}

/** Rings in px that come near the picture, cut to it and thinned. */
function ringsIn(rings: readonly (readonly PlanePoint[])[], projection: Projection, border: number): Point[][] {
  const box = sheetBox(projection, border)
  return rings.flatMap((ring) => {
    const points = ring.map(projection.toPx)
    if (!overlap(boundsOf(points), box)) return []
    const cut = clipRing(points, box)
    return cut.length < 3 ? [] : [simplifyRing(cut, 0.6)]
  })
}

/** Paper, the tint of the lowest contour, the contours. */
export function reliefShapes(features: readonly GroundFeature[], projection: Projection): Shape[] {
  const contours = features.filter(({ kind, height }) => kind === 'contour' && height !== null)
  const linesOf = ({ rings, lines }: GroundFeature) => [...lines, ...rings.map((ring) => [...ring, ring[0]!])]
  const lowest = Math.min(...contours.map(({ height }) => height!))
  const tinted = contours
    .filter(({ height }) => height === lowest)
    .flatMap(({ rings, lines }) => [...rings, ...lines.filter(isClosed)])
  const isHeavy = ({ height }: GroundFeature) => height! % HEAVY_EVERY === 0
  const drawn = (style: StyleKey, some: readonly GroundFeature[]) => {
    const d = linesIn(some.flatMap(linesOf), projection, BORDER)
      .map((line) => smoothPath(line))
      .join('')
    return d === '' ? [] : [path(style, d)]
  }
  const tint = ringsIn(tinted, projection, BORDER).map((ring) => smoothPath(ring, true))
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
      .map((line) => smoothPath(simplifyLine(line, 0.4)))
      .join('')
    return d === '' ? [] : [path(WATER_STYLES[i]!, d)]
  })
  const coast = shores.map(({ shore }) => linePath(shore)).join('')
  return [...areas.map((area) => polygon('sea', area)), ...waterLines, ...(coast === '' ? [] : [path('coast', coast)])]
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

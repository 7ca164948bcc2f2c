import type { LandmarkView, PlacementView } from '~/book/view'
import { linePath, type Point, path, polyline, type Shape } from '~/draw/display-list'
import { boundsOf, clipLine, overlap, simplifyLine } from '~/draw/lines'
import { type Projection, sheetBox } from '~/draw/projection'
import type { Road } from '~/draw/road'
import { type Station, station } from '~/track/units'

/** px of the dark band where the true width would be thinner: on a wide sheet, on a narrow one. */
const BAND_LEAST = { wide: 8.5, narrow: 5.5 } as const
const NARROW = 600
const CASING = 2.2

/** How wide the road is drawn, px. */
export function drawnWidth(road: Road, { pxPerMetre, width, detail }: Projection): number {
  const least = width < NARROW ? BAND_LEAST.narrow : BAND_LEAST.wide
  return detail ? road.width * pxPerMetre : Math.max(road.width * pxPerMetre, least)
}

/** The road of the whole lap in px, thinned; first point repeated at the end. */
export const lapLine = (road: Road, projection: Projection): Point[] =>
  simplifyLine(road.lap().map(projection.toPx), projection.detail ? 0.15 : 0.3)

/** The pieces of the road that come within `border` px of the picture, thinned. */
export const roadPieces = (road: Road, projection: Projection, border: number): Point[][] =>
  clipLine(road.lap().map(projection.toPx), sheetBox(projection, border)).map((piece) => simplifyLine(piece, 0.15))

/** The road: a dark band with a paper casing, or light asphalt between two edges. */
export function roadShapes(road: Road, projection: Projection): Shape[] {
  const width = drawnWidth(road, projection)
  if (!projection.detail) {
    const line = lapLine(road, projection)
    return [polyline('road-casing', line, width + 2 * CASING), polyline('road', line, width)]
  }
  const d = roadPieces(road, projection, width)
    .map((piece) => linePath(piece))
    .join('')
  return d === '' ? [] : [path('asphalt-edge', d, width + 2.6), path('asphalt', d, width)]
}

export type Kerb = LandmarkView & { kind: 'kerb' }
export const isKerb = (landmark: LandmarkView): landmark is Kerb => landmark.kind === 'kerb'

/** px of a kerb and of one of its blocks at the least. */
const KERB_LEAST = { band: 3, detail: 2.1 } as const
const BLOCK_LEAST = { band: 4.2, detail: 2.6 } as const
const KERB_WIDTH = 1.3
const BLOCK_LENGTH = 3

/**
 * Kerbs along the road's edges, white with dark blocks, the first block dark. Kerbs of the simulator alone are left to
 * the reader's choice of ground: pass the placements to show.
 */
export function kerbShapes(placements: readonly PlacementView[], road: Road, projection: Projection): Shape[] {
  const { detail } = projection
  const size = detail ? 'detail' : 'band'
  const box = sheetBox(projection, 20)
  const drawn = placements.flatMap((placement) => {
    const width = Math.max((placement.width ?? KERB_WIDTH) * projection.pxPerMetre, KERB_LEAST[size])
    const line = kerbLine(placement, road, projection, width)
    if (line.length < 2 || !overlap(boundsOf(line), box)) return []
    const block = Math.max((placement.blockLength ?? BLOCK_LENGTH) * projection.pxPerMetre, BLOCK_LEAST[size])
    return [{ line, width, blocks: blocksOf(line, block) }]
  })
  return groupByWidth(drawn).flatMap(({ width, lines, blocks }) => [
    ...(detail ? [path('kerb-edge', lines, width + 1.4)] : []),
    path('kerb', lines, width),
    path('kerb-block', blocks, width),
  ])
}

function kerbLine(placement: PlacementView, road: Road, projection: Projection, width: number): Point[] {
  const { station: from, until, offset } = placement
  if (until === null || offset === null || offset === 0) return []
  const side = Math.sign(offset)
  const edge = drawnWidth(road, projection) / projection.pxPerMetre / 2
  // On the dark band a kerb sits astride the edge, else it begins at it.
  const out = projection.detail ? width / 2 + 0.7 : 0.5
  const line = road.stretch(from, until, side * (edge + out / projection.pxPerMetre))
  return line.map(projection.toPx)
}

/** Every second stretch of `block` px along a line, the first one included; the last may be short. */
export function blocksOf(line: readonly Point[], block: number): string {
  let d = ''
  let gone = 0
  for (let i = 1; i < line.length; i++) {
    const [ax, ay] = line[i - 1]!
    const [bx, by] = line[i]!
    const length = Math.hypot(bx - ax, by - ay)
    const at = (s: number): Point => [ax + ((bx - ax) * s) / length, ay + ((by - ay) * s) / length]
    for (let s = 0; s < length - 1e-6; ) {
      const index = Math.floor((gone + s + 1e-6) / block)
      const end = Math.min(length, (index + 1) * block - gone)
      if (index % 2 === 0) d += linePath([at(s), at(end)])
      s = end
    }
    gone += length
  }
  return d
}

interface KerbGroup {
  width: number
  lines: string
  blocks: string
}

/** One pair of paths for kerbs of one width. */
function groupByWidth(drawn: readonly { line: Point[]; width: number; blocks: string }[]): KerbGroup[] {
  const groups = new Map<number, KerbGroup>()
  for (const { line, width, blocks } of drawn) {
    const group = groups.get(width) ?? { width, lines: '', blocks: '' }
    group.lines += linePath(line)
    group.blocks += blocks
    groups.set(width, group)
  }
  return [...groups.values()]
}

/** The line across the road at a station, `over` px past either edge, from left to right. */
export function acrossRoad(road: Road, projection: Projection, at: Station, over = 0): Point[] {
  const half = drawnWidth(road, projection) / projection.pxPerMetre / 2 + over / projection.pxPerMetre
  return [projection.toPx(road.at(at, half)), projection.toPx(road.at(at, -half))]
}

/** The start line: dashes across the road on a paper ground. */
export function startShapes(road: Road, projection: Projection): Shape[] {
  const line = acrossRoad(road, projection, station(0))
  const [a, b] = line as [Point, Point]
  const length = Math.hypot(b[0] - a[0], b[1] - a[1])
  return [polyline('start-casing', line), path('start-line', blocksOf(line, Math.max(length / 5, 1.5)))]
}

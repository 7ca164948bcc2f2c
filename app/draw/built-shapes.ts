import { isTip, linePath, type Point, path, polygon, type Shape, smoothRing } from '~/draw/display-list'
import type { GroundFeature, GroundKind } from '~/draw/ground'
import { dotRows, hatchLines, longAxis, marshTufts } from '~/draw/hatch'
import { boundsOf, clipRing, insideRing, overlap, simplifyRing } from '~/draw/lines'
import { type Projection, sheetBox } from '~/draw/projection'
import { mastShapes } from '~/draw/side-things'
import type { StyleKey } from '~/draw/style-keys'

const BORDER = 12
const DOT_SPACING = 7
/** True widths in metres of what is drawn as a line; never thinner than its `least` px. */
const WIDTHS = {
  pitLane: { metres: 9, least: 6.2, casing: 1.8 },
  lane: { metres: 4, least: 4.4, casing: 1.6 },
  breakwater: { metres: 7, least: 5.5, casing: 2.5 },
} as const

/** Marsh, stone, gravel, paddock, pit lane, lanes, buildings, masts: everything solid but the road. */
export function builtShapes(features: readonly GroundFeature[], projection: Projection): Shape[] {
  const rings = (...kinds: GroundKind[]) => groundRings(features, kinds, projection)
  const lines = (kind: GroundKind) => linesOf(features, kind, projection)
  return [
    ...rings('marsh').flatMap(marsh),
    ...joined('groyne', lines('groyne')),
    ...cased('stone', lines('breakwater'), WIDTHS.breakwater, projection),
    ...gravel(rings('gravel'), projection.detail),
    ...rings('paddock').flatMap((ring) => [polygon('paddock', ring), ...stalls(ring, projection)]),
    ...cased('lane', lines('lane'), WIDTHS.lane, projection),
    ...cased('pit-lane', lines('pit-lane'), WIDTHS.pitLane, projection),
    ...rings('grandstand').flatMap(grandstand),
    ...buildings(rings('building', 'pit-building')),
    ...pointsOf(features, 'mast', projection).flatMap(mastShapes),
  ]
}

/** Areas of some kinds in px, cut to the picture and thinned. */
export function groundRings(
  features: readonly GroundFeature[],
  kinds: readonly GroundKind[],
  projection: Projection,
): Point[][] {
  const box = sheetBox(projection, BORDER)
  return features
    .filter(({ kind }) => kinds.includes(kind))
    .flatMap(({ rings }) => rings)
    .map((ring) => ring.map(projection.toPx))
    .filter((ring) => overlap(boundsOf(ring), box))
    .map((ring) => simplifyRing(clipRing(ring, box), 0.3))
    .filter((ring) => ring.length > 2)
}

function linesOf(features: readonly GroundFeature[], kind: GroundKind, projection: Projection): Point[][] {
  const box = sheetBox(projection, BORDER)
  return features
    .filter((feature) => feature.kind === kind)
    .flatMap(({ lines }) => lines)
    .map((line) => line.map(projection.toPx))
    .filter((line) => overlap(boundsOf(line), box))
}

function pointsOf(features: readonly GroundFeature[], kind: GroundKind, projection: Projection): Point[] {
  const box = sheetBox(projection, BORDER)
  return features
    .filter((feature) => feature.kind === kind)
    .flatMap(({ points }) => points.map(projection.toPx))
    .filter(([x, y]) => overlap({ x, y, width: 0, height: 0 }, box))
}

function marsh(ring: Point[]): Shape[] {
  const { blades, water } = marshTufts(ring)
  return blades === '' ? [] : [path('marsh-water', water), path('marsh-tuft', blades)]
}

function gravel(rings: readonly Point[][], detail: boolean): Shape[] {
  const dots = rings.map((ring) => dotRows(ring, DOT_SPACING)).join('')
  const areas = rings.map((ring) => (detail ? smoothRing(ring, isTip) : linePath(ring, true))).join('')
  return [...(areas === '' ? [] : [path('gravel', areas)]), ...(dots === '' ? [] : [path('gravel-dots', dots)])]
}

const joined = (style: StyleKey, lines: readonly Point[][]): Shape[] =>
  lines.length === 0 ? [] : [path(style, lines.map((line) => linePath(line)).join(''))]

/** Lines as a strip with two edges, at their true width where that is more than the least. */
function cased(
  style: 'stone' | 'lane' | 'pit-lane',
  lines: readonly Point[][],
  { metres, least, casing }: { metres: number; least: number; casing: number },
  { pxPerMetre }: Projection,
): Shape[] {
  const width = Math.max(metres * pxPerMetre, least)
  const d = lines.map((line) => linePath(line)).join('')
  return d === '' ? [] : [path(`${style}-casing`, d, width), path(style, d, width - casing)]
}

function grandstand(ring: Point[]): Shape[] {
  const steps = hatchLines(ring, longAxis(ring), 3)
  return [polygon('grandstand', ring), ...(steps === '' ? [] : [path('grandstand-step', steps)])]
}

const buildings = (rings: readonly Point[][]): Shape[] =>
  rings.length === 0 ? [] : [path('building', rings.map((ring) => linePath(ring, true)).join(''))]

/** Parked transporters: two rows along a paddock's longer side, in metres of their own length and spacing. */
const ROWS = [
  { depth: 0.25, lean: 0 },
  { depth: 0.68, lean: 4.5 },
] as const
const STALL = { width: 11, length: 15, spacing: 22 } as const

function stalls(ring: Point[], { pxPerMetre }: Projection): Shape[] {
  const width = STALL.width * pxPerMetre
  if (width < 4) return []
  const long = (longAxisOfBox(ring) * Math.PI) / 180
  const along: Point = [Math.cos(long), Math.sin(long)]
  const across: Point = [-along[1], along[0]]
  const reach = (axis: Point) => ring.map(([x, y]) => x * axis[0] + y * axis[1])
  const [from, to] = [Math.min(...reach(along)), Math.max(...reach(along))]
  const [near, far] = [Math.min(...reach(across)), Math.max(...reach(across))]
  const place = (u: number, v: number): Point => [along[0] * u + across[0] * v, along[1] * u + across[1] * v]
  const corners = ROWS.flatMap(({ depth, lean }) => {
    const v = near + depth * (far - near)
    const count = Math.floor((to - from) / (STALL.spacing * pxPerMetre))
    return Array.from({ length: count }, (_, i) => {
      const u = from + (i + 0.5) * STALL.spacing * pxPerMetre
      const half = (STALL.length * pxPerMetre) / 2
      const shift = lean * pxPerMetre
      return [
        place(u, v - half),
        place(u + width, v - half),
        place(u + width + shift, v + half),
        place(u + shift, v + half),
      ]
    })
  })
  const fitting = corners.filter((stall) => stall.every((point) => insideRing(point, ring)))
  return fitting.length === 0 ? [] : [path('stall', fitting.map((stall) => linePath(stall, true)).join(''))]
}

/** Direction of the longest side, degrees clockwise from the right. */
function longAxisOfBox(ring: readonly Point[]): number {
  const thinned = simplifyRing(ring, 3)
  let longest = 0
  let angle = 0
  for (const [i, a] of thinned.entries()) {
    const b = thinned[(i + 1) % thinned.length]!
    const length = Math.hypot(b[0] - a[0], b[1] - a[1])
    if (length > longest) {
      longest = length
      angle = (Math.atan2(b[1] - a[1], b[0] - a[0]) * 180) / Math.PI
    }
  }
  return angle
}

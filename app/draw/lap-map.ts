import type { TurnDirection } from '~/book/kinds'
import type { LandmarkView } from '~/book/view'
import { builtShapes, groundRings } from '~/draw/built-shapes'
import { type Box, type DisplayList, type Point, path, px, type Shape } from '~/draw/display-list'
import { type CartoucheWords, cartouche } from '~/draw/furniture'
import { type GroundFeature, type GroundKind, type Water, watersOf } from '~/draw/ground'
import { boundsOf, clipRing, cornersOf, simplifyLine, simplifyRing } from '~/draw/lines'
import type { PlateCorner } from '~/draw/number-plate'
import { placeNames, waterNames } from '~/draw/place-names'
import { type Plate, placePlates, platedCorner, plateShapes, preferredBox, type SoftGround } from '~/draw/plates'
import { fitProjection, type Projection, sheetBox } from '~/draw/projection'
import { reliefShapes, waterShapes } from '~/draw/relief-shapes'
import type { Road } from '~/draw/road'
import { drawnWidth, isKerb, kerbShapes, lapLine, roadShapes, startShapes } from '~/draw/road-shapes'
import { emptiestPlace, isFree, lineNearBox, type Room } from '~/draw/room'
import type { Reader } from '~/draw/text-styles'
import type { PlanePoint } from '~/track/plane'
import { type Station, station } from '~/track/units'

/** A corner on the map of the lap. */
export interface LapCorner extends PlateCorner {
  direction: TurnDirection
  apex: Station
}

export interface LapMapInput {
  road: Road
  ground: readonly GroundFeature[]
  landmarks: readonly LandmarkView[]
  corners: readonly LapCorner[]
  width: number
  height: number
  words: CartoucheWords
}

export interface LapMap {
  list: DisplayList
  projection: Projection
  /** Where each corner's plate came to lie; the corners that found no room are missing. */
  plates: Plate[]
}

/** Narrower than this is drawn for a phone: text of 14 px at least, numbers without names where they do not fit. */
const PHONE_UNDER = 600
const EDGE = 10

/** The whole circuit, north up, fitted to a sheet of any size. Works without ground, landmarks or corners. */
export function lapMap(input: LapMapInput): LapMap {
  const { road, ground, width, height } = input
  const lap = road.lap()
  const waters = watersOf(ground, lap)
  const { projection, room, plates, names, sheet, place, reader } = arranged(input, lap, waters)
  const taken = { ...room, boxes: [...room.boxes, { x: place[0], y: place[1], ...sheet }] }
  const solid = { ...taken, boxes: [...taken.boxes, ...groundRings(ground, BUILT, projection).map(boundsOf)] }
  const kerbs = input.landmarks.filter(isKerb).flatMap(({ real }) => (real ? [real] : []))
  const list = {
    width,
    height,
    shapes: [
      ...reliefShapes(ground, projection),
      ...waterShapes(waters, projection),
      ...builtShapes(ground, projection),
      ...roadShapes(road, projection),
      ...kerbShapes(kerbs, road, projection),
      ...startShapes(road, projection),
      ...travelArrow(road, projection, solid),
      ...names.map(({ shape }) => shape),
      ...waterNames(waters, projection, taken, reader),
      ...plates.map((plate) => plateShapes(plate, reader)),
      ...sheet.shapes(place),
    ],
  }
  return { list, projection, plates }
}

/**
 * Plates and names first, then the cartouche in the emptiest part left; where that leaves it none, the cartouche first and
 * the plates round it, as long as that costs no corner its name; and where the lap fills the sheet, the map moves up and
 * leaves it a band below.
 */
function arranged(input: LapMapInput, lap: readonly PlanePoint[], waters: readonly Water[]) {
  const reader: Reader = input.width < PHONE_UNDER ? 'phone' : 'desk'
  const sheetFor = ({ pxPerMetre }: Projection) => cartouche(input.words, pxPerMetre, reader, input.width - 2 * EDGE)
  const first = makeTable(input, lap, waters, reader, 0)
  const sheet = sheetFor(first.projection)
  const after = setNames(first, input, waters, reader)
  const left = emptiestPlace(sheet, { ...after.room, boxes: [...after.room.boxes, ...first.built] })
  if (left) return { ...after, reader, sheet, place: left, projection: first.projection }
  for (const kept of [first.bends, []]) {
    const before = emptiestPlace(sheet, { ...withShores(first, waters), boxes: [...first.built, ...kept] })
    if (!before) continue
    const round = setNames(first, input, waters, reader, [{ x: before[0], y: before[1], ...sheet }])
    if (namedIn(round.plates) < namedIn(after.plates)) continue
    return { ...round, reader, sheet, place: before, projection: first.projection }
  }
  const band = makeTable(input, lap, waters, reader, sheet.height + EDGE)
  const smaller = sheetFor(band.projection)
  const place: Point = [EDGE, input.height - smaller.height - EDGE]
  return { ...setNames(band, input, waters, reader), reader, sheet: smaller, place, projection: band.projection }
}

const namedIn = (plates: readonly Plate[]) => plates.filter(({ named }) => named).length

type Table = ReturnType<typeof makeTable>

/** The sheet before anything is set on it: projection, road, corners, what is built. */
function makeTable(
  { road, ground, corners, width, height }: LapMapInput,
  lap: readonly PlanePoint[],
  waters: readonly Water[],
  reader: Reader,
  bottom: number,
) {
  const margin = reader === 'phone' ? 34 : 58
  const projection = fitProjection(lap, { width, height, margin, bottom })
  const half = drawnWidth(road, projection) / 2
  const sheet = sheetBox(projection, -EDGE)
  const plated = corners.map((corner) => platedCorner(corner, road, projection))
  return {
    projection,
    half,
    plated,
    room: {
      sheet: { ...sheet, height: sheet.height - bottom },
      boxes: [],
      lines: [{ points: lapLine(road, projection), clearance: half + 5 }],
    } satisfies Room,
    soft: softGround(ground, waters, projection),
    built: groundRings(ground, BUILT, projection).map(boundsOf),
    bends: plated.map((corner) => preferredBox(corner, half + 10, reader)),
  }
}

const withShores = ({ room, projection }: Table, waters: readonly Water[]): Room => ({
  ...room,
  lines: [
    ...room.lines,
    ...waters.map(({ shore }) => ({ points: simplifyLine(shore.map(projection.toPx), 2), clearance: 3 })),
  ],
})

/** Plates, then names of things, round boxes already taken; the room afterwards holds all three. */
function setNames(table: Table, input: LapMapInput, waters: readonly Water[], reader: Reader, taken: Box[] = []) {
  const room: Room = { ...table.room, boxes: [...taken] }
  const plates = placePlates(table.plated, room, table.soft, table.half + 10, reader)
  room.boxes.push(...plates.map(({ box }) => box))
  const names = placeNames(input.ground, table.projection, room, reader)
  room.boxes.push(...names.map(({ box }) => box))
  return { plates, names, room: { ...withShores(table, waters), boxes: room.boxes } }
}

const BUILT: readonly GroundKind[] = ['building', 'pit-building', 'grandstand', 'paddock', 'marsh', 'gravel']

/** What plates keep off where they can: kinds of ground and what covering one costs, in px of distance. */
const SOFT_AREAS: readonly (readonly [GroundKind[], number])[] = [
  [['gravel'], 30],
  [['building', 'pit-building', 'grandstand', 'paddock'], 40],
  [['marsh'], 8],
]
const SOFT_WATER = 12
const SOFT_STONE = 40

/** A water's outline on the sheet, roughly: plates need no more. */
const waterRing = (area: readonly PlanePoint[], projection: Projection) =>
  simplifyRing(clipRing(area.map(projection.toPx), sheetBox(projection)), 4)

function softGround(ground: readonly GroundFeature[], waters: readonly Water[], projection: Projection): SoftGround[] {
  const stone = ground.filter(({ kind }) => kind === 'breakwater' || kind === 'groyne').flatMap(({ lines }) => lines)
  return [
    ...SOFT_AREAS.flatMap(([kinds, cost]) => groundRings(ground, kinds, projection).map((ring) => ({ ring, cost }))),
    ...waters.map(({ area }) => ({ ring: waterRing(area, projection), cost: SOFT_WATER })),
    ...stone.map((line) => ({ ring: cornersOf(boundsOf(line.map(projection.toPx))), cost: SOFT_STONE })),
  ]
}

const ARROW = { ahead: [40, 60, 84, 120, 24], beside: [13, 18, 24, 32] } as const

/** The direction of travel, beside the road a little after the start line, where nothing else lies. */
function travelArrow(road: Road, projection: Projection, room: Room): Shape[] {
  const half = drawnWidth(road, projection) / 2
  for (const beside of ARROW.beside) {
    for (const ahead of ARROW.ahead) {
      for (const side of [1, -1]) {
        const at = station((ahead / projection.pxPerMetre) % road.frame.length)
        const point = projection.toPx(road.at(at, (side * (half + beside)) / projection.pxPerMetre))
        const box = { x: point[0] - 14, y: point[1] - 6, width: 28, height: 12 }
        if (isFree(box, { ...room, lines: [] }, 2) && clearOfRoad(point, room)) {
          return [path('travel-arrow', arrowAt(point, road.headingAt(at)))]
        }
      }
    }
  }
  return []
}

const clearOfRoad = ([x, y]: Point, { lines }: Room) =>
  !lines.some(({ points, clearance }) => lineNearBox(points, { x: x - 4, y: y - 4, width: 8, height: 8 }, clearance))

function arrowAt([x, y]: Point, heading: number): string {
  const angle = ((heading - 90) * Math.PI) / 180
  const at = (u: number, v: number) =>
    `${px(x + u * Math.cos(angle) - v * Math.sin(angle))} ${px(y + u * Math.sin(angle) + v * Math.cos(angle))}`
  return `M${at(-16, 0)}L${at(10, 0)}M${at(4, -4.5)}L${at(10, 0)}L${at(4, 4.5)}`
}

import type { TurnDirection } from '~/book/kinds'
import { builtShapes } from '~/draw/built-shapes'
import { type Box, circle, type DisplayList, linePath, type Point, path, type Shape, text } from '~/draw/display-list'
import { mapFurniture } from '~/draw/furniture'
import { type GroundFeature, type Water, watersOf } from '~/draw/ground'
import { clipLine, overlap } from '~/draw/lines'
import type { PlateCorner } from '~/draw/number-plate'
import { placePlates, platedCorner, plateShapes } from '~/draw/plates'
import { fitProjection, type Projection, sheetBox } from '~/draw/projection'
import { reliefShapes, waterShapes } from '~/draw/relief-shapes'
import type { Road } from '~/draw/road'
import { acrossRoad, drawnWidth, lapLine, roadPieces, roadShapes, startShapes } from '~/draw/road-shapes'
import { isFree, type Room } from '~/draw/room'
import { type Reader, textSize, textWidth } from '~/draw/text-styles'
import type { LngLat, Station } from '~/track/units'
import { station } from '~/track/units'

/** A corner of a layout; with its entry and exit, the bend between them is shown. */
export interface CircuitCorner extends PlateCorner {
  direction: TurnDirection
  apex: Station
  entry?: Station
  exit?: Station
}

/** A place at which something is to be looked at again. */
export interface CircuitWarning {
  at: LngLat
  /** One or two words: "gap 38 m". */
  words: string
}

/** A layout while it is being brought in or changed. */
export interface CircuitScene {
  road: Road
  ground: readonly GroundFeature[]
  waters: readonly Water[]
  corners: readonly CircuitCorner[]
  warnings: readonly CircuitWarning[]
}

/** The scene of a layout; waters are read once. */
export const circuitScene = (scene: Omit<CircuitScene, 'waters'>): CircuitScene => ({
  ...scene,
  waters: watersOf(scene.ground, scene.road.lap()),
})

const MARGIN = { desk: 58, phone: 34 } as const

/** The view of the whole lap. */
export const circuitProjection = (road: Road, sheet: { width: number; height: number }, reader: Reader): Projection =>
  fitProjection(road.lap(), { ...sheet, margin: MARGIN[reader], most: 8 })

/**
 * Ground, road with its bends, the way round, start line, warnings, plates: everything of a view.
 * @param room where plates may lie, and the boxes that they keep off, px of the picture
 */
export function circuitShapes(
  scene: CircuitScene,
  projection: Projection,
  reader: Reader,
  room: Pick<Room, 'sheet' | 'boxes'> = { sheet: sheetBox(projection, -6), boxes: [] },
): Shape[] {
  const { road, ground, waters, corners } = scene
  const whole = roomOf(road, projection, room)
  return [
    ...reliefShapes(ground, projection),
    ...waterShapes(waters, projection),
    ...builtShapes(ground, projection),
    ...roadShapes(road, projection),
    ...corners.flatMap((corner) => bendShapes(corner, road, projection)),
    ...wayShapes(road, projection),
    ...startShapes(road, projection),
    ...cornerPlates(corners, road, projection, reader, whole),
    ...scene.warnings.flatMap((warning) => warningShapes(warning, road, projection, reader, whole)),
  ]
}

function roomOf(road: Road, projection: Projection, { sheet, boxes }: Pick<Room, 'sheet' | 'boxes'>): Room {
  const clearance = drawnWidth(road, projection) / 2 + 5
  const pieces = projection.detail ? roadPieces(road, projection, 60) : [lapLine(road, projection)]
  return { sheet, boxes, lines: pieces.map((points) => ({ points, clearance })) }
}

/** A bend as a line along the road's middle, with a stroke across at either end. */
function bendShapes({ entry, exit }: CircuitCorner, road: Road, projection: Projection): Shape[] {
  if (entry === undefined || exit === undefined) return []
  const middle = clipLine(road.stretch(entry, exit).map(projection.toPx), sheetBox(projection, 10))
  const ends = [entry, exit].map((at) => linePath(acrossRoad(road, projection, at, 3)))
  const d = middle.map((line) => linePath(line)).join('')
  return d === '' ? [] : [path('bend', d), path('bend-end', ends.join(''))]
}

/** px of road between two arrows of the way round. */
const ARROW_EVERY = 110

/** Arrows on the road in the direction of travel; none in the first 40 px after the start line. */
function wayShapes(road: Road, projection: Projection): Shape[] {
  const { length } = road.frame
  const count = Math.max(3, Math.round((length * projection.pxPerMetre) / ARROW_EVERY))
  const size = Math.min(Math.max(drawnWidth(road, projection) * 0.28, 2.2), 6)
  const box = sheetBox(projection, 10)
  const arrows = Array.from({ length: count }, (_, i) => {
    const at = station(((i + 0.5) * length) / count)
    const [x, y] = projection.toPx(road.at(at))
    return overlap({ x, y, width: 0, height: 0 }, box) ? arrowHead([x, y], road.headingAt(at), size) : ''
  }).join('')
  return arrows === '' ? [] : [path(projection.detail ? 'travel-arrow' : 'way', arrows)]
}

function arrowHead([x, y]: Point, heading: number, size: number): string {
  const angle = (heading * Math.PI) / 180
  const at = (right: number, ahead: number): Point => [
    x + right * Math.cos(angle) + ahead * Math.sin(angle),
    y + right * Math.sin(angle) - ahead * Math.cos(angle),
  ]
  return linePath([at(-size, -size * 0.6), at(0, size * 0.6), at(size, -size * 0.6)])
}

/** A ring at the place, its words beside it where they are clear of the road. */
function warningShapes(
  { at, words }: CircuitWarning,
  road: Road,
  projection: Projection,
  reader: Reader,
  room: Room,
): Shape[] {
  const middle = projection.toPx(road.frame.centreline.plane.toPlane(at))
  const size = textSize('warning-text', reader)
  const place = placesRound(middle, { width: textWidth(words, 'warning-text', size), height: size * 1.1 }, [14, 26, 40])
  const box = place.find((one) => isFree(one, room, 2)) ?? place[0]!
  return [
    circle('warning', middle, 9),
    text('warning-text', [box.x, box.y + size * 0.85], words, { halo: 'sand', reader }),
  ]
}

const WAYS = [0, 180, 90, 270, 45, 135, 225, 315]

/** Boxes round a point, nearest first: right, left, below, above, then between. */
function placesRound([x, y]: Point, size: { width: number; height: number }, distances: readonly number[]): Box[] {
  return distances.flatMap((distance) =>
    WAYS.map((way) => {
      const [cos, sin] = [Math.cos((way * Math.PI) / 180), Math.sin((way * Math.PI) / 180)]
      const reach = distance + (Math.abs(cos) * size.width + Math.abs(sin) * size.height) / 2
      return { x: x + cos * reach - size.width / 2, y: y + sin * reach - size.height / 2, ...size }
    }),
  )
}

function cornerPlates(
  corners: readonly CircuitCorner[],
  road: Road,
  projection: Projection,
  reader: Reader,
  room: Room,
): Shape[] {
  const plated = corners
    .map((corner) => platedCorner(corner, road, projection))
    .filter(({ apex: [x, y] }) => overlap({ x, y, width: 0, height: 0 }, room.sheet))
  const nearest = drawnWidth(road, projection) / 2 + 10
  return placePlates(plated, room, [], nearest, reader).map((plate) => plateShapes(plate, reader))
}

/** A layout from above, whole and still. */
export function circuitMap(
  scene: CircuitScene,
  projection: Projection,
  words: { metres: (value: number) => string },
  reader: Reader,
): DisplayList {
  const furniture = mapFurniture(projection, words, reader)
  const room = { sheet: sheetBox(projection, -6), boxes: furniture.boxes }
  const { width, height } = projection
  return { width, height, shapes: [...circuitShapes(scene, projection, reader, room), ...furniture.shapes] }
}

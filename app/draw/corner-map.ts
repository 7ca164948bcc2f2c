import type { LandmarkKind, TurnDirection } from '~/book/kinds'
import type { GroundChoice, LandmarkView } from '~/book/view'
import { builtShapes } from '~/draw/built-shapes'
import { type Box, type DisplayList, linePath, type Point, path, polyline, type Shape, text } from '~/draw/display-list'
import { mapFurniture } from '~/draw/furniture'
import { type GroundFeature, type Water, watersOf } from '~/draw/ground'
import { markLabels } from '~/draw/map-labels'
import { type MapMark, markShapes, type PlacedMark, placedMarks, tetherShapes } from '~/draw/map-marks'
import { fitProjection, type Projection, sheetBox } from '~/draw/projection'
import { reliefShapes, waterShapes } from '~/draw/relief-shapes'
import type { Road } from '~/draw/road'
import { acrossRoad, blocksOf, drawnWidth, kerbShapes, roadPieces, roadShapes, startShapes } from '~/draw/road-shapes'
import { OVERHEAD_THINGS, ROAD_THINGS, simKerb } from '~/draw/road-things'
import type { Room } from '~/draw/room'
import { SIDE_THINGS } from '~/draw/side-things'
import type { Reader } from '~/draw/text-styles'
import { thingBoxes, thingNames } from '~/draw/thing-names'
import { drawThings, type Thing, thingsIn, thingsOf } from '~/draw/things'
import { type Offset, type Station, station } from '~/track/units'

/** What lies round a corner's road: the same for every view of it. */
export interface CornerScene {
  road: Road
  ground: readonly GroundFeature[]
  waters: readonly Water[]
  landmarks: readonly LandmarkView[]
  direction: TurnDirection
  /** Null where a map has no zero to show. */
  datum: Station | null
}

/** What a reader looks at in it. */
export interface CornerReading {
  marks: readonly MapMark[]
  show: GroundChoice
  selected: string | null
  /** Names and figures beside the marks, where they find room. */
  labels: boolean
  /** The line driven, in driving order. */
  driven: readonly { station: Station; offset: Offset }[]
  /** Dotted lines from a look mark to what it looks at. */
  aims: readonly { mark: string; landmark: string }[]
  reader: Reader
}

export interface CornerMapWords {
  /** "50 m" */
  metres: (value: number) => string
}

/** The scene of a corner; waters are read once. */
export function cornerScene(scene: Omit<CornerScene, 'waters'>): CornerScene {
  return { ...scene, waters: watersOf(scene.ground, scene.road.lap()) }
}

/** From this scale on a corner's road shows its detail, px per metre. */
export const DETAIL = 0.5
/** Nearer than this a first view does not go. */
const NEAREST = 8
const MARGIN = 34

/** A view of the stretch between two stations, with everything of it at least 34 px from the edges. */
export function cornerProjection(
  road: Road,
  stretch: { from: Station; to: Station },
  sheet: { width: number; height: number },
): Projection {
  const points = road.stretch(stretch.from, stretch.to)
  const detail = fitProjection(points, { ...sheet, margin: MARGIN, most: NEAREST })
  return { ...detail, detail: detail.pxPerMetre >= DETAIL }
}

/** From the first mark (or where the road begins to bend) to the last (or where it ends), over both grounds. */
export function stretchOfMarks(
  road: Road,
  bend: { entry: Station; exit: Station },
  marks: readonly MapMark[],
): { from: Station; to: Station } {
  const stations = marks.flatMap(({ sim, real }) => [sim, real].flatMap((place) => (place ? [place.station] : [])))
  const ahead = [...stations, bend.exit].map((at) => road.frame.gap(bend.entry, at))
  const length = road.frame.length
  const at = (metres: number) => station((((bend.entry + metres) % length) + length) % length)
  return { from: at(Math.min(0, ...ahead)), to: at(Math.max(...ahead)) }
}

/** Ground, road and things: what a view shows however the marks stand. */
export function cornerGround(scene: CornerScene, show: GroundChoice, projection: Projection, reader: Reader): Shape[] {
  const { road, ground, waters } = scene
  const things = thingsIn(thingsOf(scene.landmarks, show), road, projection)
  const kerbs = things.filter(({ landmark }) => landmark.kind === 'kerb')
  const solid = kerbs.filter(({ sim }) => !sim).map(({ placement }) => placement)
  return [
    ...reliefShapes(ground, projection),
    ...waterShapes(waters, projection),
    ...builtShapes(ground, projection),
    ...roadShapes(road, projection),
    ...drawThings(ROAD_THINGS, things, road, projection, reader),
    ...kerbs.filter(({ sim }) => sim).flatMap((kerb) => simKerb(kerb, road, projection)),
    ...kerbShapes(solid, road, projection),
    ...startShapes(road, projection),
    ...drawThings(OVERHEAD_THINGS, things, road, projection, reader),
    ...drawThings(SIDE_THINGS, shownBeside(things, ground, projection), road, projection, reader),
  ]
}

/** From this scale on the small things beside the road have room, px per metre. */
const SMALL_THINGS = 1.2
const LONG_KINDS: readonly LandmarkKind[] = ['wall', 'tyre-wall', 'bales', 'mast']

/** Small things from a scale on; a mast that the ground has is drawn there. */
function shownBeside(things: readonly Thing[], ground: readonly GroundFeature[], { pxPerMetre }: Projection): Thing[] {
  const hasMast = ground.some(({ kind }) => kind === 'mast')
  return things.filter(
    ({ landmark: { kind } }) =>
      !(hasMast && kind === 'mast') && (pxPerMetre >= SMALL_THINGS || LONG_KINDS.includes(kind)),
  )
}

/** The line driven, the zero, the aims, the tethers: what lies under the marks. */
export function cornerReading(scene: CornerScene, reading: CornerReading, projection: Projection): Shape[] {
  const { road, datum } = scene
  const placed = placedMarks(reading.marks, reading.show, road, projection)
  const driven = reading.driven.map(({ station: at, offset }) => projection.toPx(road.at(at, offset)))
  return [
    ...(driven.length < 2 ? [] : [polyline('driven-line', driven)]),
    ...(datum === null ? [] : datumShapes(scene, datum, projection, reading.reader)),
    ...aimShapes(scene, reading, placed, projection),
    ...tetherShapes(placed),
  ]
}

/** The zero: dots across the road, and its figure on the outside of the bend. */
function datumShapes(
  { road, direction }: CornerScene,
  datum: Station,
  projection: Projection,
  reader: Reader,
): Shape[] {
  const line = acrossRoad(road, projection, datum, 4) as [Point, Point]
  const [x, y] = acrossRoad(road, projection, datum, 13)[direction === 'right' ? 0 : 1]!
  return [
    path('datum', blocksOf(line, 2)),
    text('axis-zero', [x, y + 4.5], '0', { anchor: 'middle', halo: 'sand', reader }),
  ]
}

function aimShapes(
  { road, landmarks }: CornerScene,
  { aims }: CornerReading,
  placed: readonly PlacedMark[],
  projection: Projection,
): Shape[] {
  return aims.flatMap(({ mark, landmark }) => {
    const from = placed.findLast((one) => one.mark.id === mark)
    const thing = landmarks.find(({ id }) => id === landmark)
    const to = from && (thing?.[from.ground] ?? thing?.real ?? thing?.sim)
    if (!from || !to) return []
    return [path('aim', linePath([from.at, projection.toPx(road.at(to.station, to.offset ?? 0))]))]
  })
}

/**
 * Labels of marks, then names of things, in the room that glyphs, road and furniture leave.
 * @param within where labels may lie, px of the picture: all of it, or the part of it that is looked at
 */
export function cornerLabels(
  scene: CornerScene,
  reading: CornerReading,
  projection: Projection,
  taken: readonly Box[],
  within: Box = sheetBox(projection, -4),
): Shape[] {
  const { road } = scene
  const near = thingsIn(thingsOf(scene.landmarks, reading.show), road, projection)
  const things = projection.pxPerMetre >= SMALL_THINGS ? near : []
  const placed = placedMarks(reading.marks, reading.show, road, projection)
  const clearance = drawnWidth(road, projection) / 2 + 2
  const room: Room = {
    sheet: within,
    boxes: [...taken, ...thingBoxes(things, road, projection, reading.reader)],
    lines: roadPieces(road, projection, 0).map((points) => ({ points, clearance })),
  }
  const labels = reading.labels ? markLabels(placed, room, reading.reader) : []
  const glyphs = placed.map(({ at: [x, y] }) => ({ x: x - 9, y: y - 9, width: 18, height: 18 }))
  const left: Room = { ...room, boxes: [...room.boxes, ...glyphs, ...labels.map(({ box }) => box)] }
  const names = reading.labels ? thingNames(things, road, projection, left, reading.reader) : []
  return [...names, ...labels.flatMap(({ shapes }) => shapes)]
}

/** One corner from above, whole and still: everything of the view in one list. */
export function cornerMap(
  scene: CornerScene,
  reading: CornerReading,
  projection: Projection,
  words: CornerMapWords,
): DisplayList {
  const furniture = mapFurniture(projection, words, reading.reader)
  const placed = placedMarks(reading.marks, reading.show, scene.road, projection)
  return {
    width: projection.width,
    height: projection.height,
    shapes: [
      ...cornerGround(scene, reading.show, projection, reading.reader),
      ...cornerReading(scene, reading, projection),
      ...cornerLabels(scene, reading, projection, furniture.boxes),
      ...markShapes(placed, reading.selected, scene.direction === 'left'),
      ...furniture.shapes,
    ],
  }
}

import type { LandmarkKind } from '~/book/kinds'
import {
  type Box,
  circle,
  linePath,
  type Point,
  path,
  polygon,
  polyline,
  rect,
  type Shape,
  text,
} from '~/draw/display-list'
import type { StyleKey } from '~/draw/style-keys'
import { type Reader, textSize, textWidth } from '~/draw/text-styles'
import { type Draw, lineOf, placeOf, type Thing } from '~/draw/things'

const square = ([x, y]: Point, side: number, style: StyleKey) =>
  rect(style, { x: x - side / 2, y: y - side / 2, width: side, height: side })

const WALL = { width: 4, least: 6 } as const
/** A wall: a light band with dark edges and short strokes across. */
const wall: Draw = (thing, road, projection) => {
  const line = lineOf(thing, road, projection, WALL.least)
  if (thing.sim) return [path('thing-sim', linePath(line))]
  const d = linePath(line)
  return [path('wall', d, WALL.width), path('wall-hatch', d, WALL.width - 2)]
}

/** Tyres and bales: a row of rings. */
const tyres: Draw = (thing, road, projection) => {
  const d = linePath(lineOf(thing, road, projection, WALL.least))
  return thing.sim ? [path('thing-sim', d)] : [path('tyres-edge', d), path('tyres', d)]
}

/** The box of a board's text around its place. */
export function boardBox(words: string, [x, y]: Point, reader: Reader): Box {
  const size = textSize('board-text', reader)
  const width = textWidth(words, 'board-text', size) + 8
  return { x: x - width / 2, y: y - size / 2 - 1.5, width, height: size + 3 }
}

/** How far a board's field is set out from its foot, px, so that it clears the kerb. */
const BOARD_OUT = 10

/** Where the field of a board hangs: further out from the road than its foot. */
export function boardPlace(thing: Thing, road: Parameters<Draw>[1], projection: Parameters<Draw>[2]): Point {
  const { station, offset } = thing.placement
  const side = Math.sign(offset ?? 1) || 1
  return projection.toPx(road.at(station, (offset ?? road.width / 2) + (side * BOARD_OUT) / projection.pxPerMetre))
}

const board: Draw = (thing, road, projection, reader) => {
  const foot = placeOf(thing, road, projection)
  const words = thing.landmark.text ?? ''
  if (words === '') return [square(foot, 7, thing.sim ? 'thing-sim' : 'board')]
  const at = boardPlace(thing, road, projection)
  const box = boardBox(words, at, reader)
  const baseline: Point = [at[0], at[1] + textSize('board-text', reader) * 0.36]
  return [
    polyline('board-stem', [foot, at]),
    rect(thing.sim ? 'thing-sim' : 'board', box, 1.5),
    text('board-text', baseline, words, { anchor: 'middle', reader }),
  ]
}

const LIGHTS: readonly Point[] = [
  [-2, -2],
  [2, -2],
  [-2, 2],
  [2, 2],
  [0, 0],
]
/** A light panel: a dark square with five lights. */
const panel: Draw = (thing, road, projection) => {
  const [x, y] = placeOf(thing, road, projection)
  if (thing.sim) return [square([x, y], 9, 'thing-sim')]
  const lights = LIGHTS.map(([dx, dy]) => `M${(x + dx).toFixed(1)} ${(y + dy).toFixed(1)}h.1`)
  return [square([x, y], 9, 'panel'), path('panel-light', lights.join(''))]
}

const post: Draw = (thing, road, projection) => [
  square(placeOf(thing, road, projection), 7, thing.sim ? 'thing-sim' : 'post'),
]

const house: Draw = (thing, road, projection) => [
  square(placeOf(thing, road, projection), 9, thing.sim ? 'thing-sim' : 'building'),
]

const mast: Draw = (thing, road, projection) => {
  const [x, y] = placeOf(thing, road, projection)
  return mastShapes([x, y])
}

/** A mast: a narrow triangle over its foot. */
export const mastShapes = ([x, y]: Point): Shape[] => [
  polygon('mast', [
    [x, y - 9],
    [x - 5, y + 5],
    [x + 5, y + 5],
  ]),
  circle('mast-foot', [x, y], 1.4),
]

/** Things beside the road, at their true offset. Kerbs have a paint of their own. */
export const SIDE_THINGS: Partial<Record<LandmarkKind, Draw>> = {
  wall,
  'tyre-wall': tyres,
  bales: tyres,
  building: house,
  mast,
  'marshal-post': post,
  'marker-post': post,
  'wall-end': post,
  'tyre-bundle': post,
  cone: post,
  'light-panel': panel,
  sign: board,
  'distance-board': board,
}

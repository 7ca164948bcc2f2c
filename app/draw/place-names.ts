import { type Box, type Point, type Shape, text } from '~/draw/display-list'
import type { GroundFeature, GroundKind, Water } from '~/draw/ground'
import { boundsOf, clipRing, insideRing } from '~/draw/lines'
import type { Projection } from '~/draw/projection'
import { isFree, type Room } from '~/draw/room'
import { type Reader, type TextStyle, textSize, textWidth } from '~/draw/text-styles'

/** Kinds whose name is set beside them. */
const NAMED: readonly GroundKind[] = ['paddock', 'building', 'marsh', 'mast']

/** A name where it came to lie. */
export interface PlacedName {
  shape: Shape
  box: Box
}

function labelAt(style: TextStyle, words: string, box: Box, reader: Reader): PlacedName {
  const size = textSize(style, reader)
  return { box, shape: text(style, [box.x, box.y + size * 0.82], words, { halo: 'sand', reader }) }
}

function sizeOf(style: TextStyle, words: string, reader: Reader) {
  const size = textSize(style, reader)
  return { width: textWidth(words, style, size), height: size * 1.1 }
}

/** Names of things on the ground, below, above, right or left of each; one that finds no room is left out. */
export function placeNames(
  features: readonly GroundFeature[],
  projection: Projection,
  room: Room,
  reader: Reader,
): PlacedName[] {
  const taken: Room = { ...room, boxes: [...room.boxes] }
  return features.flatMap(({ kind, name, rings, lines, points }) => {
    const outline = [...rings, ...lines, points].flat()
    if (name === null || !NAMED.includes(kind) || outline.length === 0) return []
    const size = sizeOf('place-name', name, reader)
    const box = beside(boundsOf(outline.map(projection.toPx)), size).find((place) => isFree(place, taken, 2))
    if (!box) return []
    taken.boxes.push(box)
    return [labelAt('place-name', name, box, reader)]
  })
}

function beside(thing: Box, size: { width: number; height: number }): Box[] {
  const middle = { x: thing.x + thing.width / 2 - size.width / 2, y: thing.y + thing.height / 2 - size.height / 2 }
  return [
    { x: middle.x, y: thing.y + thing.height + 5, ...size },
    { x: thing.x + thing.width + 6, y: middle.y, ...size },
    { x: thing.x - 6 - size.width, y: middle.y, ...size },
    { x: middle.x, y: thing.y - 5 - size.height, ...size },
  ]
}

const WATER_STEP = 14
/** px from the shore: the water lines are not written over where the water is wide enough. */
const OFF_SHORE = 30

/** Names of waters, level, where the water is widest round the words; left out where they do not fit. */
export function waterNames(waters: readonly Water[], projection: Projection, room: Room, reader: Reader): Shape[] {
  return waters.flatMap(({ name, area }) => {
    if (name === null) return []
    const ring = clipRing(area.map(projection.toPx), room.sheet)
    const size = sizeOf('water-name', name, reader)
    const box = widestIn(ring, size, room)
    if (!box) return []
    const words = text('water-name', [box.x, box.y + size.height * 0.75], name, { reader })
    return [words]
  })
}

function widestIn(ring: readonly Point[], size: { width: number; height: number }, room: Room): Box | null {
  if (ring.length < 3) return null
  const bounds = boundsOf(ring)
  for (const off of [OFF_SHORE, OFF_SHORE / 2, 6]) {
    for (let y = bounds.y + bounds.height - size.height - off; y >= bounds.y; y -= WATER_STEP) {
      for (let x = bounds.x + off; x + size.width <= bounds.x + bounds.width; x += WATER_STEP) {
        const box = { x, y, ...size }
        if (isFree(box, room) && isInside(box, ring, off)) return box
      }
    }
  }
  return null
}

function isInside({ x, y, width, height }: Box, ring: readonly Point[], off: number): boolean {
  const across = [-off, 0, width / 4, width / 2, (3 * width) / 4, width, width + off]
  return across.every((dx) => insideRing([x + dx, y - off], ring) && insideRing([x + dx, y + height], ring))
}

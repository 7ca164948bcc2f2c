import type { LandmarkKind } from '~/book/kinds'
import { type Box, type Shape, text } from '~/draw/display-list'
import type { Projection } from '~/draw/projection'
import type { Road } from '~/draw/road'
import { isFree, type Room } from '~/draw/room'
import { boardBox, boardPlace } from '~/draw/side-things'
import { type Reader, textSize, textWidth } from '~/draw/text-styles'
import { placeOf, type Thing } from '~/draw/things'
import { station } from '~/track/units'

/** Kinds whose name helps on a map; a board says its own, a kerb or a wall is seen. */
const NAMED: readonly LandmarkKind[] = [
  'light-panel',
  'marshal-post',
  'marker-post',
  'wall-end',
  'building',
  'tyre-bundle',
  'cone',
  'bump',
  'drain',
  'patch',
  'standing-water',
  'bridge',
  'gantry',
  'mast',
]

/** Boxes that things beside the road take up, so that no label covers them. */
export function thingBoxes(things: readonly Thing[], road: Road, projection: Projection, reader: Reader): Box[] {
  return things.flatMap((thing) => {
    if (thing.placement.until !== null || thing.placement.offset === null) return []
    const words = thing.landmark.text
    if (words) return [boardBox(words, boardPlace(thing, road, projection), reader)]
    const [x, y] = placeOf(thing, road, projection)
    return [{ x: x - 5, y: y - 5, width: 10, height: 10 }]
  })
}

/** Names of things, beside each on the side away from the road; one that finds no room is left out. */
export function thingNames(
  things: readonly Thing[],
  road: Road,
  projection: Projection,
  room: Room,
  reader: Reader,
): Shape[] {
  const taken: Room = { ...room, boxes: [...room.boxes] }
  return things.flatMap((thing) => {
    const { landmark, sim } = thing
    if (sim || landmark.text || !NAMED.includes(landmark.kind)) return []
    const size = textSize('thing-name', reader)
    const box = besideRoad(thing, road, projection, {
      width: textWidth(landmark.name, 'thing-name', size),
      height: size,
    })
    const found = box.find((place) => isFree(place, taken, 2))
    if (!found) return []
    taken.boxes.push(found)
    return [text('thing-name', [found.x, found.y + size * 0.82], landmark.name, { halo: 'sand', reader })]
  })
}

function besideRoad(thing: Thing, road: Road, projection: Projection, size: { width: number; height: number }): Box[] {
  const { station: from, until, offset } = thing.placement
  const at = until === null ? from : station(from + road.frame.ahead(from, until) / 2)
  const side = Math.sign(offset ?? 1) || 1
  const edge = Math.max(Math.abs(offset ?? 0), road.width / 2)
  return [8, 16, 26].map((out) => {
    const foot = projection.toPx(road.at(at, side * edge))
    const far = projection.toPx(road.at(at, side * (edge + 1)))
    const length = Math.hypot(far[0] - foot[0], far[1] - foot[1]) || 1
    const [ux, uy] = [(far[0] - foot[0]) / length, (far[1] - foot[1]) / length]
    const depth = (Math.abs(ux) * size.width + Math.abs(uy) * size.height) / 2
    const reach = out + depth
    return { x: foot[0] + ux * reach - size.width / 2, y: foot[1] + uy * reach - size.height / 2, ...size }
  })
}

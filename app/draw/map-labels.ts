import type { MarkKind } from '~/book/kinds'
import { type Box, linePath, type Point, path, type Shape, text } from '~/draw/display-list'
import { holds, overlap } from '~/draw/lines'
import type { PlacedMark } from '~/draw/map-marks'
import type { Room } from '~/draw/room'
import { lineNearBox } from '~/draw/room'
import { type Reader, type TextStyle, textSize, textWidth } from '~/draw/text-styles'

/** Which labels are kept when there is no room for all: these first, then the rest in road order. */
const FIRST: readonly MarkKind[] = ['brake', 'turnin', 'apex', 'trackout']

/** A mark's two lines: kind in its colour, figure in ink. */
export interface MarkLabel {
  mark: PlacedMark
  box: Box
  shapes: Shape[]
}

const ANGLES = [0, 180, 30, -30, 150, -150, 60, -60, 120, -120, 90, -90]
const DISTANCES = [15, 22, 30, 40, 52, 66]
/** From this distance on a line leads from the label to its mark, px. */
const LEADER_FROM = 20

function sizeOf({ mark, place }: PlacedMark, reader: Reader) {
  const size = textSize('mark-figure', reader)
  const name = textWidth(mark.name, `name-${mark.kind}`, size)
  return { width: Math.max(name, textWidth(place.figure, 'mark-figure', size)), height: 2 * size + 3 }
}

/** Places round a mark, square to the road first; each as the box of the label. */
function places({ at, turn }: PlacedMark, size: { width: number; height: number }): Box[] {
  return DISTANCES.flatMap((distance) =>
    ANGLES.map((angle) => {
      // Square to the road lies a quarter turn from the way of travel.
      const direction = ((turn + angle) * Math.PI) / 180
      const [cos, sin] = [Math.cos(direction), Math.sin(direction)]
      const depth = (Math.abs(cos) * size.width + Math.abs(sin) * size.height) / 2
      const reach = distance + depth - Math.min(size.height / 2, distance / 2)
      return { x: at[0] + cos * reach - size.width / 2, y: at[1] + sin * reach - size.height / 2, ...size }
    }),
  )
}

/**
 * Labels of the marks looked at, one for a mark with two places (its real one). None overlaps another or any glyph, none
 * lies on the road, no leader runs through another or through a board; one that finds no place is left out. Marks never move.
 */
export function markLabels(placed: readonly PlacedMark[], room: Room, reader: Reader): MarkLabel[] {
  const own = placed.filter(
    ({ mark, ground }) => ground === 'real' || !placed.some((other) => other.ground === 'real' && other.mark === mark),
  )
  const order = [
    ...own.filter(({ mark }) => FIRST.includes(mark.kind)),
    ...own.filter(({ mark }) => !FIRST.includes(mark.kind)),
  ]
  const glyphs = placed.map(({ at: [x, y] }) => ({ x: x - 9, y: y - 9, width: 18, height: 18 }))
  const labels: MarkLabel[] = []
  for (const mark of order) {
    const blocking = [...room.boxes, ...labels.map(({ box }) => box)]
    const taken = [...glyphs, ...blocking]
    const box = places(mark, sizeOf(mark, reader)).find(
      (place) =>
        holds(room.sheet, place) &&
        !taken.some((other) => overlap(other, place, 2)) &&
        !room.lines.some(({ points, clearance }) => lineNearBox(points, place, clearance)) &&
        !blocking.some((other) => lineNearBox([mark.at, nearestOf(place, mark.at)], other, 1)),
    )
    if (box) labels.push({ mark, box, shapes: labelShapes(mark, box, reader) })
  }
  return labels
}

/** The point of a box nearest to another point. */
const nearestOf = (box: Box, [x, y]: Point): Point => [
  Math.min(Math.max(x, box.x), box.x + box.width),
  Math.min(Math.max(y, box.y), box.y + box.height),
]

function labelShapes({ mark, place, at }: PlacedMark, box: Box, reader: Reader): Shape[] {
  const size = textSize('mark-figure', reader)
  const middle = box.x + box.width / 2
  const end = nearestOf(box, at)
  const far = Math.hypot(end[0] - at[0], end[1] - at[1]) > LEADER_FROM
  const name: TextStyle = `name-${mark.kind}`
  return [
    ...(far ? [path('leader', linePath([at, end]))] : []),
    text(name, [middle, box.y + size * 0.85], mark.name, { anchor: 'middle', halo: 'sand', reader }),
    text('mark-figure', [middle, box.y + size * 1.85 + 2], place.figure, { anchor: 'middle', halo: 'sand', reader }),
  ]
}

import type { Box, Point } from '~/draw/display-list'
import { clipSegment, holds, overlap } from '~/draw/lines'

/** What is taken on a sheet: nothing may be set there. Lines keep their distance in px from the line itself. */
export interface Room {
  sheet: Box
  boxes: Box[]
  lines: { points: readonly Point[]; clearance: number }[]
}

/** A box with a border of `by` px more on every side. */
export const grown = ({ x, y, width, height }: Box, by: number): Box => ({
  x: x - by,
  y: y - by,
  width: width + 2 * by,
  height: height + 2 * by,
})

/** Whether a line comes nearer to a box than `clearance` px (measured in x and y each). */
export function lineNearBox(points: readonly Point[], box: Box, clearance: number): boolean {
  const around = grown(box, clearance)
  const right = around.x + around.width
  const bottom = around.y + around.height
  for (let i = 1; i < points.length; i++) {
    const [ax, ay] = points[i - 1]!
    const [bx, by] = points[i]!
    if ((ax < around.x && bx < around.x) || (ax > right && bx > right)) continue
    if ((ay < around.y && by < around.y) || (ay > bottom && by > bottom)) continue
    if (clipSegment(points[i - 1]!, points[i]!, around)) return true
  }
  return false
}

/** Whether a box lies on the sheet and touches nothing that is taken; `gap` px to other boxes. */
export const isFree = (box: Box, room: Room, gap = 3) =>
  holds(room.sheet, box) &&
  !room.boxes.some((taken) => overlap(taken, box, gap)) &&
  !room.lines.some(({ points, clearance }) => lineNearBox(points, box, clearance))

/** Squared distance in px² from a point to a box, 0 inside. */
export function boxDistance2([x, y]: Point, box: Box): number {
  const dx = Math.max(box.x - x, 0, x - box.x - box.width)
  const dy = Math.max(box.y - y, 0, y - box.y - box.height)
  return dx * dx + dy * dy
}

/** Points every `step` px of a line. */
function pointsAlong(line: readonly Point[], step: number): Point[] {
  return line.slice(1).flatMap((to, i) => {
    const from = line[i]!
    const count = Math.max(1, Math.round(Math.hypot(to[0] - from[0], to[1] - from[1]) / step))
    return Array.from({ length: count }, (_, k): Point => {
      const share = k / count
      return [from[0] + share * (to[0] - from[0]), from[1] + share * (to[1] - from[1])]
    })
  })
}

const boxPoints = ({ x, y, width, height }: Box): Point[] => [
  [x, y],
  [x + width, y],
  [x, y + height],
  [x + width, y + height],
  [x + width / 2, y + height / 2],
]

/** No gain in being further from everything than this, px. */
const WIDE_ENOUGH = 44
const STEP = 12

/** Distance from a box to the nearest of some points, as far as it is more than `atLeast`; 0 where it is not. */
function clearOf(content: readonly Point[], box: Box, atLeast: number): number {
  let least = WIDE_ENOUGH ** 2
  for (const point of content) {
    least = Math.min(least, boxDistance2(point, box))
    if (least <= atLeast * atLeast) return 0
  }
  return Math.sqrt(least)
}

/**
 * The emptiest place for a box: of all free places the one furthest from whatever is taken; of equal ones the first from
 * the upper left. Null where there is none.
 */
export function emptiestPlace(size: { width: number; height: number }, room: Room): Point | null {
  const content = [...room.lines.flatMap(({ points }) => pointsAlong(points, STEP)), ...room.boxes.flatMap(boxPoints)]
  let best: Point | null = null
  let most = 0
  const { sheet } = room
  for (let y = sheet.y; y + size.height <= sheet.y + sheet.height; y += STEP) {
    for (let x = sheet.x; x + size.width <= sheet.x + sheet.width; x += STEP) {
      const box = { x, y, ...size }
      const clear = clearOf(content, box, most + 0.5)
      if (clear === 0 || !isFree(box, room, 6)) continue
      most = clear
      best = [x, y]
    }
  }
  return best
}

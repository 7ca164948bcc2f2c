import type { Point } from '~/draw/display-list'
import { segmentDistance2 } from '~/draw/lines'

/** How far out from the shore the water lines run, px, nearest first; they fade outward. */
export const WATER_LINES = [4.5, 9.5, 17, 27, 40] as const

/**
 * The line at `distance` px to one side of a shore, in pieces: every point as far from the whole shore as that, and no
 * nearer; where the shore turns outward the line rounds the corner.
 * @param side 1: right of the shore as it is drawn on a picture whose y points down; −1: left
 */
export function parallelLine(shore: readonly Point[], distance: number, side: 1 | -1): Point[][] {
  const candidates = shore.slice(1).flatMap((to, i) => {
    const from = shore[i]!
    const length = Math.hypot(to[0] - from[0], to[1] - from[1])
    if (length === 0) return []
    const nx = (-(to[1] - from[1]) / length) * side
    const ny = ((to[0] - from[0]) / length) * side
    const steps = Math.max(1, Math.ceil(length / 12))
    return Array.from({ length: steps + 1 }, (_, k): Point => {
      const share = k / steps
      return [from[0] + share * (to[0] - from[0]) + nx * distance, from[1] + share * (to[1] - from[1]) + ny * distance]
    })
  })
  return piecesOf(candidates, shore, distance)
}

function piecesOf(candidates: readonly Point[], shore: readonly Point[], distance: number): Point[][] {
  const least = (distance - 0.3) ** 2
  const pieces: Point[][] = []
  let piece: Point[] = []
  for (const point of candidates) {
    if (shore.some((to, i) => i > 0 && segmentDistance2(point, shore[i - 1]!, to) < least)) continue
    const before = piece.at(-1)
    if (before && Math.hypot(point[0] - before[0], point[1] - before[1]) > 2 * distance + 14) {
      if (piece.length > 1) pieces.push(piece)
      piece = []
    }
    piece.push(point)
  }
  if (piece.length > 1) pieces.push(piece)
  return pieces
}

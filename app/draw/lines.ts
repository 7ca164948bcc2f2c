import type { Box, Point } from '~/draw/display-list'

/** Squared distance in px² from a point to the segment a–b. */
export function segmentDistance2([x, y]: Point, [ax, ay]: Point, [bx, by]: Point): number {
  const dx = bx - ax
  const dy = by - ay
  const length2 = dx * dx + dy * dy
  const share = length2 === 0 ? 0 : Math.min(Math.max(((x - ax) * dx + (y - ay) * dy) / length2, 0), 1)
  return (ax + share * dx - x) ** 2 + (ay + share * dy - y) ** 2
}

/**
 * How much further a point must be, px², to count as further. Engines differ in the last digits of a sine: of points that
 * lie equally far the first is taken everywhere, so that the browser draws what the server drew.
 */
const FURTHER = 1e-6

/**
 * The line with fewer points, nowhere further than `tolerance` px from the given one; its ends stay.
 * Source: Douglas and Peucker, Cartographica 10 (1973).
 */
export function simplifyLine(points: readonly Point[], tolerance: number): Point[] {
  if (points.length < 3) return [...points]
  const kept = new Uint8Array(points.length)
  kept[0] = 1
  kept[points.length - 1] = 1
  const spans: [number, number][] = [[0, points.length - 1]]
  for (let span = spans.pop(); span; span = spans.pop()) {
    const [from, to] = span
    let furthest = tolerance * tolerance
    let at = 0
    for (let i = from + 1; i < to; i++) {
      const distance = segmentDistance2(points[i]!, points[from]!, points[to]!)
      if (distance > furthest + FURTHER) {
        furthest = distance
        at = i
      }
    }
    if (at === 0) continue
    kept[at] = 1
    spans.push([from, at], [at, to])
  }
  return points.filter((_, i) => kept[i] === 1)
}

/** A ring with fewer points, by the same rule: cut at its first point and the one furthest from it. */
export function simplifyRing(ring: readonly Point[], tolerance: number): Point[] {
  if (ring.length < 5) return [...ring]
  const [x, y] = ring[0]!
  let at = 0
  let furthest = -1
  ring.forEach(([px, py], i) => {
    const distance = (px - x) ** 2 + (py - y) ** 2
    if (distance > furthest + FURTHER) {
      furthest = distance
      at = i
    }
  })
  const there = simplifyLine(ring.slice(0, at + 1), tolerance)
  const back = simplifyLine([...ring.slice(at), ring[0]!], tolerance)
  return [...there, ...back.slice(1, -1)]
}

/** The box around points. */
export function boundsOf(points: readonly Point[]): Box {
  let left = Infinity
  let right = -Infinity
  let top = Infinity
  let bottom = -Infinity
  for (const [x, y] of points) {
    left = Math.min(left, x)
    right = Math.max(right, x)
    top = Math.min(top, y)
    bottom = Math.max(bottom, y)
  }
  return { x: left, y: top, width: right - left, height: bottom - top }
}

/** A box as a ring. */
export const cornersOf = ({ x, y, width, height }: Box): Point[] => [
  [x, y],
  [x + width, y],
  [x + width, y + height],
  [x, y + height],
]

/** Whether two boxes share more than an edge, grown by `gap` px between them. */
export const overlap = (a: Box, b: Box, gap = 0) =>
  a.x < b.x + b.width + gap && b.x < a.x + a.width + gap && a.y < b.y + b.height + gap && b.y < a.y + a.height + gap

/** Whether `inner` lies in `outer` altogether. */
export const holds = (outer: Box, inner: Box) =>
  inner.x >= outer.x &&
  inner.y >= outer.y &&
  inner.x + inner.width <= outer.x + outer.width &&
  inner.y + inner.height <= outer.y + outer.height

/** Even-odd rule. */
export function insideRing([x, y]: Point, ring: readonly Point[]): boolean {
  let inside = false
  for (let i = 0, j = ring.length - 1; i < ring.length; j = i++) {
    const [xi, yi] = ring[i]!
    const [xj, yj] = ring[j]!
    if (yi > y !== yj > y && x < ((xj - xi) * (y - yi)) / (yj - yi) + xi) inside = !inside
  }
  return inside
}

/**
 * The parts of a line inside a box. Source of the test: Liang and Barsky, ACM Trans. Graph. 3 (1984).
 * @returns pieces in the order of the line; empty where it stays outside
 */
export function clipLine(points: readonly Point[], box: Box): Point[][] {
  const pieces: Point[][] = []
  let piece: Point[] = []
  for (let i = 1; i < points.length; i++) {
    const before = points[i - 1]!
    const point = points[i]!
    if (besides(before, point, box)) continue
    const cut = clipSegment(before, point, box)
    if (!cut) continue
    const [from, to] = cut
    const last = piece.at(-1)
    if (!last || last[0] !== from[0] || last[1] !== from[1]) {
      if (piece.length > 1) pieces.push(piece)
      piece = [from]
    }
    piece.push(to)
  }
  if (piece.length > 1) pieces.push(piece)
  return pieces
}

/** Whether both ends lie beyond the same side of a box. */
const besides = ([ax, ay]: Point, [bx, by]: Point, { x, y, width, height }: Box) =>
  (ax < x && bx < x) || (ay < y && by < y) || (ax > x + width && bx > x + width) || (ay > y + height && by > y + height)

const inside = ([px, py]: Point, { x, y, width, height }: Box) =>
  px >= x && py >= y && px <= x + width && py <= y + height

/** The part of a segment inside a box, null where there is none. */
export function clipSegment(a: Point, b: Point, box: Box): [Point, Point] | null {
  if (inside(a, box) && inside(b, box)) return [a, b]
  const dx = b[0] - a[0]
  const dy = b[1] - a[1]
  let from = 0
  let to = 1
  const walls: [number, number][] = [
    [-dx, a[0] - box.x],
    [dx, box.x + box.width - a[0]],
    [-dy, a[1] - box.y],
    [dy, box.y + box.height - a[1]],
  ]
  for (const [step, room] of walls) {
    if (step === 0) {
      if (room < 0) return null
      continue
    }
    const share = room / step
    if (step < 0) from = Math.max(from, share)
    else to = Math.min(to, share)
    if (from > to) return null
  }
  const at = (share: number): Point => (share === 0 ? a : share === 1 ? b : [a[0] + share * dx, a[1] + share * dy])
  return [at(from), at(to)]
}

/**
 * The part of a ring inside a box, one ring, along the box's edges where the ring leaves it.
 * Source: Sutherland and Hodgman, Comm. ACM 17 (1974).
 */
export function clipRing(ring: readonly Point[], box: Box): Point[] {
  const right = box.x + box.width
  const bottom = box.y + box.height
  const sides: [axis: 0 | 1, limit: number, keepAbove: boolean][] = [
    [0, box.x, true],
    [0, right, false],
    [1, box.y, true],
    [1, bottom, false],
  ]
  return sides.reduce<Point[]>((rest, [axis, limit, above]) => clipSide(rest, axis, limit, above), [...ring])
}

function clipSide(ring: readonly Point[], axis: 0 | 1, limit: number, above: boolean): Point[] {
  const kept: Point[] = []
  const inside = (point: Point) => (above ? point[axis] >= limit : point[axis] <= limit)
  ring.forEach((point, i) => {
    const before = ring[(i + ring.length - 1) % ring.length]!
    if (inside(point) !== inside(before)) {
      const share = (limit - before[axis]) / (point[axis] - before[axis])
      kept.push([before[0] + share * (point[0] - before[0]), before[1] + share * (point[1] - before[1])])
    }
    if (inside(point)) kept.push(point)
  })
  return kept
}

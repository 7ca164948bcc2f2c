import { type Point, px } from '~/draw/display-list'
import { boundsOf, insideRing } from '~/draw/lines'

/** Where the level y crosses a ring, from left to right: inside between the first and the second, and so on. */
function crossings(ring: readonly Point[], y: number): number[] {
  const at: number[] = []
  for (let i = 0, j = ring.length - 1; i < ring.length; j = i++) {
    const [xi, yi] = ring[i]!
    const [xj, yj] = ring[j]!
    if (yi > y !== yj > y) at.push(xj + ((y - yj) / (yi - yj)) * (xi - xj))
  }
  return at.sort((a, b) => a - b)
}

/**
 * Dots in a ring as path data: rows of straight lines that a pen with round ends and the dash `0 spacing` sets as points.
 * The rows lie on a grid of the whole picture, every second one half a step on, and keep `edge` px from the ring.
 */
export function dotRows(ring: readonly Point[], spacing: number, edge = 1.5): string {
  const box = boundsOf(ring)
  const rise = spacing / 2
  let d = ''
  for (let row = Math.ceil((box.y + edge) / rise); row * rise < box.y + box.height - edge; row++) {
    const y = row * rise
    const phase = row % 2 === 0 ? 0 : spacing / 2
    const at = crossings(ring, y)
    for (let i = 0; i + 1 < at.length; i += 2) {
      const from = Math.ceil((at[i]! + edge - phase) / spacing) * spacing + phase
      const run = Math.floor((at[i + 1]! - edge - from) / spacing) * spacing
      if (run >= 0) d += `M${px(from)} ${px(y)}h${px(run + 0.1)}`
    }
  }
  return d
}

/** Lines through a ring at one angle, degrees clockwise from the right, as path data. */
export function hatchLines(ring: readonly Point[], angle: number, spacing: number): string {
  const cos = Math.cos((angle * Math.PI) / 180)
  const sin = Math.sin((angle * Math.PI) / 180)
  const turned = ring.map(([x, y]): Point => [x * cos + y * sin, y * cos - x * sin])
  const back = (x: number, y: number) => `${px(x * cos - y * sin)} ${px(x * sin + y * cos)}`
  const box = boundsOf(turned)
  let d = ''
  for (let y = box.y + spacing; y < box.y + box.height - spacing / 2; y += spacing) {
    const at = crossings(turned, y)
    for (let i = 0; i + 1 < at.length; i += 2) d += `M${back(at[i]!, y)}L${back(at[i + 1]!, y)}`
  }
  return d
}

const TILE = { width: 26, height: 16 }
const TUFTS: readonly Point[] = [
  [6, 7],
  [19, 14],
]

/**
 * Marsh in a ring: tufts of three blades, each over a short water line, on a grid of the whole picture.
 * @returns path data of the blades and of the water
 */
export function marshTufts(ring: readonly Point[]): { blades: string; water: string } {
  const box = boundsOf(ring)
  let blades = ''
  let water = ''
  const columns = [Math.floor(box.x / TILE.width), Math.ceil((box.x + box.width) / TILE.width)] as const
  const rows = [Math.floor(box.y / TILE.height), Math.ceil((box.y + box.height) / TILE.height)] as const
  for (let row = rows[0]; row < rows[1]; row++) {
    for (let column = columns[0]; column < columns[1]; column++) {
      for (const [left, top] of TUFTS) {
        const x = px(column * TILE.width + left)
        const y = px(row * TILE.height + top)
        if (![-3, 3].every((side) => insideRing([x + side, y - 2], ring))) continue
        water += `M${px(x - 3)} ${y}h6`
        blades += `M${px(x - 1)} ${y}l-1.2-3M${x} ${y}v-3.6M${px(x + 1)} ${y}l1.3-3`
      }
    }
  }
  return { blades, water }
}

/** Direction of a ring's longest way across, degrees clockwise from the right. */
export function longAxis(ring: readonly Point[]): number {
  let longest = -1
  let angle = 0
  for (const [i, a] of ring.entries()) {
    for (const b of ring.slice(i + 1)) {
      const length = (b[0] - a[0]) ** 2 + (b[1] - a[1]) ** 2
      if (length > longest) {
        longest = length
        angle = (Math.atan2(b[1] - a[1], b[0] - a[0]) * 180) / Math.PI
      }
    }
  }
  return angle
}

import Flatbush from 'flatbush'
import type { Flat } from '~/track/read/on-plane'

/** Pairs of pieces looked at, beyond which the line is called a tangle. */
const mostPairs = 3_000_000
/** Crossings nearer to each other than this, along both passes, are one: the line meets itself at a position it shares. */
const sameCrossing = 1

/** A place where a ring crosses or covers itself. */
export interface Crossing {
  /** Metres from the first position to the first and to the second pass, along the ring. */
  readonly first: number
  readonly second: number
  /** Angle between the two passes in degrees, 0 to 90; 0 where one lies on the other. */
  readonly angle: number
}

/**
 * Where a closed ring crosses itself, in the order met, up to `most` crossings. Passes that lie on one another count as
 * one crossing of 0° each piece, and a piece that goes straight back over the one before it as well.
 * @param along metres from the first position to each, and the whole ring's length at the end: one more than positions
 */
export function crossingsOf(flat: Flat, along: Float64Array, most: number): { crossings: Crossing[]; tangle: boolean } {
  const n = along.length - 1
  const { x, y } = flat
  const index = new Flatbush(n, 16, Float64Array)
  for (let i = 0; i < n; i++) {
    const j = i + 1 === n ? 0 : i + 1
    index.add(Math.min(x[i]!, x[j]!), Math.min(y[i]!, y[j]!), Math.max(x[i]!, x[j]!), Math.max(y[i]!, y[j]!))
  }
  index.finish()
  const crossings: Crossing[] = []
  let pairs = 0
  for (let i = 0; i < n && crossings.length < most; i++) {
    const j = i + 1 === n ? 0 : i + 1
    const later = (k: number) => k > i && pairs++ < mostPairs
    const [west, east] = [Math.min(x[i]!, x[j]!), Math.max(x[i]!, x[j]!)]
    const [south, north] = [Math.min(y[i]!, y[j]!), Math.max(y[i]!, y[j]!)]
    for (const k of index.search(west, south, east, north, later)) {
      const found = meet(flat, along, i, k)
      if (found && !crossings.some((other) => isSame(other, found))) crossings.push(found)
    }
    if (pairs > mostPairs) return { crossings, tangle: true }
  }
  return { crossings, tangle: false }
}

const isSame = (a: Crossing, b: Crossing) =>
  Math.abs(a.first - b.first) < sameCrossing && Math.abs(a.second - b.second) < sameCrossing

/** Where piece `i` meets the later piece `k` of the ring; each owns its first end and not its last. */
function meet({ x, y }: Flat, along: Float64Array, i: number, k: number): Crossing | undefined {
  const n = along.length - 1
  const [i2, k2] = [(i + 1) % n, (k + 1) % n]
  const [rx, ry] = [x[i2]! - x[i]!, y[i2]! - y[i]!]
  const [sx, sy] = [x[k2]! - x[k]!, y[k2]! - y[k]!]
  const [qx, qy] = [x[k]! - x[i]!, y[k]! - y[i]!]
  const turn = rx * sy - ry * sx
  const size = Math.hypot(rx, ry) * Math.hypot(sx, sy)
  const neighbours = k === i + 1 || (i === 0 && k === n - 1)
  const parallel = Math.abs(turn) <= 1e-9 * size
  if (parallel) {
    const apart = Math.abs(qx * ry - qy * rx) / Math.hypot(rx, ry)
    const back = rx * sx + ry * sy < 0
    if (apart > 1e-6 || (neighbours && !back)) return undefined
    const [from, to] = [qx * rx + qy * ry, (qx + sx) * rx + (qy + sy) * ry]
    const overlaps = Math.max(0, Math.min(from, to)) < Math.min(rx * rx + ry * ry, Math.max(from, to))
    return overlaps ? { first: along[i]!, second: along[k]!, angle: 0 } : undefined
  }
  if (neighbours) return undefined
  const t = (qx * sy - qy * sx) / turn
  const u = (qx * ry - qy * rx) / turn
  if (!(t >= 0 && t < 1 && u >= 0 && u < 1)) return undefined
  const angle = (Math.asin(Math.min(1, Math.abs(turn) / size)) * 180) / Math.PI
  return {
    first: along[i]! + t * (along[i + 1]! - along[i]!),
    second: along[k]! + u * (along[k + 1]! - along[k]!),
    angle,
  }
}

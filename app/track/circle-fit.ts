import { type Metres, metres } from '~/track/units'

export interface Circle {
  readonly x: number
  readonly y: number
  readonly radius: Metres
}

/** Points whose spread across their main direction is smaller than this share of the spread along it count as straight. */
const straightness = 1e-12

/**
 * Circle through points by the algebraic least squares of Taubin (G. Taubin, IEEE Trans. PAMI 13, 1991, 1115–1138): the
 * smallest root of its cubic by Newton's steps from 0. Exact for points on a circle, and on short noisy arcs less drawn
 * to small radii than the plain algebraic fit. Null for fewer than three points and for points on one straight line.
 */
export function fitCircle(xs: ArrayLike<number>, ys: ArrayLike<number>): Circle | null {
  const n = xs.length
  if (n < 3) return null
  let mx = 0
  let my = 0
  for (let i = 0; i < n; i++) {
    mx += xs[i]! / n
    my += ys[i]! / n
  }
  let [xx, yy, xy, xz, yz, zz] = [0, 0, 0, 0, 0, 0]
  for (let i = 0; i < n; i++) {
    const x = xs[i]! - mx
    const y = ys[i]! - my
    const z = x * x + y * y
    xx += (x * x) / n
    yy += (y * y) / n
    xy += (x * y) / n
    xz += (x * z) / n
    yz += (y * z) / n
    zz += (z * z) / n
  }
  const z = xx + yy
  const det = xx * yy - xy * xy
  if (!(det > straightness * z * z)) return null
  const a3 = 4 * z
  const a2 = -3 * z * z - zz
  const a1 = zz * z + 4 * det * z - xz * xz - yz * yz - z * z * z
  const a0 = xz * xz * yy + yz * yz * xx - zz * det - 2 * xz * yz * xy + z * z * det
  const eta = smallestRoot(a3, a2, a1, a0)
  const scale = 2 * (eta * eta - eta * z + det)
  const cx = (xz * (yy - eta) - yz * xy) / scale
  const cy = (yz * (xx - eta) - xz * xy) / scale
  const radius = Math.sqrt(cx * cx + cy * cy + z)
  return Number.isFinite(radius) ? { x: cx + mx, y: cy + my, radius: metres(radius) } : null
}

/** Root of a3 x³ + a2 x² + a1 x + a0 reached by Newton's steps from 0. */
function smallestRoot(a3: number, a2: number, a1: number, a0: number): number {
  let x = 0
  let value = a0
  for (let step = 0; step < 50; step++) {
    const next = x - value / (a1 + x * (2 * a2 + 3 * a3 * x))
    const nextValue = a0 + next * (a1 + next * (a2 + next * a3))
    if (!(Math.abs(nextValue) < Math.abs(value))) break
    x = next
    value = nextValue
  }
  return x
}

/** Radius of the circle through three points (Menger): abc/4Δ; Infinity for three points on one straight line. */
export function radiusThrough(
  p: readonly [number, number],
  q: readonly [number, number],
  r: readonly [number, number],
): Metres {
  const twiceArea = Math.abs((q[0] - p[0]) * (r[1] - p[1]) - (q[1] - p[1]) * (r[0] - p[0]))
  const sides =
    Math.hypot(q[0] - p[0], q[1] - p[1]) * Math.hypot(r[0] - q[0], r[1] - q[1]) * Math.hypot(p[0] - r[0], p[1] - r[1])
  return metres(sides / (2 * twiceArea))
}

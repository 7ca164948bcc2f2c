/** Solves the cyclic tridiagonal system sub·v[i−1] + main·v[i] + sup·v[i+1] = right, by Thomas and Sherman–Morrison. */
function solveCyclic(sub: Float64Array, main: Float64Array, sup: Float64Array, rights: Float64Array[]): Float64Array[] {
  const n = main.length
  const gamma = -main[0]!
  const cornerTop = sub[0]!
  const cornerBottom = sup[n - 1]!
  const diagonal = main.slice()
  diagonal[0] = main[0]! - gamma
  diagonal[n - 1] = main[n - 1]! - (cornerTop * cornerBottom) / gamma
  const u = new Float64Array(n)
  u[0] = gamma
  u[n - 1] = cornerBottom
  const solve = (right: Float64Array) => {
    const c = new Float64Array(n)
    const v = new Float64Array(n)
    let pivot = diagonal[0]!
    v[0] = right[0]! / pivot
    for (let i = 1; i < n; i++) {
      c[i] = sup[i - 1]! / pivot
      pivot = diagonal[i]! - sub[i]! * c[i]!
      v[i] = (right[i]! - sub[i]! * v[i - 1]!) / pivot
    }
    for (let i = n - 2; i >= 0; i--) v[i]! -= c[i + 1]! * v[i + 1]!
    return v
  }
  const z = solve(u)
  const share = cornerTop / gamma
  const whole = 1 + z[0]! + share * z[n - 1]!
  return rights.map((right) => {
    const v = solve(right)
    const factor = (v[0]! + share * v[n - 1]!) / whole
    return v.map((value, i) => value - factor * z[i]!)
  })
}

/** Second derivatives at the knots of the periodic cubic splines through `values`; `steps[i]` from knot i to the next. */
function secondDerivatives(steps: Float64Array, values: Float64Array[]): Float64Array[] {
  const n = steps.length
  const before = (i: number) => (i + n - 1) % n
  const after = (i: number) => (i + 1) % n
  const sub = steps.map((_, i) => steps[before(i)]!)
  const main = steps.map((step, i) => 2 * (steps[before(i)]! + step))
  const rights = values.map((v) =>
    v.map((value, i) => 6 * ((v[after(i)]! - value) / steps[i]! - (value - v[before(i)]!) / steps[before(i)]!)),
  )
  return solveCyclic(sub, main, steps, rights)
}

/**
 * Points at even distances along the periodic cubic spline through the knots (x, y), the parameter being the distance
 * along the straight segments between them. `knots` holds that distance for each knot and the whole length as one more;
 * the samples lie at k·length/count. C. de Boor, A Practical Guide to Splines, ch. IV.
 */
export function sampleSpline(knots: Float64Array, x: Float64Array, y: Float64Array, count: number) {
  const n = x.length
  const steps = x.map((_, i) => knots[i + 1]! - knots[i]!)
  const [mx, my] = secondDerivatives(steps, [x, y]) as [Float64Array, Float64Array]
  const sampleX = new Float64Array(count)
  const sampleY = new Float64Array(count)
  const length = knots[n]!
  let i = 0
  for (let k = 0; k < count; k++) {
    const s = (k * length) / count
    while (i < n - 1 && knots[i + 1]! <= s) i++
    const j = (i + 1) % n
    const h = steps[i]!
    const b = (s - knots[i]!) / h
    const a = 1 - b
    const ca = ((a * a * a - a) * h * h) / 6
    const cb = ((b * b * b - b) * h * h) / 6
    sampleX[k] = a * x[i]! + b * x[j]! + ca * mx[i]! + cb * mx[j]!
    sampleY[k] = a * y[i]! + b * y[j]! + ca * my[i]! + cb * my[j]!
  }
  return { x: sampleX, y: sampleY }
}

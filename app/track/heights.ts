import type { Centreline } from '~/track/centreline'
import { resolutionOf, withoutSpikes } from '~/track/height-cleaning'
import { wrap } from '~/track/lap-frame'
import { frameAsDrawn, type LayoutFrame } from '~/track/layout-frame'
import { type Metres, metres, type PerMetre, perMetre, type Station, station } from '~/track/units'

export { crestsAndCompressions } from '~/track/crests'

/** Road heights at one station. Null where the source does not carry it: nothing is made up. */
export interface HeightSample {
  readonly station: Station
  readonly height: Metres | null
  /** Rise per metre in the direction of travel, uphill positive. */
  readonly gradient: number | null
  /** Vertical curvature in 1/m: positive in a compression, negative over a crest. */
  readonly verticalCurvature: PerMetre | null
}

export interface HeightProfile {
  readonly step: Metres
  /** From the start line on, one every `step`, once round. */
  readonly samples: readonly HeightSample[]
  /** The step in which the source gives heights; 1 m steps carry neither small crests nor sight lines. */
  readonly resolution: Metres
  /** How far the source's heights scatter about the smoothed ones (root mean square). */
  readonly scatter: Metres
  /** Share of the lap with a height, 0 to 1. */
  readonly known: number
  readonly lowest: { readonly station: Station; readonly height: Metres }
  readonly highest: { readonly station: Station; readonly height: Metres }
  /** Metres climbed in one lap, all rises added up; across an unknown stretch only what its ends show. */
  readonly climb: Metres
}

/** Heights further apart along the road than this say nothing of the road between them. */
const longestGap = 100
/** Half the width of the smoothing window, metres: heights are smoothed over about 80 m. */
const halfWindow = 40
/** Spacing of the heights the window is fitted to, metres. */
const gridStep = 4
/** A window filled less than this gives no slope. */
const leastFill = 0.6

/** Heights every `step` metres along the line as drawn, straight between known ones; NaN in gaps longer than 100 m. */
function heightGrid(line: Centreline, heights: Float64Array) {
  const count = Math.max(8, Math.round(line.length / gridStep))
  const step = line.length / count
  const grid = new Float64Array(count).fill(Number.NaN)
  const known = Array.from(heights.keys()).filter((i) => !Number.isNaN(heights[i]!))
  for (const [k, i] of known.entries()) {
    const next = known[(k + 1) % known.length]!
    const from = line.stations[i]!
    const gap = wrap(line.stations[next]! - from, line.length) || line.length
    if (gap > longestGap) continue
    for (let j = Math.ceil(from / step); j * step <= from + gap; j++) {
      const share = (j * step - from) / gap
      grid[j % count] = heights[i]! + share * (heights[next]! - heights[i]!)
    }
  }
  return { grid, step, count }
}

type Grid = ReturnType<typeof heightGrid>

/**
 * Height, slope and second derivative at a place along the drawn line: the parabola of least squares through the heights
 * within 40 m, weighted 1 − (d/40)² (Epanechnikov); null where the window is filled too little.
 */
function parabolaAt({ grid, step, count }: Grid, place: number) {
  const [s, t] = [new Float64Array(5), new Float64Array(3)]
  let full = 0
  for (let j = Math.ceil((place - halfWindow) / step); j * step <= place + halfWindow; j++) {
    const d = (j * step - place) / halfWindow
    const weight = 1 - d * d
    const height = grid[wrap(j, count)]!
    full += weight
    if (Number.isNaN(height)) continue
    let power = weight
    for (let k = 0; k < 5; k++) {
      s[k]! += power
      if (k < 3) t[k]! += power * height
      power *= d
    }
  }
  if (!(s[0]! >= leastFill * full)) return null
  const [s0, s1, s2, s3, s4] = s as unknown as [number, number, number, number, number]
  const [t0, t1, t2] = t as unknown as [number, number, number]
  const m00 = s2 * s4 - s3 * s3
  const m01 = s2 * s3 - s1 * s4
  const m02 = s1 * s3 - s2 * s2
  const m11 = s0 * s4 - s2 * s2
  const m12 = s1 * s2 - s0 * s3
  const m22 = s0 * s2 - s1 * s1
  const det = s0 * m00 + s1 * m01 + s2 * m02
  return {
    height: (m00 * t0 + m01 * t1 + m02 * t2) / det,
    slope: (m01 * t0 + m11 * t1 + m12 * t2) / det / halfWindow,
    second: (2 * (m02 * t0 + m12 * t1 + m22 * t2)) / det / halfWindow ** 2,
  }
}

function sampleAt(grid: Grid, frame: LayoutFrame, value: Station): HeightSample {
  const place = frame.toAlong(value)
  const near = grid.grid[Math.round(place / grid.step) % grid.count]!
  const fit = Number.isNaN(near) ? null : parabolaAt(grid, place)
  if (!fit) {
    const height = Number.isNaN(near) ? null : metres(near)
    return { station: value, height, gradient: null, verticalCurvature: null }
  }
  return {
    station: value,
    height: metres(fit.height),
    gradient: frame.reversed ? -fit.slope : fit.slope,
    verticalCurvature: perMetre(fit.second / (1 + fit.slope ** 2) ** 1.5),
  }
}

/** Root mean square of the known heights about the smoothed ones. */
function scatterOf(line: Centreline, heights: Float64Array, grid: Grid): number {
  let sum = 0
  let count = 0
  heights.forEach((height, i) => {
    const fit = Number.isNaN(height) ? null : parabolaAt(grid, line.stations[i]!)
    if (!fit) return
    sum += (fit.height - height) ** 2
    count++
  })
  return count > 0 ? Math.sqrt(sum / count) : 0
}

/**
 * The heights of a lap, cleaned and smoothed, every `step` metres (taken to the nearest that divides the lap evenly).
 * 0 among other heights and voids count as missing, single spikes are left out, gaps up to 100 m are filled straight,
 * longer ones stay unknown. Null where the positions carry no heights.
 */
export function heightProfile(road: Centreline | LayoutFrame, step: Metres): HeightProfile | null {
  const frame = 'centreline' in road ? road : frameAsDrawn(road)
  const line = frame.centreline
  const heights = withoutSpikes(line.stations, line.heights)
  const grid = heightGrid(line, heights)
  const count = Math.max(8, Math.round(line.length / step))
  const evenStep = line.length / count
  const samples = Array.from({ length: count }, (_, k) => sampleAt(grid, frame, station(k * evenStep)))
  const known = samples.filter((sample) => sample.height !== null) as (HeightSample & { height: Metres })[]
  if (known.length === 0) return null
  const climb = known.reduce((sum, { height }, i) => sum + Math.max(0, height - known.at(i - 1)!.height), 0)
  const most = (better: (one: Metres, other: Metres) => boolean) => {
    const best = known.reduce((one, other) => (better(other.height, one.height) ? other : one))
    return { station: best.station, height: best.height }
  }
  return {
    step: metres(evenStep),
    samples,
    resolution: metres(resolutionOf(heights)),
    scatter: metres(scatterOf(line, heights, grid)),
    known: known.length / count,
    lowest: most((one, other) => one < other),
    highest: most((one, other) => one > other),
    climb: metres(climb),
  }
}

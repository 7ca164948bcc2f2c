import type { HeightProfile } from '~/track/heights'
import { type Metres, metres, type Station } from '~/track/units'

/** A crest, over which a car goes light, or a compression, which presses it down. */
export interface Crest {
  readonly kind: 'crest' | 'compression'
  readonly from: Station
  /** Where it is sharpest. */
  readonly station: Station
  readonly until: Station
  /** Vertical radius where it is sharpest. */
  readonly verticalRadius: Metres
  /** Change of gradient from one end to the other, rise per metre, without sign. */
  readonly change: number
}

/** A vertical radius above this does nothing that a driver feels: under 0.2 g at 60 m/s. */
const gentleRadius = 2000
const leastChange = 0.01
/** Heights are smoothed over this length: an error e in them looks like a curvature of 8e over its square (a sagitta). */
const smoothedOver = 80

/**
 * Crests and compressions of a lap in driving order: where the vertical radius falls below 2,000 m and the gradient
 * changes by a hundredth at least. Heights in coarse steps or with scatter must show a sharper one: anything they could
 * feign is left out.
 */
export function crestsAndCompressions(profile: HeightProfile): Crest[] {
  const { samples, step } = profile
  const feigned = (8 * Math.max(profile.resolution, 3 * profile.scatter)) / smoothedOver ** 2
  const least = Math.max(1 / gentleRadius, feigned)
  const signAt = (k: number) => {
    const curvature = samples[k % samples.length]!.verticalCurvature ?? 0
    return Math.abs(curvature) > least ? Math.sign(curvature) : 0
  }
  const first = samples.findIndex((_, k) => signAt(k) !== signAt(k + samples.length - 1))
  const found: Crest[] = []
  for (let k = first; first >= 0 && k < first + samples.length; k++) {
    const sign = signAt(k)
    if (sign === 0) continue
    let end = k
    while (signAt(end + 1) === sign) end++
    const run = Array.from({ length: end - k + 1 }, (_, i) => samples[(k + i) % samples.length]!)
    const sharpest = run.reduce((one, other) => (bend(other) > bend(one) ? other : one))
    const change = run.reduce((sum, sample) => sum + bend(sample) * step, 0)
    if (change >= leastChange) {
      found.push({
        kind: sign > 0 ? 'compression' : 'crest',
        from: run[0]!.station,
        station: sharpest.station,
        until: run.at(-1)!.station,
        verticalRadius: metres(1 / bend(sharpest)),
        change,
      })
    }
    k = end
  }
  return found.sort((one, other) => one.station - other.station)
}

const bend = (sample: HeightProfile['samples'][number]) => Math.abs(sample.verticalCurvature ?? 0)

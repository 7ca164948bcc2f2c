/** No road lies outside these heights; sources write −32768 or −9999 for "no data". */
const lowestRoad = -500
const highestRoad = 9000

/**
 * Heights in metres with NaN where the source has none: nothing given, a void, or 0 among heights that are not 0, which
 * is how many sources write "missing". All 0 means no heights at all.
 */
export function knownHeights(given: readonly (number | undefined)[]): Float64Array {
  return Float64Array.from(given, (height) =>
    height !== undefined && height !== 0 && height > lowestRoad && height < highestRoad ? height : Number.NaN,
  )
}

/** A single height that stands off its neighbours' line by more than this many metres, plus a share of the way to the nearer one. */
const spikeHeight = 3
const spikeSlope = 0.15
const spikePasses = 3

/** How far height i stands off the straight line between the known heights round it, beyond what a road can do; ≤ 0 where it can. */
function excessOf(stations: Float64Array, heights: Float64Array, known: readonly number[], k: number): number {
  const length = stations[heights.length]!
  const [before, i, after] = [known.at(k - 1)!, known[k]!, known[(k + 1) % known.length]!]
  const run = (stations[i]! - stations[before]! + length) % length
  const rest = (stations[after]! - stations[i]! + length) % length
  const line = heights[before]! + ((heights[after]! - heights[before]!) * run) / (run + rest)
  return Math.abs(heights[i]! - line) - spikeHeight - spikeSlope * Math.min(run, rest)
}

/** The heights of a ring without single spikes: each height whose excess is above 0 and above its neighbours' becomes NaN. */
export function withoutSpikes(stations: Float64Array, heights: Float64Array): Float64Array {
  const result = heights.slice()
  for (let pass = 0; pass < spikePasses; pass++) {
    const known = Array.from(result.keys()).filter((i) => !Number.isNaN(result[i]!))
    if (known.length < 4) return result
    const excess = known.map((_, k) => excessOf(stations, result, known, k))
    const spikes = known.filter(
      (_, k) => excess[k]! > 0 && excess[k]! > excess.at(k - 1)! && excess[k]! >= excess[(k + 1) % known.length]!,
    )
    if (spikes.length === 0) return result
    for (const i of spikes) result[i] = Number.NaN
  }
  return result
}

const resolutions = [10, 5, 1, 0.5, 0.1, 0.01]
const finest = 0.001

/**
 * The step in which heights are given, in metres: the largest of 10, 5, 1, 0.5, 0.1 and 0.01 that divides every
 * difference from the lowest one (the height itself, where all are the same); 0.001 where none does.
 */
export function resolutionOf(heights: Float64Array): number {
  const known = heights.filter((height) => !Number.isNaN(height))
  const lowest = known.reduce((least, height) => Math.min(least, height), Infinity)
  const steps = known.map((height) => height - lowest)
  const values = steps.some((step) => step > 0) ? steps : known
  const divides = (step: number) => values.every((value) => Math.abs(value / step - Math.round(value / step)) < 1e-5)
  return resolutions.find(divides) ?? finest
}

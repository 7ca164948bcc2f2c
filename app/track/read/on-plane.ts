import { makePlane } from '~/track/plane'
import type { Points } from '~/track/read/points'
import type { LngLat } from '~/track/units'

/** Columns of metres east and north, beside the columns of a set of positions. */
export interface Flat {
  readonly x: Float64Array
  readonly y: Float64Array
}

/** Positions looked at to find the middle of a trace. */
const samples = 999

/** The middle value of a list; of an even number the lower one. */
const middle = (values: number[]) => values.sort((p, q) => p - q)[Math.floor((values.length - 1) / 2)]!

/**
 * Takes positions to the tangent plane at their median place, so that a single stray position cannot move it. Longitudes
 * are compared the short way round from the first one.
 */
export function flatten(points: Points): Flat {
  const { lon, lat, length } = points
  const step = Math.max(1, Math.floor(length / samples))
  const eastward: number[] = []
  const latitudes: number[] = []
  for (let i = 0; i < length; i += step) {
    const ahead = lon[i]! - lon[0]!
    eastward.push(ahead - 360 * Math.round(ahead / 360))
    latitudes.push(lat[i]!)
  }
  return onPlane(points, makePlane([[lon[0]! + middle(eastward), middle(latitudes)]]))
}

/** South-west and north-east corners of the positions' bounding box, longitudes the short way round from the first one. */
export function cornersOf(points: Points): readonly [LngLat, LngLat] {
  const { lon, lat, length } = points
  let [west, east, south, north] = [0, 0, 90, -90]
  for (let i = 0; i < length; i++) {
    const ahead = lon[i]! - lon[0]!
    const short = ahead - 360 * Math.round(ahead / 360)
    west = Math.min(west, short)
    east = Math.max(east, short)
    south = Math.min(south, lat[i]!)
    north = Math.max(north, lat[i]!)
  }
  return [
    [lon[0]! + west, south],
    [lon[0]! + east, north],
  ]
}

/** Takes positions to a tangent plane. */
export function onPlane(points: Points, plane: ReturnType<typeof makePlane>): Flat {
  const x = new Float64Array(points.length)
  const y = new Float64Array(points.length)
  for (let i = 0; i < points.length; i++) {
    const place = plane.toPlane([points.lon[i]!, points.lat[i]!])
    x[i] = place.x
    y[i] = place.y
  }
  return { x, y }
}

/** Metres between two positions of a plane. */
export function gapBetween({ x, y }: Flat, i: number, k: number): number {
  const east = x[k]! - x[i]!
  const north = y[k]! - y[i]!
  return Math.sqrt(east * east + north * north)
}

/** Metres along positions `start` ≤ i < `end`. */
export function lengthAlong(flat: Flat, start: number, end: number): number {
  let sum = 0
  for (let i = start + 1; i < end; i++) sum += gapBetween(flat, i - 1, i)
  return sum
}

import { type LngLat, type Metres, metres, type Position } from '~/track/units'

/** Metres east (x) and north (y) of a plane's middle. */
export interface PlanePoint {
  readonly x: number
  readonly y: number
}

/** The tangent plane of one layout. Holds for circuits up to 30 km; a position on the far half of the earth folds back. */
export interface Plane {
  readonly toPlane: (position: LngLat | Position) => PlanePoint
  /** Exact inverse of `toPlane` (closed form). */
  readonly toLngLat: (point: PlanePoint) => LngLat
  /** Direction of true north in the plane at a position, degrees clockwise from the y axis: the meridians converge. */
  readonly northAt: (position: LngLat | Position) => number
}

/** WGS 84 semi-major axis in metres and flattening (EPSG:4326, ellipsoid EPSG:7030). */
const a = 6378137
const f = 1 / 298.257223563
const e2 = f * (2 - f)
const radian = Math.PI / 180

/** Longitude brought to −180 ≤ λ < 180. */
export const normalLongitude = (longitude: number) => longitude - 360 * Math.floor((longitude + 180) / 360)

/** Radius of curvature in the prime vertical, from sin φ. */
const primeVertical = (sinLatitude: number) => a / Math.sqrt(1 - e2 * sinLatitude * sinLatitude)

/** Middle of the bounding box, the longitudes taken the short way round from the first one. */
function middleOf(positions: readonly (LngLat | Position)[]): LngLat {
  const reference = positions[0]![0]
  let west = 0
  let east = 0
  let south = 90
  let north = -90
  for (const [longitude, latitude] of positions) {
    const east0 = normalLongitude(longitude - reference)
    west = Math.min(west, east0)
    east = Math.max(east, east0)
    south = Math.min(south, latitude)
    north = Math.max(north, latitude)
  }
  return [normalLongitude(reference + (west + east) / 2), (south + north) / 2]
}

/**
 * The tangent plane at the middle of the positions' bounding box: WGS 84 longitude and latitude to earth-centred
 * coordinates on the ellipsoid (heights left out), then their east and north components there. Works across ±180°.
 * Lengths are short by d²/2R² at most, d metres from the middle: under 0.0001 % at 7.5 km.
 * Throws a RangeError without positions.
 * Source of the formulas: geocentric and topocentric conversions, IOGP Guidance Note 7-2 (EPSG methods 9602, 9837).
 */
export function makePlane(positions: readonly (LngLat | Position)[]): Plane {
  if (positions.length === 0) throw new RangeError('A plane needs at least one position')
  const [longitude0, latitude0] = middleOf(positions)
  const sin0 = Math.sin(latitude0 * radian)
  const cos0 = Math.cos(latitude0 * radian)
  const outward0 = primeVertical(sin0) * cos0
  const polar0 = primeVertical(sin0) * (1 - e2) * sin0

  const toPlane = (position: LngLat | Position): PlanePoint => {
    const eastward = (position[0] - longitude0) * radian
    const latitude = position[1] * radian
    const sin = Math.sin(latitude)
    const n = primeVertical(sin)
    const nCos = n * Math.cos(latitude)
    const outward = nCos * Math.cos(eastward) - outward0
    const polar = n * (1 - e2) * sin - polar0
    return { x: nCos * Math.sin(eastward), y: cos0 * polar - sin0 * outward }
  }

  // The vertical line through (x, y) meets the ellipsoid p² + x² + Z²/(1 − e²) = a² at the height u: a quadratic.
  const toLngLat = ({ x, y }: PlanePoint): LngLat => {
    const p = outward0 - sin0 * y
    const z = polar0 + cos0 * y
    const b = p * cos0 + (z * sin0) / (1 - e2)
    const c = p * p + x * x + (z * z) / (1 - e2) - a * a
    const u = -c / (b + Math.sqrt(b * b - (cos0 * cos0 + (sin0 * sin0) / (1 - e2)) * c))
    const outward = p + cos0 * u
    const latitude = Math.atan2(z + sin0 * u, (1 - e2) * Math.hypot(outward, x))
    return [normalLongitude(longitude0 + Math.atan2(x, outward) / radian), latitude / radian]
  }

  const northAt = (position: LngLat | Position) => {
    const eastward = (position[0] - longitude0) * radian
    const latitude = position[1] * radian
    const x = -Math.sin(latitude) * Math.sin(eastward)
    const y = sin0 * Math.sin(latitude) * Math.cos(eastward) + cos0 * Math.cos(latitude)
    return Math.atan2(x, y) / radian
  }

  return { toPlane, toLngLat, northAt }
}

/**
 * Straight distance in metres between two positions: the chord through the earth between their places on the ellipsoid
 * (heights left out), short of the geodesic by c²/24R²: under 0.0001 % at 30 km.
 */
export function straightDistance(from: LngLat | Position, to: LngLat | Position): Metres {
  const sinFrom = Math.sin(from[1] * radian)
  const sinTo = Math.sin(to[1] * radian)
  const nFrom = primeVertical(sinFrom)
  const nTo = primeVertical(sinTo)
  const outFrom = nFrom * Math.cos(from[1] * radian)
  const outTo = nTo * Math.cos(to[1] * radian)
  const half = Math.sin(((to[0] - from[0]) * radian) / 2)
  const polar = (1 - e2) * (nTo * sinTo - nFrom * sinFrom)
  const around = 4 * outFrom * outTo * half * half
  return metres(Math.sqrt((outTo - outFrom) ** 2 + around + polar * polar))
}

import geographicLib from 'geographiclib-geodesic'
import type { LngLat, Position } from '~/track/units'

/** The reference for lengths on the ellipsoid: GeographicLib on WGS 84 (Karney, J. Geodesy 87, 2013, 43–55). */
export const wgs84 = geographicLib.Geodesic.WGS84

/** Geodesic length in metres and azimuth at the first position in degrees clockwise from north. */
export function geodesic(from: LngLat | Position, to: LngLat | Position): { length: number; azimuth: number } {
  const { s12, azi1 } = wgs84.Inverse(from[1], from[0], to[1], to[0])
  return { length: s12 ?? Number.NaN, azimuth: azi1 ?? Number.NaN }
}

/** Length in metres of a line along its geodesics. */
export const lengthAlong = (positions: readonly (LngLat | Position)[]) =>
  positions.slice(1).reduce((sum, position, i) => sum + geodesic(positions[i]!, position).length, 0)

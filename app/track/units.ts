/**
 * Branded numbers and positions. A unit lives in the type and in the name; a bare `number` never crosses a module of the
 * pure folders where it means a length, a speed or a place. Constructors only brand: they check nothing.
 */

declare const unit: unique symbol
type Branded<Name extends string> = number & { readonly [unit]: Name }

/** Length in metres. */
export type Metres = Branded<'Metres'>
/** Duration in seconds. */
export type Seconds = Branded<'Seconds'>
/** Speed in metres per second. */
export type MetresPerSecond = Branded<'MetresPerSecond'>
/** Angle in degrees. */
export type Degrees = Branded<'Degrees'>
/** Signed curvature in 1/m; left turn positive (ISO 8855: y to the left). */
export type PerMetre = Branded<'PerMetre'>
/** Metres from the start line along the centreline in the direction of travel, 0 ≤ station < lap length. */
export type Station = Branded<'Station'>
/** Metres along the centreline as drawn, from its first position, whatever the start line and the direction; 0 ≤ along < length. */
export type Along = Branded<'Along'>
/** Metres to the left (+) or right (−) of the direction in which the centreline is drawn. */
export type Across = Branded<'Across'>
/** Metres to the left (+) or right (−) of the direction of travel (ISO 8855, y axis). */
export type Offset = Branded<'Offset'>

/** WGS84 longitude, latitude in degrees: the GeoJSON order (RFC 7946, 3.1.1). */
export type LngLat = readonly [longitude: number, latitude: number]
/** Longitude, latitude, and height in metres where the source gives one. */
export type Position = readonly [longitude: number, latitude: number, height?: number]

export const metres = (value: number) => value as Metres
export const seconds = (value: number) => value as Seconds
export const metresPerSecond = (value: number) => value as MetresPerSecond
export const degrees = (value: number) => value as Degrees
export const perMetre = (value: number) => value as PerMetre
export const station = (value: number) => value as Station
export const along = (value: number) => value as Along
export const across = (value: number) => value as Across
export const offset = (value: number) => value as Offset

/** Speed in m/s from km/h. 1 km/h = 1/3.6 m/s exactly (NIST SP 811). */
export const fromKmh = (kmh: number) => metresPerSecond(kmh / 3.6)
/** Speed in km/h from m/s. */
export const toKmh = (speed: MetresPerSecond) => speed * 3.6

/** Metres to the millimetre, as they are stored and compared; never −0. */
export const toMillimetre = (value: number) => Math.round(value * 1000) / 1000 + 0

import type { Problem } from '~/track/read/problems'

/** Positions a file may hold before it is refused. */
export const mostPositions = 1_000_000

/**
 * Positions as columns that grow: longitude and latitude in degrees, height in metres, time in seconds since 1970, road
 * width right and left of the line in metres. NaN where the file gives none.
 */
export class Points {
  length = 0
  lon: Float64Array
  lat: Float64Array
  height: Float64Array
  time: Float64Array
  right: Float64Array
  left: Float64Array

  /**
   * @param room positions there is room for at once; it grows beyond
   * @param hasWidths whether widths are kept; their columns are empty otherwise
   */
  constructor(
    room = 256,
    readonly hasWidths = false,
  ) {
    const column = (length: number) => new Float64Array(length)
    this.lon = column(room)
    this.lat = column(room)
    this.height = column(room)
    this.time = column(room)
    this.right = column(hasWidths ? room : 0)
    this.left = column(hasWidths ? room : 0)
  }

  push(lon: number, lat: number, height = Number.NaN, time = Number.NaN, right = Number.NaN, left = Number.NaN): void {
    if (this.length === this.lon.length) this.grow()
    const i = this.length++
    this.lon[i] = lon
    this.lat[i] = lat
    this.height[i] = height
    this.time[i] = time
    if (!this.hasWidths) return
    this.right[i] = right
    this.left[i] = left
  }

  /** Adds one position of another set. */
  copy(from: Points, i: number): void {
    this.push(from.lon[i]!, from.lat[i]!, from.height[i]!, from.time[i]!, from.right[i]!, from.left[i]!)
  }

  private grow(): void {
    const larger = (column: Float64Array) => {
      const next = new Float64Array(column.length * 2 + 8)
      next.set(column)
      return next
    }
    this.lon = larger(this.lon)
    this.lat = larger(this.lat)
    this.height = larger(this.height)
    this.time = larger(this.time)
    if (!this.hasWidths) return
    this.right = larger(this.right)
    this.left = larger(this.left)
  }
}

/**
 * Room for the positions that so many bytes can hold, up to the most that are read and one more. Room costs no memory
 * until it is filled.
 * @param fewest bytes that one position takes at least
 */
export const roomFor = (bytes: number, fewest: number) => Math.min(mostPositions, Math.floor(bytes / fewest)) + 1

/** A run of positions `start` ≤ i < `end` that the file draws as one line. */
export interface Line {
  readonly start: number
  readonly end: number
  readonly name?: string
  /** Where in the file it stands, in words. */
  readonly where?: string
}

/** What a heights column is measured from: RFC 7946 has the WGS 84 ellipsoid, GPX and KML mean sea level. */
export type HeightDatum = 'ellipsoid' | 'sea-level'

/** What a file holds before one line is chosen. */
export interface Content {
  readonly points: Points
  readonly lines: readonly Line[]
  /** A trace's lines are stretches driven one after the other, never bridged; a drawing's lines may be joined end to end. */
  readonly kind: 'drawing' | 'trace'
  readonly name?: string
  readonly heightDatum?: HeightDatum
}

/** What reading one format comes to. */
export type Reading =
  | { readonly ok: true; readonly content: Content; readonly warnings: readonly Problem[] }
  | { readonly ok: false; readonly problems: readonly Problem[] }

/** Longest layout name kept. */
const longestName = 120

/** A name on one line, or nothing where it is blank. Copied letter by letter, so that it does not keep the file's text alive. */
export function tidyName(text: string | undefined): string | undefined {
  if (text === undefined) return undefined
  const flat = text
    .slice(0, 4 * longestName)
    .replace(/[\p{Cc}\p{Cf}\p{Cs}\s]+/gu, ' ')
    .trim()
  const letters = Array.from(flat).slice(0, longestName)
  return letters.length === 0 ? undefined : letters.join('').trim()
}

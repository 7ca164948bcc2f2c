/** What a screen can offer to mend a reading; each goes back into `readLayout` as an option. */
export type Remedy = 'close' | 'choose-lap' | 'choose-pieces' | 'give-anchor'

/** One thing found wrong with a file, or repaired in it. */
export interface Problem {
  /** Stable kebab-case name of the kind of problem. */
  readonly code: ProblemCode
  /** Full plain sentences that name the file, the place in it and what to do. */
  readonly message: string
  /** The place in the file, in words: "line 12", "feature 3, position 17". */
  readonly where?: string
  readonly remedy?: Remedy
}

export type ProblemCode =
  // The file
  | 'file-empty'
  | 'file-too-large'
  | 'not-the-format'
  | 'unknown-encoding'
  // JSON and GeoJSON
  | 'json-too-deep'
  | 'json-too-many-containers'
  | 'json-broken'
  | 'not-geojson'
  | 'unknown-type'
  | 'geojson-shape'
  | 'line-too-short'
  | 'ring-too-short'
  | 'member-not-allowed'
  | 'bbox-ignored'
  | 'crs-ignored'
  // XML, GPX and KML
  | 'xml-doctype'
  | 'xml-broken'
  | 'xml-too-deep'
  | 'xml-too-many-elements'
  | 'coordinates-broken'
  | 'blanks-in-coordinates'
  // CSV
  | 'no-header'
  | 'quote-open'
  | 'width-out-of-range'
  | 'anchor-needed'
  | 'anchor-out-of-range'
  // Coordinates
  | 'coordinates-missing'
  | 'not-a-number'
  | 'swapped-axes'
  | 'out-of-range'
  | 'too-many-positions'
  | 'decimal-comma'
  | 'extra-coordinate'
  | 'byte-order-mark'
  | 'heights-left-out'
  // Which line
  | 'no-line'
  | 'points-ignored'
  | 'polygons-left-out'
  | 'inner-rings-left-out'
  | 'routes-left-out'
  | 'too-many-pieces'
  | 'pieces-joined'
  | 'pieces-left-out'
  | 'no-such-piece'
  | 'lap-taken'
  | 'laps-with-gaps'
  | 'segments-left-out'
  | 'no-such-lap'
  // The line itself
  | 'too-few-positions'
  | 'duplicate-positions'
  | 'ring-closed'
  | 'ring-open'
  | 'thinned'
  | 'too-short'
  | 'too-long'
  | 'too-many-crossings'
  | 'crossing-too-flat'
  | 'crossing-too-near'

/**
 * A problem whose message does not name the file yet: `nameFile` puts it in front.
 * @param says full sentences, the last one the remedy
 */
export function problem(code: ProblemCode, says: string, where?: string, remedy?: Remedy): Problem {
  return { code, message: says, ...(where !== undefined && { where }), ...(remedy && { remedy }) }
}

const longestFileName = 120

/** The file's name on one line of at most 120 characters, fit for a sentence. */
export function printableName(fileName: string): string {
  const letters = Array.from(
    fileName
      .slice(0, 4 * longestFileName)
      .replace(/[\p{Cc}\p{Cf}\s]+/gu, ' ')
      .trim(),
  )
  if (letters.length === 0) return 'The file'
  return letters.length <= longestFileName ? letters.join('') : `${letters.slice(0, longestFileName).join('')}…`
}

/** The same problem with the file and the place in front of its sentences. */
export function nameFile(fileName: string, found: Problem): Problem {
  const place = found.where === undefined ? '' : `, ${found.where}`
  return { ...found, message: `${printableName(fileName)}${place}: ${found.message}` }
}

/** Whole number with a narrow no-break space between thousands. */
export function count(value: number): string {
  return String(Math.round(value)).replace(/\B(?=(\d{3})+$)/g, '\u202F')
}

/** "1 position", "2 positions". */
export function several(value: number, one: string, many = `${one}s`): string {
  return `${count(value)} ${value === 1 ? one : many}`
}

/** Metres as read: "0.4 m", "38 m", "4.12 km". */
export function inMetres(value: number): string {
  if (value < 10) return `${value.toFixed(1)}\u00A0m`
  if (value < 1000) return `${Math.round(value)}\u00A0m`
  return `${(value / 1000).toFixed(2)}\u00A0km`
}

/** Seconds as a lap time: "58.3 s", "1:32.4". */
export function inSeconds(value: number): string {
  const tenths = Math.round(value * 10)
  const minutes = Math.floor(tenths / 600)
  const rest = (tenths - minutes * 600) / 10
  return minutes === 0 ? `${rest.toFixed(1)}\u00A0s` : `${minutes}:${rest.toFixed(1).padStart(4, '0')}`
}

const longestQuote = 40

/** A piece of the file in quotation marks, cut short, on one line. */
export function quoted(text: string): string {
  const flat = text
    .slice(0, 2 * longestQuote)
    .replace(/[\p{Cc}\p{Cf}\s]+/gu, ' ')
    .trim()
  return flat.length <= longestQuote ? `“${flat}”` : `“${flat.slice(0, longestQuote)}…”`
}

import type { Across, Along, Metres } from '~/track/units'
import type { LandmarkId } from './ids'

/**
 * Where a place hangs on a landmark, and how. Every part may be left open: a tie of words alone is a tie.
 * Along: `metres` or car `lengths` (never both) before (−) or after (+) the named point of the landmark, measured along the
 * landmark's own edge. Sideways: which part of the car stands on what.
 */
export interface Tie {
  landmarkId: LandmarkId | null
  along: { from: 'start' | 'middle' | 'end' | 'block'; block: number | null; metres: number; lengths: number } | null
  across: {
    part: 'left-wheels' | 'right-wheels' | 'centre'
    on: 'left-line' | 'right-line' | 'left-edge' | 'right-edge' | 'kerb' | 'middle'
    metres: number
  } | null
  /** The driver's own words for the thing on the ground; shown instead of a generated sentence. */
  words: string | null
  /** The driver's own words for where across the road. */
  acrossWords: string | null
}

/** One place of a mark: one field of an operation, replaced whole. Metres of the drawn line, rounded to 1 mm. */
export interface Place {
  along: Along
  across: Across
  tie: Tie | null
}

/**
 * Where a landmark or a stretch stands, on one ground. `until` is null for a thing without length. Across values are of the
 * thing itself; `acrossTo` bounds a thing with width on the road (a patch, a bump). `edgeLength`, `blockLength`, `width` are a kerb's.
 */
export interface Placement {
  along: Along
  until: Along | null
  across: Across | null
  acrossTo: Across | null
  edgeLength: Metres | null
  blockLength: Metres | null
  width: Metres | null
  /** Words for what differs on this ground ("rises at the end"), where a measure does not say it. */
  words: string | null
}

/** A card's fixed zero. */
export interface Datum {
  along: Along
  /** "from the middle of the apex kerb" */
  words: string
}

/** What a card says of one kerb: which part, how much of it, what the car does on it. */
export interface KerbNote {
  part: string
  words: string
}

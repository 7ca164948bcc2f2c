import type { LayoutFrame } from '~/track/layout-frame'
import type { ReadOptions } from '~/track/read-layout'
import { type Along, along, type LngLat, type Metres, type Station, station } from '~/track/units'

/** What a person typed of a circuit on its way in, as he typed it. */
export interface ImportTyped {
  name: string
  layout: string
  timeZone: string
  roadWidth: string
  /** By the key of a `DraftCorner`. An empty number is the corner's place in the lap. */
  corners: Record<string, { accepted: boolean; number: string; name: string }>
}

/** What a person chose of a circuit on its way in: how the file is read, and how the line read from it is driven. */
export interface ImportChoices {
  lap: number | null
  pieces: number[] | null
  anchor: LngLat | null
  close: boolean
  reversed: boolean
  startAlong: Along
  typed: ImportTyped
}

export const firstChoices = (name = ''): ImportChoices => ({
  lap: null,
  pieces: null,
  anchor: null,
  close: false,
  reversed: false,
  startAlong: along(0),
  typed: { name, layout: '', timeZone: '', roadWidth: '', corners: {} },
})

/** The choices as the reader of files takes them. */
export const readOptions = ({ lap, pieces, anchor, close }: ImportChoices): ReadOptions => ({
  close,
  ...(lap !== null && { lap }),
  ...(pieces !== null && { pieces }),
  ...(anchor !== null && { anchor }),
})

/** Another way to read the file gives another line: start line, direction and corners begin anew. */
export const readAnew = (
  choices: ImportChoices,
  how: Partial<Pick<ImportChoices, 'lap' | 'pieces' | 'anchor' | 'close'>>,
): ImportChoices => ({
  ...choices,
  ...how,
  reversed: false,
  startAlong: along(0),
  typed: { ...choices.typed, corners: {} },
})

/** Numbers are places in the lap again; names and what was accepted stay with their corners. */
const renumbered = (typed: ImportTyped): ImportTyped => ({
  ...typed,
  corners: Object.fromEntries(Object.entries(typed.corners).map(([key, corner]) => [key, { ...corner, number: '' }])),
})

/** The same line driven the other way; the start line stays where it is. */
export const drivenBack = (choices: ImportChoices): ImportChoices => ({
  ...choices,
  reversed: !choices.reversed,
  typed: renumbered(choices.typed),
})

/** The start line put at a place of the drawn line. */
export const startAt = (choices: ImportChoices, startAlong: Along): ImportChoices => ({
  ...choices,
  startAlong,
  typed: renumbered(choices.typed),
})

/**
 * The start line moved.
 * @param from station to count from, in the frame of the choices
 * @param ahead metres forward from there, negative: back
 */
export const startMoved = (
  choices: ImportChoices,
  frame: Pick<LayoutFrame, 'toAlong'>,
  from: Station,
  ahead: Metres,
): ImportChoices => startAt(choices, frame.toAlong(station(from + ahead)))

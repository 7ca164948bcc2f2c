import { makeCentreline } from '~/track/centreline'
import { type ProposedCorner, proposeCornersInFrame } from '~/track/corners'
import { type ImportChoices, readOptions } from '~/track/import-choices'
import { type LayoutFrame, makeFrame } from '~/track/layout-frame'
import { type Layout, type LayoutReading, readLayout } from '~/track/read-layout'
import { type Along, type Degrees, type Metres, metres, type Station } from '~/track/units'

/** A proposed corner of a circuit on its way in. Stations are of the driving frame. */
export interface DraftCorner extends ProposedCorner {
  /** Names the corner as long as the line stays the same, whatever the start line and the direction. */
  readonly key: string
  /** Its place in the lap, counted from 1: the number to begin with. */
  readonly number: string
}

/** The corners that a line suggests, in driving order from its start line, numbered from 1. */
export function draftCorners(frame: LayoutFrame): DraftCorner[] {
  return proposeCornersInFrame(frame).map((corner, i) => ({
    ...corner,
    key: String(Math.round(frame.toAlong(corner.apex))),
    number: String(i + 1),
  }))
}

/** A corner as rows hold it: places along the drawn line, direction as drawn. */
export interface DrawnCorner {
  readonly direction: 'left' | 'right'
  readonly turnDegrees: Degrees
  readonly leastRadius: Metres
  readonly entry: Along
  readonly apex: Along
  readonly exit: Along
}

/** A corner of the driving frame as it lies on the drawn line: driven backwards, its exit comes first and left is right. */
export function asDrawn(corner: ProposedCorner, frame: LayoutFrame): DrawnCorner {
  const { reversed } = frame
  const opposite = corner.direction === 'left' ? 'right' : 'left'
  const place = (station: Station) => frame.toAlong(station)
  return {
    direction: reversed ? opposite : corner.direction,
    turnDegrees: corner.turnDegrees,
    leastRadius: corner.leastRadius,
    entry: place(reversed ? corner.exit : corner.entry),
    apex: place(corner.apex),
    exit: place(reversed ? corner.entry : corner.exit),
  }
}

/** The road's width as the file gives it, from edge to edge: the middle one of all its positions; null where it gives none. */
export function widthOf({ widths }: Pick<Layout, 'widths'>): Metres | null {
  const sums = (widths ?? []).map(({ left, right }) => left + right).filter((width) => width > 0)
  if (sums.length === 0) return null
  sums.sort((a, b) => a - b)
  return metres(sums[Math.floor(sums.length / 2)] ?? 0)
}

/** A circuit file read as its person chose: the reading, and where it holds a line the lap driven on it. */
export type LayoutDraft =
  | {
      readonly ok: true
      readonly reading: Extract<LayoutReading, { ok: true }>
      readonly frame: LayoutFrame
      readonly corners: DraftCorner[]
    }
  | { readonly ok: false; readonly reading: Extract<LayoutReading, { ok: false }> }

/** Reads a circuit file with the choices made so far. */
export function readDraft(bytes: Uint8Array, fileName: string, choices: ImportChoices): LayoutDraft {
  const reading = readLayout(bytes, fileName, readOptions(choices))
  if (!reading.ok) return { ok: false, reading }
  const frame = makeFrame(makeCentreline(reading.layout.positions), choices)
  return { ok: true, reading, frame, corners: draftCorners(frame) }
}

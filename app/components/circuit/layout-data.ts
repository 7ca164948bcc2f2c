import type { SubmissionResult } from '@conform-to/react'
import type { GeometryHash } from '~/book/ids'
import type { TurnDirection } from '~/book/kinds'
import type { Along, Degrees, Metres, Station } from '~/track/units'

/** A corner of a layout in the driving frame. */
export interface LayoutCorner {
  id: string
  number: string
  name: string
  direction: TurnDirection
  turnDegrees: Degrees
  leastRadius: Metres
  entry: Station
  apex: Station
}

/** A line of the layout's change log. */
export interface LayoutChange {
  operation: string
  words: string
  who: string | null
  when: string
}

/** The page of a circuit's layout, as it is given it. */
export interface LayoutPageData {
  team: string
  circuit: { slug: string; name: string; timeZone: string }
  layout: {
    id: string
    name: string
    rev: number
    roadWidth: Metres
    startAlong: Along
    reversed: boolean
    centreline: GeometryHash
    ground: GeometryHash | null
  }
  /** In driving order. */
  corners: readonly LayoutCorner[]
  books: readonly { slug: string; name: string }[]
  changes: readonly LayoutChange[]
  may: { change: boolean; makeBook: boolean }
  /** Width in px that the server draws for. */
  sheet: number
}

/** What became of the form that was sent. */
export type LayoutOutcome =
  | { kind: 'done'; words: string; undo: { operation?: string; batch?: string } | null }
  | { kind: 'refused'; words: string }
  | { kind: 'conflict'; form: 'corners'; corner: string; title: string; choices: readonly Choice[] }
  | { kind: 'conflict'; form: 'way'; title: string; choices: readonly Choice[]; again: StartAgain }

/** A start line to be put over another's: metres of the drawn line. */
export interface StartAgain {
  startAlong: number
  seenStart: number
}

/** One field that two people changed. */
export interface Choice {
  field: string
  theirs: string
  mine: string
}

export interface LayoutActionData {
  /** Another one for each form sent: what is to be sent again begins anew with it. */
  id: string
  form: 'corners' | 'way' | 'undo'
  outcome: LayoutOutcome | null
  /** What was typed and what does not fit, where the form is to be sent again. */
  lastResult: SubmissionResult<string[]> | null
}

/** A row of the form of corners, as its fields hold it. */
export interface CornerFields {
  id: string
  number: string
  name: string
  seenNumber: string
  seenName: string
}

/** The form of corners as it begins: every row as it is now. */
export const cornerFields = (corners: readonly LayoutCorner[]): CornerFields[] =>
  corners.map(({ id, number, name }) => ({ id, number, name, seenNumber: number, seenName: name }))

/**
 * The form of corners to be sent again: a row that was typed in keeps what was typed and what it was typed over; every other row
 * is as it is now.
 * @param payload the form as it came
 * @param shown the corner of which the page now shows what another made of it
 */
export function typedAgain(payload: unknown, corners: readonly LayoutCorner[], shown: string | null): CornerFields[] {
  const rows = new Map((Array.isArray(payload) ? payload : []).map((row: Partial<CornerFields>) => [row.id, row]))
  return cornerFields(corners).map((now) => {
    const row = rows.get(now.id)
    if (!row) return now
    const { number = '', name = '', seenNumber = '', seenName = '' } = row
    if (number === seenNumber && name === seenName) return now
    const seen = now.id === shown ? { seenNumber: now.number, seenName: now.name } : { seenNumber, seenName }
    return {
      id: now.id,
      number: number === seenNumber ? now.number : number,
      name: name === seenName ? now.name : name,
      ...seen,
    }
  })
}

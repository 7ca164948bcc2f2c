import type { Metres, MetresPerSecond } from '~/track/units'
import type { CornerId, LandmarkId, MarkId, PersonId } from './ids'
import type { Ground, LandmarkKind, StretchKind, TurnDirection } from './kinds'
import type { Datum, Place, Placement } from './place'
import type { FindingRow } from './proof'
import type { BookView, CardView, ConditionView, LayoutView, MarkView, StretchView } from './view'

/**
 * One book as it is stored: live rows only, metres of the drawn line. What `assembleBookView` turns into a `BookView`. Every
 * list may come in any order.
 */
export interface BookRows {
  book: BookView['book']
  circuit: BookView['circuit']
  layout: LayoutView
  car: BookView['car']
  /** Already in the order of their rank. */
  conditions: ConditionView[]
  corners: CornerRow[]
  landmarks: LandmarkRow[]
  stretches: StretchRow[]
  cards: CardRow[]
  marks: MarkRow[]
  findings: (FindingRow & { mark: MarkId; ground: Ground })[]
}

export interface CornerRow {
  id: CornerId
  number: string
  name: string
  direction: TurnDirection
  turnDegrees: number
  leastRadius: Metres
  entry: number
  apex: number
  exit: number
  datum: Datum
}

export type CardRow = CardView & { corner: CornerId }

export type MarkRow = Omit<MarkView, 'sim' | 'real' | 'speed' | 'madeBy'> & {
  card: CardRow['id']
  madeBy: PersonId
  speed: MetresPerSecond | null
  sim: Place | null
  real: Place | null
}

export interface LandmarkRow {
  id: LandmarkId
  kind: LandmarkKind
  name: string
  text: string | null
  corner: CornerId | null
  height: Metres | null
  real: Placement | null
  sim: Placement | null
}

export interface StretchRow {
  id: StretchView['id']
  kind: StretchKind
  name: string
  real: Placement | null
  sim: Placement | null
}

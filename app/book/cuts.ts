import type { ConditionId, CornerId, PersonId } from './ids'
import { PROOFS, type Proof } from './kinds'
import { bestProof } from './proof'
import type { BookView, CornerView, LandmarkView, StretchView } from './view'

/** What the overview of a book needs: no marks, no cards beyond a line's worth. */
export interface Overview {
  book: BookView['book']
  circuit: BookView['circuit']
  layout: BookView['layout']
  car: BookView['car']
  corners: OverviewCorner[]
  landmarks: LandmarkView[]
}

export interface OverviewCorner {
  id: CornerId
  number: string
  name: string
  direction: CornerView['direction']
  entry: CornerView['entry']
  apex: CornerView['apex']
  exit: CornerView['exit']
  gear: number | null
  leastSpeed: CornerView['card']['leastSpeed']
  flat: boolean
  state: CornerState
  marks: number
}

/**
 * What a corner's marks amount to: nothing noted yet, a draft, or the weakest proof that its brake reference (else its
 * best-proven mark) has in the condition.
 */
export type CornerState = 'empty' | 'draft' | 'seen' | 'driven'

/** Everything of the book that the overview shows. */
export function overviewOf(view: BookView, condition: ConditionId): Overview {
  return {
    book: view.book,
    circuit: view.circuit,
    layout: view.layout,
    car: view.car,
    landmarks: view.landmarks,
    corners: view.corners.map((corner) => ({
      id: corner.id,
      number: corner.number,
      name: corner.name,
      direction: corner.direction,
      entry: corner.entry,
      apex: corner.apex,
      exit: corner.exit,
      gear: corner.card.gearOut,
      leastSpeed: corner.card.leastSpeed,
      flat: corner.card.flat,
      state: cornerState(corner, condition),
      marks: corner.marks.length,
    })),
  }
}

/**
 * A corner is seen or driven when more than half of its real places in the condition are, by anyone. A corner whose marks are
 * told, or simulator only, is a draft.
 */
export function cornerState(corner: CornerView, condition: ConditionId): CornerState {
  const marks = corner.marks.filter((mark) => mark.condition === condition)
  if (marks.length === 0) return 'empty'
  const proofs = marks.map(
    (mark): Proof => (mark.real ? (bestProof(mark.real.proof, condition)?.proof ?? 'told') : 'told'),
  )
  const reaching = (least: Proof) => proofs.filter((proof) => PROOFS.indexOf(proof) >= PROOFS.indexOf(least)).length
  if (reaching('driven') * 2 > proofs.length) return 'driven'
  return reaching('seen') * 2 > proofs.length ? 'seen' : 'draft'
}

/** One corner with what lies beside its road. */
export interface CornerCut {
  book: BookView['book']
  circuit: BookView['circuit']
  layout: BookView['layout']
  car: BookView['car']
  conditions: BookView['conditions']
  corner: CornerView
  /** Number, name and id of every corner in driving order, for the tabs. */
  tabs: { id: CornerId; number: string; name: string }[]
  previous: string
  next: string
  landmarks: LandmarkView[]
  stretches: StretchView[]
}

/**
 * The cut of one corner by its number, null where the book has none. Landmarks are those of its stretch of road and of
 * `reach` metres before and after.
 */
export function cornerOf(view: BookView, number: string, reach = 200): CornerCut | null {
  const index = view.corners.findIndex((corner) => corner.number === number)
  const corner = view.corners[index]
  if (!corner) return null
  const at = (step: number) => view.corners[(index + step + view.corners.length) % view.corners.length]!.number
  const near = nearStretch(view.layout.length, corner, reach)
  return {
    book: view.book,
    circuit: view.circuit,
    layout: view.layout,
    car: view.car,
    conditions: view.conditions,
    corner,
    tabs: view.corners.map(({ id, number: label, name }) => ({ id, number: label, name })),
    previous: at(-1),
    next: at(1),
    landmarks: view.landmarks.filter((landmark) => near(landmark)),
    stretches: view.stretches.filter((stretch) => near(stretch)),
  }
}

type Standing = Pick<LandmarkView, 'real' | 'sim'>

function nearStretch(length: number, corner: CornerView, reach: number) {
  const ahead = (from: number, to: number) => (((to - from) % length) + length) % length
  const start = corner.datum.station - reach
  const span = Math.min(length, reach + ahead(corner.datum.station, corner.exit) + reach)
  const inside = (station: number) => ahead(start, station) <= span
  return (thing: Standing) =>
    [thing.real, thing.sim].some(
      (place) => place && (inside(place.station) || (place.until !== null && inside(place.until))),
    )
}

/** Whether a mark may be read as this person's own. */
export const isOwn = (mark: { forPerson: PersonId | null }, person: PersonId) => mark.forPerson === person

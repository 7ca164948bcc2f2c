import type { ConditionId, CornerId } from './ids'
import type { MarkKind } from './kinds'
import { bestProof, compareProof } from './proof'
import type { BookView, CornerView, LandmarkView, StretchView } from './view'

/** What the overview of a book needs: no marks, no cards beyond a line's worth. */
export interface Overview {
  book: BookView['book']
  circuit: BookView['circuit']
  layout: BookView['layout']
  car: BookView['car']
  corners: OverviewCorner[]
  /** The kerbs of the real track, which the map of the lap shows. */
  kerbs: LandmarkView[]
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
 * What a corner's marks amount to: none yet, none of the condition's own but the dry ones it inherits, not yet seen, seen on
 * foot, driven.
 */
export const CORNER_STATES = ['empty', 'inherited', 'draft', 'seen', 'driven'] as const
export type CornerState = (typeof CORNER_STATES)[number]

/** The kinds that stand at a thing on the ground, which a walk can check. The others happen where the car lets them. */
const REFERENCE_KINDS: readonly MarkKind[] = ['brake', 'lift', 'turnin', 'apex', 'trackout']

/** Everything of the book that the overview shows. */
export function overviewOf(view: BookView, condition: ConditionId): Overview {
  const dry = view.conditions.find((one) => one.kind === 'dry')?.id
  return {
    book: view.book,
    circuit: view.circuit,
    layout: view.layout,
    car: view.car,
    kerbs: view.landmarks.filter(({ kind, real }) => kind === 'kerb' && real !== null),
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
      state: stateIn(corner, condition, dry),
      marks: corner.marks.length,
    })),
  }
}

/** The state in a condition that inherits from the dry one. */
function stateIn(corner: CornerView, condition: ConditionId, dry: ConditionId | undefined): CornerState {
  const state = cornerState(corner, condition)
  const inherits = state === 'empty' && dry !== condition && corner.marks.some((mark) => mark.condition === dry)
  return inherits ? 'inherited' : state
}

/**
 * A corner is as good as the weakest of its references in the condition: the best proof that anyone has of each. A reference
 * with a simulator place only is told.
 */
export function cornerState(corner: CornerView, condition: ConditionId): CornerState {
  const marks = corner.marks.filter((mark) => mark.condition === condition)
  if (marks.length === 0) return 'empty'
  const references = marks.filter((mark) => REFERENCE_KINDS.includes(mark.kind))
  const judged = references.length > 0 ? references : marks
  const proofs = judged.map((mark) => (mark.real && bestProof(mark.real.proof, condition)?.proof) ?? 'told')
  const weakest = proofs.reduce((worst, proof) => (compareProof(proof, worst) < 0 ? proof : worst))
  return weakest === 'told' ? 'draft' : weakest
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

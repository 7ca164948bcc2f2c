import type { Degrees, Metres, MetresPerSecond, Offset, Station } from '~/track/units'
import type {
  BookId,
  CardId,
  CarId,
  CircuitId,
  ConditionId,
  CornerId,
  GeometryHash,
  LandmarkId,
  LayoutId,
  MarkId,
  PersonId,
  StretchId,
} from './ids'
import type {
  BrakeRole,
  ConditionKind,
  FindingVerdict,
  Ground,
  LandmarkKind,
  Manner,
  MarkKind,
  Proof,
  StretchKind,
  TurnDirection,
} from './kinds'
import type { KerbNote, Place } from './place'

export const BOOK_VIEW_VERSION = 1

/**
 * What a book says, neutral: person ids instead of names, no permissions, no viewer, no `Date`. Stations and offsets are in
 * the driving frame (start line and direction applied). Geometry is apart, named by hash. Pages get pure cuts of it.
 */
export interface BookView {
  formatVersion: typeof BOOK_VIEW_VERSION
  book: { id: BookId; slug: string; name: string; archived: boolean; rev: number }
  circuit: { id: CircuitId; slug: string; name: string; timeZone: string }
  layout: LayoutView
  car: { id: CarId; name: string; length: Metres; width: Metres; eyeHeight: Metres }
  conditions: ConditionView[]
  /** Live corners in driving order. */
  corners: CornerView[]
  landmarks: LandmarkView[]
  stretches: StretchView[]
}

export interface LayoutView {
  id: LayoutId
  name: string
  rev: number
  length: Metres
  roadWidth: Metres
  startAlong: number
  reversed: boolean
  centreline: GeometryHash
  ground: GeometryHash | null
}

export interface ConditionView {
  id: ConditionId
  kind: ConditionKind
  name: string
}

export interface CornerView {
  id: CornerId
  number: string
  name: string
  direction: TurnDirection
  turnDegrees: Degrees
  leastRadius: Metres
  /** Where the road bends: entry and exit of the curve, and its tightest point. */
  entry: Station
  apex: Station
  exit: Station
  /** The corner's stretch of road: from the previous corner's exit to its own. */
  from: Station
  datum: { station: Station; words: string }
  card: CardView
  /** In road order. */
  marks: MarkView[]
}

export interface CardView {
  id: CardId
  gearIn: number | null
  gearOut: number | null
  speedIn: MetresPerSecond | null
  leastSpeed: MetresPerSecond | null
  flat: boolean
  noReference: boolean
  line: string
  kerbs: KerbNote[]
  surface: string
  water: string
  car: string
  mistake: string
  traffic: string
  limits: string
  backup: string
  next: string
  setsUp: CornerId | null
  compromisedFor: CornerId | null
}

export interface MarkView {
  id: MarkId
  kind: MarkKind
  role: BrakeRole | null
  manner: Manner | null
  condition: ConditionId
  /** null: for everyone of the book. */
  forPerson: PersonId | null
  madeBy: PersonId
  gear: number | null
  downshifts: number | null
  speed: MetresPerSecond | null
  sim: PlaceView | null
  real: PlaceView | null
}

export interface PlaceView {
  station: Station
  offset: Offset
  /** Signed metres along the road to the card's datum: negative before it. Shown without a sign. */
  toDatum: Metres
  /** As it is stored, in metres of the drawn line, with its tie: what an operation on it starts from. */
  stored: Place
  /** Best standing proof per person and condition. */
  proof: ProofView[]
}

export interface ProofView {
  person: PersonId
  condition: ConditionId
  proof: Proof
  /** Who said, saw or drove it. */
  by: PersonId
  /** Instant, ISO 8601. */
  at: string
  verdict: FindingVerdict
}

export interface LandmarkView {
  id: LandmarkId
  kind: LandmarkKind
  name: string
  /** What is written on it: a name, not a measure. */
  text: string | null
  corner: CornerId | null
  height: Metres | null
  real: PlacementView | null
  sim: PlacementView | null
}

export interface PlacementView {
  station: Station
  until: Station | null
  offset: Offset | null
  offsetTo: Offset | null
  edgeLength: Metres | null
  blockLength: Metres | null
  width: Metres | null
  words: string | null
}

export interface StretchView {
  id: StretchId
  kind: StretchKind
  name: string
  real: PlacementView | null
  sim: PlacementView | null
}

/** Which places a reader looks at. */
export type GroundChoice = Ground | 'both'

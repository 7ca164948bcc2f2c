/** The closed vocabularies of a book. Words for the screen are in `~/words`; here are codes only. */

/** Mark kinds in the order in which a driver meets them; the order also settles marks at one station. */
export const MARK_KINDS = [
  'look',
  'brake',
  'lift',
  'gear',
  'turnin',
  'release',
  'apex',
  'throttle',
  'full',
  'trackout',
] as const
export type MarkKind = (typeof MARK_KINDS)[number]

/** A brake mark is for the first laps (`start`) or the one to build to (`target`). No other kind has a role. */
export const BRAKE_ROLES = ['start', 'target'] as const
export type BrakeRole = (typeof BRAKE_ROLES)[number]

export const MANNERS = ['brush', 'full', 'trail', 'squeeze'] as const
export type Manner = (typeof MANNERS)[number]

/** Where a place holds: in the simulator or on the real track. Kept apart for ever. */
export const GROUNDS = ['sim', 'real'] as const
export type Ground = (typeof GROUNDS)[number]

/** What someone found of a place. */
export const FINDING_VERDICTS = ['kept', 'moved', 'gone'] as const
export type FindingVerdict = (typeof FINDING_VERDICTS)[number]

/** Proof, weakest first: someone said so, seen on foot or slowly, proven at speed. */
export const PROOFS = ['told', 'seen', 'driven'] as const
export type Proof = (typeof PROOFS)[number]

/** How the place of a finding was measured. */
export const FINDING_METHODS = ['eye', 'gps', 'tie', 'lap'] as const
export type FindingMethod = (typeof FINDING_METHODS)[number]

export const CONDITION_KINDS = [
  'dry',
  'wet',
  'damp-off-line',
  'cold-tyres',
  'worn-tyres',
  'full-fuel',
  'night',
  'other',
] as const
export type ConditionKind = (typeof CONDITION_KINDS)[number]

export const LANDMARK_KINDS = [
  'kerb',
  'distance-board',
  'marshal-post',
  'light-panel',
  'sign',
  'gantry',
  'bridge',
  'wall',
  'wall-end',
  'tyre-wall',
  'tyre-bundle',
  'bales',
  'cone',
  'marker-post',
  'line',
  'seam',
  'patch',
  'bump',
  'drain',
  'standing-water',
  'building',
  'mast',
  'timing-line',
  'safety-car-line',
  'pit-entry-line',
  'pit-exit-line',
  'pit-speed-line',
] as const
export type LandmarkKind = (typeof LANDMARK_KINDS)[number]

export const STRETCH_KINDS = ['surface', 'grip', 'camber', 'height', 'drainage', 'layout-part'] as const
export type StretchKind = (typeof STRETCH_KINDS)[number]

export const TURN_DIRECTIONS = ['left', 'right'] as const
export type TurnDirection = (typeof TURN_DIRECTIONS)[number]

export const ROLES = ['manager', 'coach', 'driver'] as const
export type Role = (typeof ROLES)[number]

/** A thing's life. `null` in an operation means: does not exist yet. A merged corner points to the one that took it in. */
export const STATES = ['live', 'dropped', 'merged', 'archived'] as const

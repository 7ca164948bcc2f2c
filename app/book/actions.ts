import type { PersonId, TeamId } from './ids'
import type { Role } from './kinds'

/** The vocabulary of permission: who acts, what can be done, and why not. */

export type Actor =
  | { kind: 'person'; person: PersonId; team: TeamId; role: Role }
  | { kind: 'stranger' }
  | { kind: 'job'; name: string; team: TeamId }

export const ACTIONS = [
  'book.read',
  'book.make',
  'book.archive',
  'book.rename',
  'card.change',
  'condition.change',
  'mark.add',
  'mark.change',
  'finding.add',
  'finding.add-for-another',
  'proposal.decide',
  'circuit.read',
  'circuit.change',
  'landmark.add',
  'landmark.change',
  'car.read',
  'car.change',
  'edition.read',
  'edition.publish',
  'notice.raise',
  'team.read',
  'people.manage',
] as const
export type Action = (typeof ACTIONS)[number]

/** What the answer may hang on. `madeBy` is the maker of the thing touched; absent for what has no maker yet. */
export interface Facts {
  madeBy?: PersonId | null
  archived?: boolean
}

export type Reason = 'not-a-member' | 'role' | 'another-persons' | 'read-only'
export type Answer = { ok: true } | { ok: false; reason: Reason }

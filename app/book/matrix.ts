import type { Action } from './actions'
import type { Role } from './kinds'

/**
 * Who may what. `own`: only what this person made; for what another made the answer is `another-persons`, which the write
 * path turns into a proposal to the coach.
 */
export type Grant = 'yes' | 'own' | 'no'

const everyone = { driver: 'yes', coach: 'yes', manager: 'yes' } as const
const desk = { driver: 'no', coach: 'yes', manager: 'yes' } as const
const ownForDrivers = { driver: 'own', coach: 'yes', manager: 'yes' } as const
const managers = { driver: 'no', coach: 'no', manager: 'yes' } as const

export const MATRIX: Record<Action, Record<Role, Grant>> = {
  'team.read': everyone,
  'book.read': everyone,
  'book.make': desk,
  'book.rename': desk,
  'book.archive': managers,
  'card.change': everyone,
  'condition.change': desk,
  'mark.add': everyone,
  'mark.change': ownForDrivers,
  'finding.add': everyone,
  'finding.add-for-another': desk,
  'proposal.decide': desk,
  'circuit.read': everyone,
  'circuit.change': desk,
  'landmark.add': everyone,
  'landmark.change': ownForDrivers,
  'car.read': everyone,
  'car.change': desk,
  'edition.read': everyone,
  'edition.publish': desk,
  'notice.raise': everyone,
  'people.manage': managers,
}

/** Actions that change nothing, allowed on an archived book too. */
export const READS: ReadonlySet<Action> = new Set([
  'team.read',
  'book.read',
  'circuit.read',
  'car.read',
  'edition.read',
])

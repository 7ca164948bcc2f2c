import type { BrakeRole, ConditionKind, Ground, Manner, MarkKind, Proof, Role } from '~/book/kinds'

/** The closed vocabularies of a book, in the words of drivers. */

const MARKS: Record<MarkKind, string> = {
  look: 'Look',
  brake: 'Brake',
  lift: 'Lift',
  gear: 'Gear',
  turnin: 'Turn in',
  release: 'Brake off',
  apex: 'Apex',
  throttle: 'Throttle',
  full: 'Full throttle',
  trackout: 'Track out',
}

const BRAKES: Record<BrakeRole, string> = { start: 'Brake first', target: 'Build to' }

/** A mark's kind: "Turn in"; a brake by its role: "Brake first", "Build to"; a gear with its digit: "Gear 3". */
export function markKind(kind: MarkKind, role: BrakeRole | null = null, gear: number | null = null): string {
  if (kind === 'brake' && role) return BRAKES[role]
  if (kind === 'gear' && gear !== null) return `Gear ${gear}`
  return MARKS[kind]
}

const NUMBERS = ['none', 'one', 'two', 'three', 'four', 'five']

/** How many gears a change goes: "down two". */
export const downBy = (downshifts: number): string => `down ${NUMBERS[downshifts] ?? downshifts}`

const PROOF_WORDS: Record<Proof, string> = { told: 'told', seen: 'seen on foot', driven: 'driven' }
export const proofWord = (proof: Proof): string => PROOF_WORDS[proof]

const MANNER_WORDS: Record<Manner, string> = { brush: 'brush', full: 'full', trail: 'trail', squeeze: 'squeeze' }
export const mannerWord = (manner: Manner): string => MANNER_WORDS[manner]

const GROUND_WORDS: Record<Ground, string> = { sim: 'Simulator', real: 'Real track' }
export const groundWord = (ground: Ground): string => GROUND_WORDS[ground]

const CONDITION_WORDS: Record<ConditionKind, string> = {
  dry: 'Dry',
  wet: 'Wet',
  'damp-off-line': 'Damp off line',
  'cold-tyres': 'Cold tyres',
  'worn-tyres': 'Worn tyres',
  'full-fuel': 'Full fuel',
  night: 'Night',
  other: 'Other',
}
export const conditionWord = (kind: ConditionKind): string => CONDITION_WORDS[kind]

const ROLE_WORDS: Record<Role, string> = { manager: 'manager', coach: 'coach', driver: 'driver' }
export const roleWord = (role: Role): string => ROLE_WORDS[role]

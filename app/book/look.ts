import type { ConditionId } from './ids'
import type { BookView, ConditionView, GroundChoice } from './view'

/** The choices of which places are looked at. */
export const GROUND_CHOICES: readonly GroundChoice[] = ['sim', 'real', 'both']

/**
 * How a reader looks at a book: which places, in which condition. What is not asked for, or not known, is both places in the dry.
 * @param asked a condition's id or kind, and a choice of ground
 */
export function lookAt(
  conditions: BookView['conditions'],
  asked: { condition: string | null; show: string | null },
): { show: GroundChoice; condition: ConditionId } {
  const known = conditions.find((one) => one.id === asked.condition || one.kind === asked.condition)
  const condition = known ?? conditions.find((one) => one.kind === 'dry') ?? conditions[0]
  if (!condition) throw new Error('a book without conditions')
  return { show: GROUND_CHOICES.find((choice) => choice === asked.show) ?? 'both', condition: condition.id }
}

/** How an address names a condition: by its kind where no other is of that kind, else by its id. */
export function conditionParam(conditions: readonly ConditionView[], condition: ConditionView): string {
  const alike = conditions.filter((one) => one.kind === condition.kind)
  return alike.length === 1 ? condition.kind : condition.id
}

import type { ConditionView } from './view'

/** How an address names a condition: by its kind where no other is of that kind, else by its id. */
export function conditionParam(conditions: readonly ConditionView[], condition: ConditionView): string {
  const alike = conditions.filter((one) => one.kind === condition.kind)
  return alike.length === 1 ? condition.kind : condition.id
}

/** The condition that an address names; the dry one, else the first, where it names none. Null for a book without any. */
export function conditionFrom(conditions: readonly ConditionView[], param: string | null): ConditionView | null {
  const named = conditions.find((one) => one.id === param || conditionParam(conditions, one) === param)
  return named ?? conditions.find((one) => one.kind === 'dry') ?? conditions[0] ?? null
}

import { Link } from 'react-router'
import type { ConditionId } from '~/book/ids'
import { conditionParam } from '~/book/look'
import type { ConditionView } from '~/book/view'
import { conditionWord } from '~/words/kinds'
import { overviewWords } from '~/words/overview'

interface ConditionSwitchProps {
  conditions: readonly ConditionView[]
  chosen: ConditionId
}

/** Which condition the page speaks of, as links. */
export function ConditionSwitch({ conditions, chosen }: ConditionSwitchProps) {
  if (conditions.length < 2) return null
  return (
    <nav className="seg" aria-label={overviewWords.conditions}>
      {conditions.map((condition) => (
        <Link
          key={condition.id}
          to={`?${new URLSearchParams({ condition: conditionParam(conditions, condition) })}`}
          aria-current={condition.id === chosen ? 'true' : undefined}
          preventScrollReset
        >
          {condition.kind === 'other' ? condition.name : conditionWord(condition.kind)}
        </Link>
      ))}
    </nav>
  )
}

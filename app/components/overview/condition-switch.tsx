import { Link } from 'react-router'
import type { ConditionId } from '~/book/ids'
import type { ConditionView } from '~/book/view'
import { conditionWord } from '~/words/kinds'
import { overviewWords } from '~/words/overview'

interface ConditionSwitchProps {
  conditions: readonly ConditionView[]
  chosen: ConditionId
}

/** Which condition the page speaks of, as links: by its kind where no other is of that kind, else by its id. */
export function ConditionSwitch({ conditions, chosen }: ConditionSwitchProps) {
  if (conditions.length < 2) return null
  const alike = (kind: ConditionView['kind']) => conditions.filter((one) => one.kind === kind).length
  return (
    <nav className="seg" aria-label={overviewWords.conditions}>
      {conditions.map(({ id, kind, name }) => (
        <Link
          key={id}
          to={`?${new URLSearchParams({ condition: alike(kind) === 1 ? kind : id })}`}
          aria-current={id === chosen ? 'true' : undefined}
          preventScrollReset
        >
          {kind === 'other' ? name : conditionWord(kind)}
        </Link>
      ))}
    </nav>
  )
}

import { Link } from 'react-router'
import { cornerState } from '~/book/cuts'
import { GROUND_CHOICES } from '~/book/look'
import type { GroundChoice } from '~/book/view'
import { Icon } from '~/components/ui/icon'
import { conditionWord } from '~/words/kinds'
import { stateWord } from '~/words/overview'
import type { LinkWith } from './corner-page'
import type { CornerPageData } from './page-data'

const SHOWN_WORDS: Record<GroundChoice, string> = { sim: 'Simulator', real: 'Real', both: 'Both' }

/** Number plate and name of the corner, its state, and how it is looked at. */
export function CornerHead({ page, linkWith }: { page: CornerPageData; linkWith: LinkWith }) {
  const { corner, conditions } = page.cut
  return (
    <header className="corner-head">
      <h1 className="name">
        <span className="corner-plate">{corner.number}</span> {corner.name}
      </h1>
      <p className="muted">{stateWord(cornerState(corner, page.condition))}</p>
      <span className="spring" />
      <nav className="seg" aria-label="Condition">
        {conditions.map((condition) => (
          <Link
            key={condition.id}
            to={linkWith({ condition: condition.id, mark: null, add: null })}
            aria-current={condition.id === page.condition}
            preventScrollReset
          >
            {condition.kind === 'other' ? condition.name : conditionWord(condition.kind)}
          </Link>
        ))}
      </nav>
      <nav className="seg" aria-label="Places shown">
        {GROUND_CHOICES.map((choice) => (
          <Link key={choice} to={linkWith({ show: choice })} aria-current={choice === page.show} preventScrollReset>
            {choice === 'both' ? null : <i className={`ground-dot ${choice}`} aria-hidden="true" />}
            {SHOWN_WORDS[choice]}
          </Link>
        ))}
      </nav>
      {page.may.add ? (
        <Link className="btn btn-small" to={linkWith({ add: '1', mark: null })} preventScrollReset>
          <Icon name="plus" /> Add mark
        </Link>
      ) : null}
    </header>
  )
}

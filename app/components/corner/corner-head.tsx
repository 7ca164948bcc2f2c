import { Link } from 'react-router'
import { cornerState } from '~/book/cuts'
import { GROUND_CHOICES } from '~/book/look'
import { Icon } from '~/components/ui/icon'
import { cornerLabels as labels } from '~/words/corner-labels'
import { conditionWord } from '~/words/kinds'
import { stateWord } from '~/words/overview'
import type { LinkWith } from './corner-page'
import type { CornerPageData } from './page-data'

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
      <nav className="seg" aria-label={labels.condition}>
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
      <nav className="seg" aria-label={labels.places}>
        {GROUND_CHOICES.map((choice) => (
          <Link key={choice} to={linkWith({ show: choice })} aria-current={choice === page.show} preventScrollReset>
            {choice === 'both' ? null : <i className={`ground-dot ${choice}`} aria-hidden="true" />}
            {labels.shown[choice]}
          </Link>
        ))}
      </nav>
      {page.may.add ? (
        <Link className="btn btn-small" to={linkWith({ add: '1', mark: null })} preventScrollReset>
          <Icon name="plus" /> {labels.add}
        </Link>
      ) : null}
    </header>
  )
}

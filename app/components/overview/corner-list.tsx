import { href, Link } from 'react-router'
import type { CornerState, OverviewCorner } from '~/book/cuts'
import { NumberPlate } from '~/components/ui/plate'
import { gearFigure, leastSpeedFigure, overviewWords, stateWord, turnLetter } from '~/words/overview'
import { StateMark } from './state-mark'

interface CornerListProps {
  corners: readonly OverviewCorner[]
  team: string
  book: string
  /** Query of the address, kept on the way into a corner: "?condition=wet". */
  search: string
}

/** Every corner of the lap in driving order: what it is, how it is taken, how far the book is with it. A row is one link. */
export function CornerList({ corners, team, book, search }: CornerListProps) {
  return (
    <table className="ruled corner-list">
      <caption className="sr-only">{overviewWords.cornersCaption}</caption>
      <thead>
        <tr>
          <th scope="col">
            <span className="sr-only">{overviewWords.number}</span>
          </th>
          <th scope="col">
            <span className="sr-only">{overviewWords.name}</span>
          </th>
          <th scope="col">
            <span className="sr-only">{overviewWords.direction}</span>
          </th>
          <th scope="col" className="r">
            {overviewWords.gear}
          </th>
          <th scope="col" className="r">
            {overviewWords.speed}
          </th>
          <th scope="col" className="state-head">
            {overviewWords.state}
          </th>
        </tr>
      </thead>
      <tbody>
        {corners.map((corner) => (
          <CornerRow
            key={corner.id}
            corner={corner}
            to={href('/teams/:team/books/:book/corners/:number', { team, book, number: corner.number }) + search}
          />
        ))}
      </tbody>
    </table>
  )
}

function CornerRow({ corner, to }: { corner: OverviewCorner; to: string }) {
  const turn = turnLetter(corner.direction)
  return (
    <tr>
      <td className="plate-cell">
        <NumberPlate number={corner.number} />
      </td>
      <th scope="row">
        <Link to={to} className="row-link">
          <span className="sr-only">{overviewWords.numbered(corner.number)}</span>
          {corner.name}
        </Link>
        <StateWords state={corner.state} className="state-below" />
      </th>
      <td className="muted">
        <span aria-hidden="true">{turn.letter}</span>
        <span className="sr-only">{turn.word}</span>
      </td>
      <td className="r num">{gearFigure(corner.gear)}</td>
      <td className="r num">{leastSpeedFigure(corner)}</td>
      <td className="state-cell">
        <StateWords state={corner.state} />
      </td>
    </tr>
  )
}

const LOOKS: Record<CornerState, string> = {
  empty: 'state-draft',
  inherited: 'state-draft',
  draft: 'state-draft',
  seen: '',
  driven: 'state-checked',
}

function StateWords({ state, className = '' }: { state: CornerState; className?: string }) {
  return (
    <span className={`state ${LOOKS[state]} ${className}`}>
      <StateMark state={state} />
      {stateWord(state)}
    </span>
  )
}

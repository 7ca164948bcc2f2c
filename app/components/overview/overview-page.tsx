import { href } from 'react-router'
import { ButtonLink } from '~/components/ui/button'
import { Empty } from '~/components/ui/empty'
import { statesInSum, overviewWords as words } from '~/words/overview'
import { ChangeList } from './change-list'
import { ConditionSwitch } from './condition-switch'
import { CornerList } from './corner-list'
import { LapSheet } from './lap-sheet'
import { MissingList } from './missing-list'
import type { OverviewData } from './overview-data'
import './overview.css'

/** A book at a glance: the circuit and its heights; beside it the corners, what is missing, what changed. */
export function OverviewPage({ page }: { page: OverviewData }) {
  const { overview, team, search, missing, changes } = page
  const { corners, book } = overview
  const empty = corners.every((corner) => corner.marks === 0)
  return (
    <main className="overview">
      <LapSheet overview={overview} team={team} search={search} sheet={page.sheet} />
      <div className="overview-side">
        {empty ? <EmptyBook page={page} /> : null}
        <section aria-labelledby="corners-head">
          <div className="side-head">
            <h1 className="h2" id="corners-head">
              <span className="sr-only">{`${book.name}: `}</span>
              {words.corners}
            </h1>
            <ConditionSwitch conditions={page.conditions} chosen={page.condition} />
          </div>
          {empty ? null : <p className="muted sm">{statesInSum(corners.map((corner) => corner.state))}</p>}
          <CornerList corners={corners} team={team} book={book.slug} search={search} />
        </section>
        {empty ? null : <MissingList missing={missing} team={team} book={book.slug} search={search} />}
        <ChangeList changes={changes} />
      </div>
    </main>
  )
}

/** What a book without a mark says: what to do first. */
function EmptyBook({ page: { overview, team, search, may } }: { page: OverviewData }) {
  const first = overview.corners[0]
  const to =
    first &&
    href('/teams/:team/books/:book/corners/:number', { team, book: overview.book.slug, number: first.number }) + search
  return (
    <Empty lead={words.emptyLead} question={may.addMarks ? words.emptyQuestion : words.emptyReader}>
      {may.addMarks && first && to ? (
        <ButtonLink look="go" to={to}>
          {words.begin(first.number, first.name)}
        </ButtonLink>
      ) : null}
    </Empty>
  )
}

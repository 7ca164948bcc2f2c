import { href, Link } from 'react-router'
import { Icon } from '~/components/ui/icon'
import type { Metres } from '~/track/units'
import { circuitWords as words } from '~/words/circuits'
import { count, formatKilometres } from '~/words/measures'
import { CircuitOutline } from './outline'

export interface CircuitLine {
  slug: string
  name: string
  layout: { id: string; name: string; length: Metres }
  /** Metres east and north by turns. */
  outline: readonly number[]
  corners: number
  books: number
}

/** The circuits of a team, one line for each layout. */
export function CircuitList({ team, circuits }: { team: string; circuits: readonly CircuitLine[] }) {
  return (
    <ul className="border-t border-rule-strong">
      {circuits.map(({ slug, name, layout, outline, corners, books }) => (
        <li key={layout.id} className="border-b border-rule">
          <Link
            to={href('/teams/:team/circuits/:circuit', { team, circuit: slug })}
            className="flex items-center gap-5 py-2 no-underline hover:bg-orange-tint"
          >
            <CircuitOutline name={name} outline={outline} />
            <span className="min-w-0">
              <span className="h3 block wrap-anywhere">{name}</span>
              <span className="muted block">{layout.name}</span>
              <span className="muted block">
                {formatKilometres(layout.length)}, {count(corners, 'corner')}, {count(books, 'book')}
              </span>
            </span>
            <span className="spring" />
            <Icon name="right" />
          </Link>
        </li>
      ))}
    </ul>
  )
}

/** The ways to the pages of the list before and after this one, where there are any. */
export function CircuitPages({ page, goesOn }: { page: number; goesOn: boolean }) {
  if (page === 1 && !goesOn) return null
  return (
    <nav className="flex justify-between gap-4 pt-3" aria-label={words.pages}>
      {page > 1 && (
        <Link className={PAGE_LINK} to={`?page=${page - 1}`} rel="prev">
          {words.pageBefore}
        </Link>
      )}
      <span className="spring" />
      {goesOn && (
        <Link className={PAGE_LINK} to={`?page=${page + 1}`} rel="next">
          {words.pageAfter}
        </Link>
      )}
    </nav>
  )
}

const PAGE_LINK = 'inline-flex items-center underline max-[799px]:min-h-11'

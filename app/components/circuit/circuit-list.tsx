import { href, Link } from 'react-router'
import type { GeometryHash } from '~/book/ids'
import { Icon } from '~/components/ui/icon'
import type { Metres } from '~/track/units'
import { count, formatKilometres } from '~/words/measures'
import { CircuitOutline } from './outline'

export interface CircuitLine {
  slug: string
  name: string
  layout: { id: string; name: string; length: Metres; centreline: GeometryHash }
  corners: number
  books: number
}

/** The circuits of a team, one line for each layout. */
export function CircuitList({ team, circuits }: { team: string; circuits: readonly CircuitLine[] }) {
  return (
    <ul className="border-t border-rule-strong">
      {circuits.map(({ slug, name, layout, corners, books }) => (
        <li key={layout.id} className="border-b border-rule">
          <Link
            to={href('/teams/:team/circuits/:circuit', { team, circuit: slug })}
            className="flex items-center gap-5 py-2 no-underline hover:bg-orange-tint"
          >
            <CircuitOutline team={team} name={name} centreline={layout.centreline} />
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

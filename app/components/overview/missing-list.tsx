import { href, Link } from 'react-router'
import type { Missing } from '~/book/missing'
import { NumberPlate } from '~/components/ui/plate'
import { gapWords, overviewWords } from '~/words/overview'

interface MissingListProps {
  missing: readonly Missing[]
  team: string
  book: string
  search: string
}

/** What the book lacks before it can be driven by, corner by corner. */
export function MissingList({ missing, team, book, search }: MissingListProps) {
  if (missing.length === 0) return null
  return (
    <section className="side-part" aria-labelledby="missing-head">
      <h2 className="h2" id="missing-head">
        {overviewWords.missing}
      </h2>
      {missing.map(({ gap, corners }) => (
        <div key={gap} className="gap">
          <p>{gapWords(gap, corners.length)}</p>
          <ul>
            {corners.map(({ number, name }) => (
              <li key={number}>
                <Link to={href('/teams/:team/books/:book/corners/:number', { team, book, number }) + search}>
                  <NumberPlate number={number} />
                  {name}
                </Link>
              </li>
            ))}
          </ul>
        </div>
      ))}
    </section>
  )
}

import { href, Link } from 'react-router'
import { Icon } from '~/components/ui/icon'
import type { Metres } from '~/track/units'
import { bookWords as words } from '~/words/books'

export interface BookLine {
  slug: string
  name: string
  archived: boolean
  layout: { name: string; length: Metres }
  car: string
  corners: number
  marks: number
  /** When it was changed last, in words. */
  changed: string
}

/** A team's books with what is in them. */
export function BookList({ team, books }: { team: string; books: readonly BookLine[] }) {
  return (
    <ul className="border-t border-rule-strong">
      {books.map((book) => (
        <li key={book.slug} className="border-b border-rule">
          <Link
            to={href('/teams/:team/books/:book', { team, book: book.slug })}
            className="flex items-center gap-4 py-2.5 no-underline hover:bg-orange-tint"
          >
            <span className="grid min-w-0 flex-1 gap-x-6 min-[800px]:grid-cols-[minmax(0,1.2fr)_minmax(0,1fr)]">
              <span className="min-w-0">
                <span className="h3 block wrap-anywhere">
                  {book.name}
                  {book.archived && <span className="muted font-normal"> {words.archived}</span>}
                </span>
                <span className="muted block">{words.entry(book.layout.name, book.layout.length, book.car)}</span>
              </span>
              <span className="min-w-0">
                <span className="block">{words.state(book.corners, book.marks)}</span>
                <span className="muted block">{words.changed(book.changed)}</span>
              </span>
            </span>
            <Icon name="right" />
          </Link>
        </li>
      ))}
    </ul>
  )
}

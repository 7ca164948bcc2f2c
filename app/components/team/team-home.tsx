import type { ReactNode } from 'react'
import { href, Link } from 'react-router'
import { type BookLine, BookList } from '~/components/book/book-list'
import { type CircuitLine, CircuitList } from '~/components/circuit/circuit-list'
import { PageBody, PageHead } from '~/components/frame/page-frame'
import { type ChangeLine, ChangeList } from '~/components/overview/change-list'
import '~/components/overview/overview.css'
import { ButtonLink } from '~/components/ui/button'
import { Empty } from '~/components/ui/empty'
import { teamWords as words } from '~/words/team'

/** A team's first page, as it is given it. */
export interface TeamHomeData {
  team: { slug: string; name: string }
  books: readonly BookLine[]
  circuits: readonly CircuitLine[]
  /** Of the book changed last. */
  changes: { book: string; slug: string; lines: readonly ChangeLine[] } | null
  may: { makeBook: boolean; bringIn: boolean }
}

/** What the team has: its books, the roads they are drawn on, and what was changed last. */
export function TeamHome({ team, books, circuits, changes, may }: TeamHomeData) {
  const at = { team: team.slug }
  return (
    <PageBody>
      <PageHead title={team.name} />
      <div className="grid gap-x-14 gap-y-9 min-[1000px]:grid-cols-[minmax(0,1fr)_380px]">
        <div className="grid content-start gap-9">
          <Section title={words.books} link={{ to: href('/teams/:team/books', at), label: words.allBooks }}>
            {books.length > 0 && <BookList team={team.slug} books={books} />}
            {books.length === 0 && circuits.length > 0 && (
              <Empty lead={words.noBook} question={words.noBookQuestion}>
                <Begin may={may.makeBook} to={href('/teams/:team/books/new', at)} label={words.newBook} />
              </Empty>
            )}
            {books.length === 0 && circuits.length === 0 && (
              <Empty lead={words.noCircuit} question={words.noCircuitQuestion}>
                <Begin may={may.bringIn} to={href('/teams/:team/circuits/import', at)} label={words.bringIn} />
              </Empty>
            )}
          </Section>
          {circuits.length > 0 && (
            <Section title={words.circuits} link={{ to: href('/teams/:team/circuits', at), label: words.allCircuits }}>
              <CircuitList team={team.slug} circuits={circuits} />
            </Section>
          )}
        </div>
        {changes && changes.lines.length > 0 && (
          <div>
            <ChangeList changes={changes.lines} />
            <p className="pt-3">
              <Link
                className="inline-flex items-center underline max-[799px]:min-h-11"
                to={href('/teams/:team/books/:book', { ...at, book: changes.slug })}
              >
                {words.inBook(changes.book)}
              </Link>
            </p>
          </div>
        )}
      </div>
    </PageBody>
  )
}

function Section({
  title,
  link,
  children,
}: {
  title: string
  link: { to: string; label: string }
  children: ReactNode
}) {
  return (
    <section>
      <div className="flex items-baseline justify-between gap-4 pb-1.5">
        <h2 className="h2">{title}</h2>
        <Link className="sm inline-flex items-center underline max-[799px]:min-h-11" to={link.to}>
          {link.label}
        </Link>
      </div>
      {children}
    </section>
  )
}

/** The first thing to do, for who may do it. */
function Begin({ may, to, label }: { may: boolean; to: string; label: string }) {
  if (!may) return <p className="muted">{words.deskOnly}</p>
  return (
    <ButtonLink look="go" to={to}>
      {label}
    </ButtonLink>
  )
}

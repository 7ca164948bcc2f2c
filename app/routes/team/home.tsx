import type { RouterContextProvider } from 'react-router'
import { may } from '~/book/may'
import { bookLines } from '~/components/book/book-lines'
import { changeLines } from '~/components/overview/change-lines'
import { TeamHome, type TeamHomeData } from '~/components/team/team-home'
import { readBook } from '~/db/read-book.server'
import { type BookEntry, readBooks } from '~/db/read-books.server'
import { readChanges } from '~/db/read-changes.server'
import { readCircuits } from '~/db/read-circuits.server'
import { readNames } from '~/db/read-team.server'
import { dbContext } from '~/middleware/context'
import { allow } from '~/middleware/refusal.server'
import { teamContext } from '~/middleware/team.server'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/home'

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: pageTitle(loaderData?.team.name ?? '') }]

export async function loader({ context }: Route.LoaderArgs): Promise<TeamHomeData> {
  const { actor, team } = context.get(teamContext)
  allow(actor, 'team.read')
  const db = context.get(dbContext)
  const [books, circuits] = await Promise.all([readBooks(db, actor), readCircuits(db, actor)])
  return {
    team: { slug: team.slug, name: team.name },
    books: bookLines(books, new Date().toISOString()),
    circuits: circuits.entries,
    changes: await latestChanges(context, books),
    may: { makeBook: may(actor, 'book.make').ok, bringIn: may(actor, 'circuit.change').ok },
  }
}

/** Lines of the log that are looked through, and how many of them the page tells. */
const LOOKED_THROUGH = 60
const TOLD = 8

/** The latest changes of the book that was changed last. */
async function latestChanges(
  context: Readonly<RouterContextProvider>,
  books: readonly BookEntry[],
): Promise<TeamHomeData['changes']> {
  const { actor } = context.get(teamContext)
  const db = context.get(dbContext)
  const latest = books.reduce<BookEntry | null>((a, b) => (a && a.changedAt >= b.changedAt ? a : b), null)
  const view = latest && (await readBook(db, actor, latest.slug))
  if (!view) return null
  const [ofBook, ofLayout, names] = await Promise.all([
    readChanges(db, actor, { book: view.book.id, limit: LOOKED_THROUGH }),
    readChanges(db, actor, { layout: view.layout.id, limit: LOOKED_THROUGH }),
    readNames(db, actor),
  ])
  const logs = [ofBook, ofLayout].map((changes) => ({ changes, goesOn: changes.length === LOOKED_THROUGH }))
  return { book: view.book.name, slug: view.book.slug, lines: changeLines(logs, view, names, TOLD) }
}

export default function Home({ loaderData }: Route.ComponentProps) {
  return <TeamHome {...loaderData} />
}

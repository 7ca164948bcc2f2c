import { href } from 'react-router'
import { may } from '~/book/may'
import { bookLines } from '~/components/book/book-lines'
import { BookList } from '~/components/book/book-list'
import { PageBody, PageHead } from '~/components/frame/page-frame'
import { ButtonLink } from '~/components/ui/button'
import { Empty } from '~/components/ui/empty'
import { readBooks } from '~/db/read-books.server'
import { dbContext } from '~/middleware/context'
import { allow } from '~/middleware/refusal.server'
import { teamContext } from '~/middleware/team.server'
import { bookWords as words } from '~/words/books'
import { teamWords } from '~/words/team'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/books'

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: pageTitle(words.title, loaderData?.team ?? '') }]

export async function loader({ context }: Route.LoaderArgs) {
  const { actor, team } = context.get(teamContext)
  allow(actor, 'book.read')
  const books = await readBooks(context.get(dbContext), actor)
  return {
    team: team.name,
    mayMake: may(actor, 'book.make').ok,
    books: bookLines(books, new Date().toISOString()),
  }
}

export default function Books({ loaderData: { books, mayMake }, params }: Route.ComponentProps) {
  const make = mayMake && (
    <ButtonLink look={books.length === 0 ? 'go' : 'plain'} to={href('/teams/:team/books/new', params)}>
      {words.make}
    </ButtonLink>
  )
  return (
    <PageBody>
      <PageHead title={words.title} lead={words.lead}>
        {books.length > 0 && make}
      </PageHead>
      {books.length === 0 ? (
        <Empty lead={words.none} question={words.noneQuestion}>
          {make || <p className="muted">{teamWords.deskOnly}</p>}
        </Empty>
      ) : (
        <BookList team={params.team} books={books} />
      )}
    </PageBody>
  )
}

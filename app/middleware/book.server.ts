import { createContext, type MiddlewareFunction } from 'react-router'
import type { BookView } from '~/book/view'
import { readBook } from '~/db/read-book.server'
import { dbContext } from './context'
import { allow, refusal } from './refusal.server'
import { teamContext } from './team.server'

/** The working book that a request asks for. */
export const bookContext = createContext<BookView>()

/** Reads the book of `params.book` once for all loaders and the action of the request. */
export const book: MiddlewareFunction<Response> = async ({ params, context }) => {
  const { actor } = context.get(teamContext)
  allow(actor, 'book.read')
  const view = await readBook(context.get(dbContext), actor, params.book ?? '')
  if (!view) throw refusal('not-found')
  context.set(bookContext, view)
}

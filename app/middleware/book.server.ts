import { createContext, type MiddlewareFunction, type RouterContextProvider } from 'react-router'
import type { BookView } from '~/book/view'
import { readBook } from '~/db/read-book.server'
import { dbContext } from './context'
import { allow, refusal } from './refusal.server'
import { teamContext } from './team.server'

/** The working book that a request asks for. */
export const bookContext = createContext<BookView>()

/** Reads the book of `params.book` once for all loaders and the action of the request. */
export const book: MiddlewareFunction<Response> = ({ params, context }) => readBookFor(context, params.book)

/**
 * Reads the book for what comes later in the request. An action that changed it calls this again: without JavaScript the page
 * is drawn in the same request.
 */
export async function readBookFor(context: Readonly<RouterContextProvider>, slug: string | undefined): Promise<void> {
  const { actor } = context.get(teamContext)
  allow(actor, 'book.read')
  const view = await readBook(context.get(dbContext), actor, slug ?? '')
  if (!view) throw refusal('not-found')
  context.set(bookContext, view)
}

import { applyOperation } from '~/db/apply.server'
import { bookContext } from '~/middleware/book.server'
import { dbContext } from '~/middleware/context'
import { refusal } from '~/middleware/refusal.server'
import { teamContext } from '~/middleware/team.server'
import type { Route } from './+types/operations'

/** One operation on this book, as JSON; answers with its outcome. Safe to repeat. */
export async function action({ request, context }: Route.ActionArgs) {
  const { actor } = context.get(teamContext)
  const view = context.get(bookContext)
  const operation = await readJson(request)
  if (operation?.scope?.id !== view.book.id) throw refusal('not-found')
  return Response.json(await applyOperation(context.get(dbContext), actor, operation))
}

async function readJson(request: Request): Promise<{ scope?: { id?: unknown } } | null> {
  try {
    return await request.json()
  } catch {
    return null
  }
}

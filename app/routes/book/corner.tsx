import { parseWithZod } from '@conform-to/zod/v4'
import { data, type ShouldRevalidateFunctionArgs } from 'react-router'
import { v7 } from 'uuid'
import type { Actor } from '~/book/actions'
import { type CornerCut, cornerOf } from '~/book/cuts'
import type { OperationId } from '~/book/ids'
import { operationOf } from '~/book/intents'
import { lookAt } from '~/book/look'
import { CornerPage } from '~/components/corner/corner-page'
import { type CornerIntent, cornerForm } from '~/components/corner/mark-forms'
import { askedBy, markIntent } from '~/components/corner/mark-intent'
import { changeData, cornerPageData, proposalData } from '~/components/corner/page-data'
import { type CornerResult, intentResult, plainResult } from '~/components/corner/result'
import { isSent, opensOnly } from '~/components/frame/revalidation'
import { applyOperation } from '~/db/apply.server'
import type { Db } from '~/db/database'
import { decideProposal, listProposals } from '~/db/proposals.server'
import { readChanges } from '~/db/read-changes.server'
import { readNames } from '~/db/read-team.server'
import { undoOperation } from '~/db/undo.server'
import { bookContext, readBookFor } from '~/middleware/book.server'
import { dbContext } from '~/middleware/context'
import { layOutGeometry } from '~/middleware/lay-out-geometry.server'
import { readForm } from '~/middleware/read-form.server'
import { refusal } from '~/middleware/refusal.server'
import { sheetWidth } from '~/middleware/sheet-width.server'
import { teamContext } from '~/middleware/team.server'
import { makeLapFrame } from '~/track/lap-frame'
import { along } from '~/track/units'
import { corner as words } from '~/words/corner'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/corner'

export const meta: Route.MetaFunction = ({ loaderData }) => {
  if (!loaderData) return []
  const { corner, book } = loaderData.cut
  return [{ title: pageTitle(`${corner.number} ${corner.name}`, book.name) }]
}

export async function loader({ request, context, params, url }: Route.LoaderArgs) {
  const view = context.get(bookContext)
  const cut = cornerOf(view, params.number)
  if (!cut) throw refusal('not-found')
  const db = context.get(dbContext)
  const { actor, team } = context.get(teamContext)
  const scope = { kind: 'book', id: view.book.id } as const
  const [frame, names, changes, proposals] = await Promise.all([
    layOutGeometry(context, actor, view.layout),
    readNames(db, actor),
    readChanges(db, actor, { book: view.book.id, card: cut.corner.card.id, limit: 12 }),
    listProposals(db, actor, scope, cut.corner.card.id),
  ])
  return cornerPageData({
    team: team.slug,
    cut,
    actor,
    frame,
    names: Object.fromEntries(names),
    changes: changeData(actor, view, changes),
    proposals: proposalData(view, proposals),
    ...lookAt(view.conditions, {
      condition: url.searchParams.get('condition'),
      show: url.searchParams.get('show'),
    }),
    ids: { operation: v7(), mark: v7() },
    sheet: sheetWidth(request),
  })
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const cut = cornerOf(context.get(bookContext), params.number)
  if (!cut) throw refusal('not-found')
  const form = await readForm(request)
  const submission = parseWithZod(form, { schema: cornerForm })
  if (submission.status !== 'success') return data({ result: null, lastResult: submission.reply() }, 400)
  const sent = Object.fromEntries([...form].map(([name, value]) => [name, String(value)]))
  const { actor } = context.get(teamContext)
  const result = await perform(context.get(dbContext), actor, cut, submission.value, sent)
  await readBookFor(context, params.book)
  return data({ result, lastResult: null }, STATUS[result.kind])
}

const STATUS: Record<CornerResult['kind'], number> = { done: 200, refused: 403, conflict: 409 }

async function perform(
  db: Db,
  actor: Extract<Actor, { kind: 'person' }>,
  cut: CornerCut,
  form: CornerIntent,
  sent: Record<string, string>,
): Promise<CornerResult> {
  const scope = { kind: 'book', id: cut.book.id } as const
  if (form.intent === 'undo') {
    const outcome = await undoOperation(db, actor, scope, form.change as OperationId)
    return plainResult(outcome, words.undone, words.undoConflict)
  }
  if (form.intent === 'decide') {
    const outcome = await decideProposal(db, actor, form.proposal as OperationId, form.verdict)
    return plainResult(outcome, form.verdict === 'accept' ? words.accepted : words.declined, words.undoConflict)
  }
  const { length, startAlong, reversed } = cut.layout
  const frame = makeLapFrame({ length, startAlong: along(startAlong), reversed })
  const intent = markIntent(form, actor.person)
  const making = { id: form.operation as OperationId, madeAt: new Date().toISOString(), scope }
  const operation = intent && operationOf(intent, making, cut.corner, frame)
  const outcome = operation ? await applyOperation(db, actor, operation) : ({ kind: 'nothing', rev: 0 } as const)
  return intentResult(cut, askedBy(form), operation, outcome, sent)
}

/** Opening a form or a mark asks the server nothing. */
export const shouldRevalidate = (args: ShouldRevalidateFunctionArgs) =>
  isSent(args) || (!opensOnly(args, ['show', 'condition']) && args.defaultShouldRevalidate)

export default function Corner({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <CornerPage page={loaderData} result={actionData?.result ?? null} lastResult={actionData?.lastResult ?? null} />
  )
}

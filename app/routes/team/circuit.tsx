import { data, type ShouldRevalidateFunctionArgs } from 'react-router'
import { v7 } from 'uuid'
import type { OperationId } from '~/book/ids'
import { may } from '~/book/may'
import { changeAnswer, type LayoutAnswer, undoAnswer, wrongAnswer } from '~/components/circuit/layout-answer'
import { type LayoutAsk, layoutAsk } from '~/components/circuit/layout-ask'
import type { LayoutPageData } from '~/components/circuit/layout-data'
import { LayoutPage } from '~/components/circuit/layout-page'
import { drivenCorners, layoutChanges } from '~/components/circuit/layout-view'
import { isSent } from '~/components/frame/revalidation'
import { applyBatch } from '~/db/apply.server'
import { readBooks } from '~/db/read-books.server'
import { readChanges } from '~/db/read-changes.server'
import { readCircuit } from '~/db/read-circuits.server'
import { readNames } from '~/db/read-team.server'
import { undoBatch, undoOperation } from '~/db/undo.server'
import { dbContext } from '~/middleware/context'
import { layOutGeometry } from '~/middleware/lay-out-geometry.server'
import { readForm } from '~/middleware/read-form.server'
import { allow, refusal } from '~/middleware/refusal.server'
import { sheetWidth } from '~/middleware/sheet-width.server'
import { teamContext } from '~/middleware/team.server'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/circuit'

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: pageTitle(loaderData?.circuit.name ?? '') }]

/** Lines of the log that are looked through for what is worth telling. */
const LOOKED_THROUGH = 60

/** The circuit of the address with its corners as they are driven. */
async function layoutOf({ params, context }: Pick<Route.LoaderArgs, 'params' | 'context'>) {
  const { actor, team } = context.get(teamContext)
  allow(actor, 'circuit.read')
  const db = context.get(dbContext)
  const found = await readCircuit(db, actor, params.circuit)
  if (!found) throw refusal('not-found')
  const frame = await layOutGeometry(context, actor, found.layout)
  return { ...found, db, actor, team, frame, driven: drivenCorners(found.corners, frame) }
}

type Shown = Awaited<ReturnType<typeof layoutOf>>

export async function loader(args: Route.LoaderArgs): Promise<LayoutPageData> {
  const { circuit, layout, db, actor, team, driven } = await layoutOf(args)
  const [books, changes, names] = await Promise.all([
    readBooks(db, actor),
    readChanges(db, actor, { layout: layout.id, limit: LOOKED_THROUGH }),
    readNames(db, actor),
  ])
  const { id, name, rev, roadWidth, startAlong, reversed, centreline, ground } = layout
  const clock = { now: new Date().toISOString(), timeZone: circuit.timeZone }
  return {
    team: team.slug,
    circuit: { slug: circuit.slug, name: circuit.name, timeZone: circuit.timeZone },
    layout: { id, name, rev, roadWidth, startAlong, reversed, centreline, ground },
    corners: driven,
    books: books.filter((book) => book.layout.id === id).map(({ slug, name }) => ({ slug, name })),
    changes: layoutChanges(changes, driven, names, clock),
    may: { change: may(actor, 'circuit.change').ok, makeBook: may(actor, 'book.make').ok },
    sheet: sheetWidth(args.request),
  }
}

export async function action(args: Route.ActionArgs) {
  const shown = await layoutOf(args)
  allow(shown.actor, 'circuit.change')
  const clock = { madeAt: new Date().toISOString(), newId: () => v7() as OperationId }
  const ask = layoutAsk(await readForm(args.request), { ...shown, corners: shown.driven }, clock)
  const { status, sent } = await answerOf(ask, args, shown)
  return data({ ...sent, id: v7() }, { status })
}

async function answerOf(
  ask: LayoutAsk,
  args: Route.ActionArgs,
  { db, actor, layout, driven }: Shown,
): Promise<LayoutAnswer> {
  if (ask.kind === 'wrong') return wrongAnswer(ask, driven)
  if (ask.kind === 'change') {
    const applied = await applyBatch(db, actor, ask.operations)
    // Read again, since what another made of it meanwhile stands beside what was typed.
    return changeAnswer(ask, applied, (await layoutOf(args)).driven)
  }
  if (ask.operation) {
    return undoAnswer(await undoOperation(db, actor, { kind: 'layout', id: layout.id }, ask.operation))
  }
  const undone = ask.batch === null ? null : await undoBatch(db, actor, ask.batch)
  if (!undone) throw refusal('form')
  return undoAnswer(undone.kind === 'stopped' ? undone.outcome : undone)
}

/** Also where the form was not taken: what another made of the layout meanwhile stands beside what was typed. */
export const shouldRevalidate = (args: ShouldRevalidateFunctionArgs) => isSent(args) || args.defaultShouldRevalidate

export default function Circuit({ loaderData, actionData }: Route.ComponentProps) {
  return <LayoutPage page={loaderData} sent={actionData ?? null} />
}

import { parseWithZod } from '@conform-to/zod/v4'
import { data, href, redirect } from 'react-router'
import { v7 } from 'uuid'
import type { CircuitId, CornerId, LayoutId } from '~/book/ids'
import type { Json } from '~/book/operation'
import { pageOf } from '~/components/circuit/import-data'
import { ImportPage } from '~/components/circuit/import-page'
import { stepOf, stepSchemas } from '~/components/circuit/import-schema'
import { afterStep, circuitOf, type StepValue, typedIn } from '~/components/circuit/import-steps'
import { PageBody, PageHead } from '~/components/frame/page-frame'
import { importCircuit } from '~/db/circuits.server'
import { dropImport, readImport, setImportOptions } from '~/db/imports.server'
import { dbContext } from '~/middleware/context'
import { readForm } from '~/middleware/read-form.server'
import { allow, refusal, refusalOf } from '~/middleware/refusal.server'
import { sheetWidth } from '~/middleware/sheet-width.server'
import { teamContext } from '~/middleware/team.server'
import { choicesFrom } from '~/track/import-choices-schema'
import { readDraft } from '~/track/layout-draft'
import { metres } from '~/track/units'
import { importWords as words } from '~/words/import'
import { problem } from '~/words/problems'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/import-draft'

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: pageTitle(words.title, loaderData?.team ?? '') }]

/** The draft of the address, read as its uploader chose; to anyone else it is not there. */
async function draftOf({ params, context }: Pick<Route.LoaderArgs, 'params' | 'context'>) {
  const { actor, team } = context.get(teamContext)
  allow(actor, 'circuit.change')
  const db = context.get(dbContext)
  const kept = /^[0-9a-f-]{36}$/.test(params.draft) ? await readImport(db, actor, params.draft) : null
  if (!kept) throw refusal('not-found')
  const choices = choicesFrom(kept.options)
  return { db, actor, team, kept, choices, draft: readDraft(kept.bytes, kept.fileName, choices) }
}

export async function loader(args: Route.LoaderArgs) {
  const { team, kept, choices, draft } = await draftOf(args)
  return { team: team.name, fileName: kept.fileName, page: pageOf(draft, choices, sheetWidth(args.request)) }
}

/** Takes one step. What was typed for the others is kept with it. */
export async function action(args: Route.ActionArgs) {
  const { db, actor, kept, choices: before, draft } = await draftOf(args)
  const { params } = args
  const formData = await readForm(args.request)
  const step = stepOf(formData.get('intent'))
  if (step === 'cancel') {
    await dropImport(db, actor, kept.id)
    return redirect(href('/teams/:team/circuits', params))
  }
  const schema = stepSchemas(draft.ok ? draft.frame.length : metres(0))[step]
  const submission = parseWithZod(formData, { schema })
  const choices = { ...before, typed: typedIn(submission.payload, draft) }
  if (submission.status !== 'success') {
    await setImportOptions(db, actor, kept.id, choices as unknown as Json)
    const { status, title, text } = problem('form')
    return data(submission.reply(step === 'save' ? { formErrors: [title, text], fieldErrors: {} } : {}), { status })
  }
  const taken = { step, value: submission.value } as StepValue
  if (taken.step !== 'save') {
    await setImportOptions(db, actor, kept.id, afterStep(choices, draft, taken) as unknown as Json)
    return redirect(href('/teams/:team/circuits/import/:draft', params))
  }
  if (!draft.ok) throw refusal('form')
  const ids = { circuit: v7() as CircuitId, layout: v7() as LayoutId, corner: () => v7() as CornerId }
  const outcome = await importCircuit(db, actor, circuitOf(taken.value, draft, choices, ids))
  if (outcome.kind !== 'made') throw refusalOf(outcome)
  await dropImport(db, actor, kept.id)
  return redirect(href('/teams/:team/circuits/:circuit', { ...params, circuit: outcome.slug }))
}

export default function ImportDraft({ loaderData: { fileName, page }, actionData }: Route.ComponentProps) {
  return (
    <PageBody>
      <PageHead title={page.read ? words.check : words.title} lead={words.draft(fileName)} />
      <ImportPage key={page.version} page={page} lastResult={actionData} />
    </PageBody>
  )
}

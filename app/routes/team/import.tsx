import { parseWithZod } from '@conform-to/zod/v4'
import { data, href, redirect } from 'react-router'
import { v7 } from 'uuid'
import type { Json } from '~/book/operation'
import { UploadForm } from '~/components/circuit/upload-form'
import { uploadSchema } from '~/components/circuit/upload-schema'
import { PageBody, PageHead } from '~/components/frame/page-frame'
import { putImport } from '~/db/imports.server'
import { dbContext } from '~/middleware/context'
import { allow, refusalOf } from '~/middleware/refusal.server'
import { teamContext } from '~/middleware/team.server'
import { readUpload } from '~/middleware/upload.server'
import { firstChoices } from '~/track/import-choices'
import { readLayout } from '~/track/read-layout'
import { importWords as words } from '~/words/import'
import { problem } from '~/words/problems'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/import'

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: pageTitle(words.title, loaderData?.team ?? '') }]

export function loader({ context }: Route.LoaderArgs) {
  const { actor, team } = context.get(teamContext)
  allow(actor, 'circuit.change')
  return { team: team.name }
}

/** Keeps a file that can be read, or could with a remedy; one that cannot is told so and not kept. */
export async function action({ request, params, context }: Route.ActionArgs) {
  const { actor } = context.get(teamContext)
  allow(actor, 'circuit.change')
  const formData = await readUpload(request)
  const submission = parseWithZod(formData ?? new FormData(), { schema: uploadSchema })
  if (!formData) {
    const { status, title, text } = problem('broken-upload')
    return data(submission.reply({ formErrors: [title, text], fieldErrors: {} }), { status })
  }
  if (submission.status !== 'success') return data(submission.reply(), { status: problem('form').status })
  const { file, name } = submission.value
  const bytes = new Uint8Array(await file.arrayBuffer())
  const reading = readLayout(bytes, file.name)
  if (!reading.ok && !reading.problems.every(({ remedy }) => remedy)) {
    const fieldErrors = { file: reading.problems.map(({ message }) => message) }
    return data(submission.reply({ fieldErrors }), { status: problem('unreadable-file').status })
  }
  const id = v7()
  const options = firstChoices(name ?? (reading.ok ? reading.layout.name : undefined)) as unknown as Json
  const kept = await putImport(context.get(dbContext), actor, { id, fileName: file.name, bytes, options })
  if (kept.kind !== 'kept') throw refusalOf(kept)
  return redirect(href('/teams/:team/circuits/import/:draft', { ...params, draft: id }))
}

export default function Import({ actionData, params }: Route.ComponentProps) {
  return (
    <PageBody width="form">
      <PageHead title={words.title} lead={words.lead} />
      <UploadForm lastResult={actionData} listPath={href('/teams/:team/circuits', params)} />
    </PageBody>
  )
}

import { parseWithZod } from '@conform-to/zod/v4'
import { data, href, redirect } from 'react-router'
import { nextPath } from '~/auth/next-path'
import { signIn } from '~/auth/sign-in.server'
import { OutsideFrame } from '~/components/frame/outside-frame'
import { signInSchema } from '~/components/sign-in/schema'
import { SignInForm } from '~/components/sign-in/sign-in-form'
import { clientAddressContext } from '~/middleware/context'
import { personContext } from '~/middleware/person.server'
import { readForm } from '~/middleware/read-form.server'
import { problem } from '~/words/problems'
import { signInWords } from '~/words/sign-in'
import { pageTitle } from '~/words/titles'
import type { Route } from './+types/sign-in'

export const meta = () => [{ title: pageTitle(signInWords.title) }]

export function loader({ url, context }: Route.LoaderArgs) {
  const next = nextPath(url.searchParams.get('next'), href('/teams'))
  if (context.get(personContext)) throw redirect(next)
  return { next }
}

export async function action({ request, context }: Route.ActionArgs) {
  const submission = parseWithZod(await readForm(request), { schema: signInSchema })
  if (submission.status !== 'success') {
    return data(submission.reply({ hideFields: ['password'] }), { status: problem('form').status })
  }
  const { email, password, next } = submission.value
  const result = await signIn(request, { email, password, clientAddress: context.get(clientAddressContext) })
  if (!result.ok) {
    const { status, title, text } = problem(result.code, result)
    const reply = submission.reply({ formErrors: [title, text], hideFields: ['password'] })
    return data(reply, { status })
  }
  return redirect(nextPath(next ?? null, href('/teams')), { headers: { 'Set-Cookie': result.setCookie } })
}

export default function SignInPage({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <OutsideFrame>
      <main className="mx-auto w-full max-w-[366px] px-4 pt-6 pb-11">
        <SignInForm heading="h1" lastResult={actionData} next={loaderData.next} />
      </main>
    </OutsideFrame>
  )
}

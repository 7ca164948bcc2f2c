import { href, redirect } from 'react-router'
import { endSession } from '~/auth/sessions.server'
import type { Route } from './+types/sign-out'

/** A link or a typed address signs nobody out. */
export function loader() {
  return redirect(href('/'))
}

/** Ends the session. */
export async function action({ request }: Route.ActionArgs) {
  return redirect(href('/'), { headers: { 'Set-Cookie': await endSession(request) } })
}

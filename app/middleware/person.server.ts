import { createContext, type MiddlewareFunction, redirect } from 'react-router'
import { type Person, readSession, sessionCookieName } from '~/auth/sessions.server'

/** Who is signed in; null for a stranger. */
export const personContext = createContext<Person | null>(null)

/** Tells who is signed in by the request's cookie, and sends the cookie on where it changes. */
export const person: MiddlewareFunction<Response> = async ({ request, context }, next) => {
  const session = await readSession(request)
  context.set(personContext, session.person)
  const response = await next()
  const sets = response.headers.getSetCookie().some((cookie) => cookie.startsWith(`${sessionCookieName}=`))
  if (session.setCookie === null || sets) return response
  const headers = new Headers(response.headers)
  headers.append('Set-Cookie', session.setCookie)
  return new Response(response.body, { status: response.status, statusText: response.statusText, headers })
}

/** The address of the sign-in page that leads back to where a request was going. */
export function signInPath(request: Request, url: URL): string {
  const next = request.method === 'GET' ? url.pathname + url.search : url.pathname
  return `/sign-in?${new URLSearchParams({ next })}`
}

/** Sends a stranger to sign in first. */
export const signedIn: MiddlewareFunction<Response> = ({ request, url, context }, next) => {
  if (context.get(personContext) === null) throw redirect(signInPath(request, url))
  return next()
}

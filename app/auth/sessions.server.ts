import { DrizzlePostgreSQLAdapter } from '@lucia-auth/adapter-drizzle'
import { Lucia, TimeSpan } from 'lucia'
import type { PersonId } from '~/book/ids'
import { db } from '~/db/client.server'
import { people, sessions } from '~/db/schema'
import { prolongSession } from '~/db/sessions.server'
import { env } from '~/env.server'
import { HashedSessionAdapter } from './session-adapter.server'

/** A session that nobody uses for this long has ended; one in use is prolonged in its second half. */
const IDLE = new TimeSpan(14, 'd')
/** A session ends after this long, used or not. */
const ABSOLUTE = new TimeSpan(60, 'd')
const DEVICE_LENGTH = 200

const overTls = env.PUBLIC_URL.startsWith('https:')

const lucia = new Lucia(
  new HashedSessionAdapter(new DrizzlePostgreSQLAdapter(db, sessions, people), (hash, expiresAt) =>
    prolongSession(db, hash, expiresAt),
  ),
  {
    sessionExpiresIn: IDLE,
    sessionCookie: {
      name: overTls ? '__Host-turnstone' : 'turnstone',
      attributes: { secure: overTls, sameSite: 'lax', path: '/' },
    },
    getUserAttributes: ({ name, email }) => ({ name, email }),
  },
)

declare module 'lucia' {
  interface Register {
    Lucia: typeof lucia
    UserId: PersonId
    DatabaseUserAttributes: { name: string; email: string }
    DatabaseSessionAttributes: { absoluteExpiresAt: Date; device: string }
  }
}

/** Who is signed in, as every request knows them. */
export interface Person {
  id: PersonId
  name: string
  email: string
}

/** Name of the session cookie: with the `__Host-` prefix where the site is reached over TLS. */
export const sessionCookieName = lucia.sessionCookieName

const idIn = (request: Request) => lucia.readSessionCookie(request.headers.get('Cookie') ?? '')

/**
 * The person of a request's session, with the `Set-Cookie` value to send where the cookie must change: prolonged, or taken
 * away because its session has ended. Asks the database only where the request carries a session cookie.
 */
export async function readSession(request: Request): Promise<{ person: Person | null; setCookie: string | null }> {
  const id = idIn(request)
  if (!id) return { person: null, setCookie: null }
  const { session, user } = await lucia.validateSession(id)
  if (!session) return { person: null, setCookie: lucia.createBlankSessionCookie().serialize() }
  const setCookie = session.fresh ? lucia.createSessionCookie(session.id).serialize() : null
  return { person: { id: user.id, name: user.name, email: user.email }, setCookie }
}

/** Ends the session that the request carries, if any, and begins a new one. Gives the `Set-Cookie` value. */
export async function beginSession(request: Request, personId: PersonId): Promise<string> {
  const old = idIn(request)
  if (old) await lucia.invalidateSession(old)
  const device = (request.headers.get('User-Agent') ?? '').slice(0, DEVICE_LENGTH)
  const absoluteExpiresAt = new Date(Date.now() + ABSOLUTE.milliseconds())
  const session = await lucia.createSession(personId, { absoluteExpiresAt, device })
  return lucia.createSessionCookie(session.id).serialize()
}

/** Ends the session that the request carries, if any. Gives the `Set-Cookie` value that takes the cookie away. */
export async function endSession(request: Request): Promise<string> {
  const id = idIn(request)
  if (id) await lucia.invalidateSession(id)
  return lucia.createBlankSessionCookie().serialize()
}

/** Removes the sessions that have ended. */
export const sweepSessions = (): Promise<void> => lucia.deleteExpiredSessions()

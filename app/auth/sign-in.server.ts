import { db } from '~/db/client.server'
import { findSignIn } from '~/db/read-people.server'
import type { Seconds } from '~/track/units'
import { verifyPassword, warmUp } from './password.server'
import { beginSession } from './sessions.server'
import { giveBackTry, takeTry } from './sign-in-limit.server'

export type SignIn =
  | { ok: true; setCookie: string }
  | { ok: false; code: 'wrong-sign-in' | 'too-many-tries'; wait?: Seconds }

/**
 * Signs a person in: a new session, the browser's old one ended. An address that nobody has, one without a password and a
 * wrong password give the same answer after the same work.
 */
export async function signIn(
  request: Request,
  given: { email: string; password: string; clientAddress: string },
): Promise<SignIn> {
  const email = given.email.toLowerCase()
  const wait = await takeTry(email, given.clientAddress)
  if (wait !== null) return { ok: false, code: 'too-many-tries', wait }
  const found = await findSignIn(db, email)
  await warmUp()
  const right = await verifyPassword(found?.passwordHash ?? null, given.password)
  if (!found || !right) return { ok: false, code: 'wrong-sign-in' }
  await giveBackTry(email, given.clientAddress)
  return { ok: true, setCookie: await beginSession(request, found.person) }
}

import { createContext, type MiddlewareFunction, redirect } from 'react-router'
import type { Actor } from '~/book/actions'
import type { TeamId } from '~/book/ids'
import type { Role } from '~/book/kinds'
import { readTeamOf } from '~/db/read-people.server'
import { dbContext } from './context'
import { personContext, signInPath } from './person.server'
import { refusal } from './refusal.server'

/** The team whose pages a request asks for, and the member who asks. */
export interface TeamMember {
  actor: Extract<Actor, { kind: 'person' }>
  role: Role
  team: { id: TeamId; slug: string; name: string }
}

export const teamContext = createContext<TeamMember>()

/**
 * Lets only members of `params.team` on, and tells who asks. To anyone else the team does not exist; a stranger is asked to
 * sign in whether it does or not.
 */
export const team: MiddlewareFunction<Response> = async ({ request, url, params, context }, next) => {
  const person = context.get(personContext)
  if (person === null) throw redirect(signInPath(request, url))
  const found = await readTeamOf(context.get(dbContext), person.id, params.team ?? '')
  if (!found) throw refusal('not-found')
  const actor = { kind: 'person', person: person.id, team: found.team.id, role: found.role } as const
  context.set(teamContext, { actor, role: found.role, team: found.team })
  return next()
}

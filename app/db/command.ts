import { and, eq, isNull } from 'drizzle-orm'
import type { Action, Actor, Facts, Reason } from '~/book/actions'
import type { PersonId, TeamId } from '~/book/ids'
import { may } from '~/book/may'
import type { Db } from './database'
import { memberships, teams } from './schema'

/** Why a command did nothing. */
export type Declined =
  | { kind: 'refused'; reason: Reason }
  | { kind: 'not-found' }
  | { kind: 'invalid'; problems: readonly { field: string; code: string }[] }

export interface Member {
  team: TeamId
  person: PersonId
}

/**
 * The member who gives a command, or why he may not. The membership is read afresh: a person who left or changed his role
 * meanwhile commands nothing.
 */
export async function commander(
  db: Db,
  actor: Actor,
  action: Action,
  facts: Facts = {},
): Promise<{ kind: 'member'; member: Member } | Declined> {
  if (actor.kind !== 'person') return { kind: 'refused', reason: 'not-a-member' }
  const answer = may(actor, action, facts)
  if (!answer.ok) return { kind: 'refused', reason: answer.reason }
  const [row] = await db
    .select({ team: memberships.teamId, person: memberships.personId })
    .from(memberships)
    .where(
      and(
        eq(memberships.teamId, actor.team),
        eq(memberships.personId, actor.person),
        eq(memberships.role, actor.role),
        isNull(memberships.endedAt),
      ),
    )
  return row ? { kind: 'member', member: row } : { kind: 'refused', reason: 'not-a-member' }
}

/** Lets one command at a time give names within a team: two of one name each get an address of their own. */
export async function lockTeam(db: Db, team: TeamId): Promise<void> {
  await db.select({ id: teams.id }).from(teams).where(eq(teams.id, team)).for('no key update')
}

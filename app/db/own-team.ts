import { and, eq, isNull, type SQL, sql } from 'drizzle-orm'
import type { PgColumn } from 'drizzle-orm/pg-core'
import type { Actor } from '~/book/actions'
import type { PersonId } from '~/book/ids'

/**
 * Part of every WHERE: the row is of the actor's team, and the actor is still a member of it, whatever the request believes.
 * For a stranger no row is.
 */
export function ownTeam(actor: Actor, teamId: PgColumn): SQL {
  if (actor.kind === 'stranger') return sql`false`
  const ofTeam = eq(teamId, actor.team)
  if (actor.kind === 'job') return ofTeam
  const member = sql`exists (select 1 from memberships member where member.team_id = ${actor.team}
    and member.person_id = ${actor.person} and member.ended_at is null)`
  return and(ofTeam, member)!
}

/** The person who acts, or null for a job. */
export const personOf = (actor: Actor): PersonId | null => (actor.kind === 'person' ? actor.person : null)

/** The row is this person's; a job's where null. */
export const isBy = (person: PgColumn, by: PersonId | null): SQL => (by === null ? isNull(person) : eq(person, by))

import { asc, eq, sql } from 'drizzle-orm'
import type { Actor } from '~/book/actions'
import type { PersonId } from '~/book/ids'
import type { Role } from '~/book/kinds'
import type { Db } from './database'
import { ownTeam } from './own-team'
import { memberships, people } from './schema'

export interface TeamPerson {
  id: PersonId
  name: string
  role: Role
  /** Left the team; what he made keeps his name. */
  former: boolean
}

/** Everyone who is or was in the actor's team, by name. */
export function readTeamPeople(db: Db, actor: Actor): Promise<TeamPerson[]> {
  return db
    .select({
      id: people.id,
      name: people.name,
      role: memberships.role,
      former: sql<boolean>`${memberships.endedAt} is not null`,
    })
    .from(memberships)
    .innerJoin(people, eq(people.id, memberships.personId))
    .where(ownTeam(actor, memberships.teamId))
    .orderBy(asc(people.name), asc(people.id))
}

/** Names of the team's people, former members too. */
export async function readNames(db: Db, actor: Actor): Promise<Map<PersonId, string>> {
  const rows = await readTeamPeople(db, actor)
  return new Map(rows.map(({ id, name }) => [id, name]))
}

import { and, asc, eq, isNull, sql } from 'drizzle-orm'
import type { PersonId, TeamId } from '~/book/ids'
import type { Role } from '~/book/kinds'
import type { Db } from './database'
import { memberships, passwords, people, teams } from './schema'

/** Reads of people and teams that come before there is an actor: who signs in, and into which teams. */

/** The person of an e-mail address, compared without case, with the hash of his password; null where nobody has it. */
export async function findSignIn(
  db: Db,
  email: string,
): Promise<{ person: PersonId; passwordHash: string | null } | null> {
  const [row] = await db
    .select({ person: people.id, passwordHash: passwords.hash })
    .from(people)
    .leftJoin(passwords, eq(passwords.personId, people.id))
    .where(eq(sql`lower(${people.email})`, email.toLowerCase()))
  return row ?? null
}

export interface TeamOfPerson {
  team: { id: TeamId; slug: string; name: string }
  role: Role
}

const columns = { team: { id: teams.id, slug: teams.slug, name: teams.name }, role: memberships.role }
const isMember = (person: PersonId) => and(eq(memberships.personId, person), isNull(memberships.endedAt))

/** The teams that a person is in now, by name. */
export function readTeamsOf(db: Db, person: PersonId): Promise<TeamOfPerson[]> {
  return db
    .select(columns)
    .from(memberships)
    .innerJoin(teams, eq(teams.id, memberships.teamId))
    .where(isMember(person))
    .orderBy(asc(teams.name), asc(teams.id))
}

/** The team of this slug with the person's role in it; null where he is not in it now or there is none. */
export async function readTeamOf(db: Db, person: PersonId, slug: string): Promise<TeamOfPerson | null> {
  const [row] = await db
    .select(columns)
    .from(memberships)
    .innerJoin(teams, eq(teams.id, memberships.teamId))
    .where(and(isMember(person), eq(teams.slug, slug)))
  return row ?? null
}

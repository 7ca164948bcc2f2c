import { eq } from 'drizzle-orm'
import type { Actor } from '~/book/actions'
import type { Db } from '~/db/database'
import { readTeamPeople } from '~/db/read-team.server'
import { teams } from '~/db/schema'

/** The people of a team as actors, by first name. */
export type Actors = ReadonlyMap<string, Extract<Actor, { kind: 'person' }>>

/** Everyone of the team with this slug. */
export async function actorsOf(db: Db, slug: string): Promise<Actors> {
  const [team] = await db.select({ id: teams.id }).from(teams).where(eq(teams.slug, slug))
  if (!team) throw new Error(`no such team: ${slug}`)
  const people = await readTeamPeople(db, { kind: 'job', name: 'demo', team: team.id })
  return new Map(
    people.map(({ id, name, role }) => [name.split(' ')[0]!, { kind: 'person', person: id, team: team.id, role }]),
  )
}

/** The person of this first name. */
export function actorNamed(actors: Actors, name: string) {
  const actor = actors.get(name)
  if (!actor) throw new Error(`nobody is called ${name}`)
  return actor
}

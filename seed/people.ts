import { eq, sql } from 'drizzle-orm'
import { v7 } from 'uuid'
import { hashPassword } from '~/auth/password.server'
import type { PersonId, TeamId } from '~/book/ids'
import type { Role } from '~/book/kinds'
import type { Db } from '~/db/database'
import { memberships, passwords, people, teams } from '~/db/schema'

export type DemoTeam = {
  slug: string
  name: string
  people: { name: string; email: string; role: Role }[]
}

async function teamIdOf(db: Db, { slug, name }: DemoTeam): Promise<TeamId> {
  await db
    .insert(teams)
    .values({ id: v7() as TeamId, slug, name })
    .onConflictDoNothing()
  const [row] = await db.select({ id: teams.id }).from(teams).where(eq(teams.slug, slug))
  return row!.id
}

async function personIdOf(db: Db, { name, email }: { name: string; email: string }): Promise<PersonId> {
  const values = { id: v7() as PersonId, email, name, emailVerifiedAt: new Date() }
  await db.insert(people).values(values).onConflictDoNothing()
  const [row] = await db.select({ id: people.id }).from(people).where(sql`lower(${people.email}) = lower(${email})`)
  return row!.id
}

/** Makes the teams and their people where they are missing, and gives each of these people the password. Safe to repeat. */
export async function seedPeople(db: Db, demoTeams: DemoTeam[], password: string): Promise<void> {
  for (const team of demoTeams) {
    const teamId = await teamIdOf(db, team)
    for (const person of team.people) {
      const personId = await personIdOf(db, person)
      const hash = await hashPassword(password)
      await db
        .insert(passwords)
        .values({ personId, hash })
        .onConflictDoUpdate({ target: passwords.personId, set: { hash, changedAt: new Date() } })
      await db.insert(memberships).values({ teamId, personId, role: person.role }).onConflictDoNothing()
    }
  }
}

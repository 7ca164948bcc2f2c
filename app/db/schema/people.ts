import { sql } from 'drizzle-orm'
import { index, pgTable, primaryKey, text, uniqueIndex, uuid } from 'drizzle-orm/pg-core'
import type { PersonId, TeamId } from '~/book/ids'
import { ROLES, type Role } from '~/book/kinds'
import { createdAt, instant, oneOf, teamId } from './columns'

/** People. Not team-owned: one person may be in several teams. */
export const people = pgTable(
  'people',
  {
    id: uuid('id').$type<PersonId>().primaryKey(),
    email: text('email').notNull(),
    name: text('name').notNull(),
    emailVerifiedAt: instant('email_verified_at'),
    createdAt: createdAt(),
  },
  (t) => [uniqueIndex('people_email').on(sql`lower(${t.email})`)],
)

/** Password hashes, apart from people so that no reader of people carries one by accident. */
export const passwords = pgTable('passwords', {
  personId: uuid('person_id')
    .$type<PersonId>()
    .primaryKey()
    .references(() => people.id, { onDelete: 'cascade' }),
  hash: text('hash').notNull(),
  changedAt: instant('changed_at').notNull().defaultNow(),
})

/** Signed-in browsers. `id` is the SHA-256 of the session id, never the id itself. */
export const sessions = pgTable(
  'sessions',
  {
    id: text('id').primaryKey(),
    userId: uuid('person_id')
      .$type<PersonId>()
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    /** Moves forward while the session is used. */
    expiresAt: instant('expires_at').notNull(),
    /** Never moves. */
    absoluteExpiresAt: instant('absolute_expires_at').notNull(),
    lastUsedAt: instant('last_used_at').notNull().defaultNow(),
    /** What the browser calls itself, for the person's own list of sessions. */
    device: text('device').notNull().default(''),
    createdAt: createdAt(),
  },
  (t) => [index('sessions_person').on(t.userId), index('sessions_expiry').on(t.expiresAt)],
)

export const teams = pgTable('teams', {
  id: uuid('id').$type<TeamId>().primaryKey(),
  slug: text('slug').notNull().unique(),
  name: text('name').notNull(),
  createdAt: createdAt(),
})

/** Who is or was in a team. The row stays when a person leaves, so that what they made keeps its maker. */
export const memberships = pgTable(
  'memberships',
  {
    teamId: teamId().references(() => teams.id),
    personId: uuid('person_id')
      .$type<PersonId>()
      .notNull()
      .references(() => people.id),
    role: text('role').$type<Role>().notNull(),
    createdAt: createdAt(),
    endedAt: instant('ended_at'),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.personId] }),
    index('memberships_person').on(t.personId),
    oneOf('memberships_role', t.role, ROLES),
  ],
)

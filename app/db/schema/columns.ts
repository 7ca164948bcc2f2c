import { sql } from 'drizzle-orm'
import { check, doublePrecision, type PgColumn, timestamp, uuid } from 'drizzle-orm/pg-core'
import type { PersonId, TeamId } from '~/book/ids'

/** Columns and rules that many tables share. Ids are made by whoever makes the thing: no table has a default id. */

/** The team that owns the row; part of every key and of every reference. */
export const teamId = () => uuid('team_id').$type<TeamId>().notNull()

/** Who made the row; a member, or a former one, of the row's team. */
export const madeBy = () => uuid('made_by').$type<PersonId>().notNull()

/** An instant. */
export const instant = (name: string) => timestamp(name, { withTimezone: true, mode: 'date' })

/** When the row was written, by the database's clock. */
export const createdAt = () => instant('created_at').notNull().defaultNow()

/** A length in metres, a speed in m/s or an angle in degrees, as the field says. */
export const measure = (name: string) => doublePrecision(name)

const literals = (values: readonly string[]) => sql.raw(values.map((value) => `'${value}'`).join(', '))

/** The column holds one of a closed vocabulary, or nothing. */
export const oneOf = (name: string, column: PgColumn, values: readonly string[]) =>
  check(name, sql`${column} in (${literals(values)})`)

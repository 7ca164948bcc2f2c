import { sql } from 'drizzle-orm'
import type { Db } from './database'

/** Tables whose rows stay as they were written: the app adds and reads, nothing else. */
const KEPT = ['centrelines', 'grounds', 'changes', 'findings', 'editions'] as const
/** Tables whose rows the app may also remove. */
const REMOVED_FROM = [
  'sessions',
  'imports',
  'rate_limits',
  'places',
  'ties',
  'landmark_placements',
  'stretch_placements',
] as const

const names = (tables: readonly string[]) =>
  sql.join(
    tables.map((table) => sql.identifier(table)),
    sql`, `,
  )

/**
 * Gives the app's role what it needs and takes everything else away: it reads and adds everywhere, changes what is not kept
 * for good, removes only what lives on its own clock, and owns nothing, so that it cannot alter a table. Safe to repeat.
 * @param db connected as the owner of the tables
 * @param role name of the role under which the app connects; nothing to do where that is the owner itself
 */
export async function grantRights(db: Db, role: string): Promise<void> {
  const owner = await db.execute<{ name: string }>(sql`select current_user as name`)
  if (owner.rows[0]?.name === role) return
  const app = sql.identifier(role)
  // Together or not at all: an app that is running must not be without rights for a moment.
  await db.transaction(async (tx) => {
    await tx.execute(sql`revoke all on all tables in schema public from ${app}`)
    await tx.execute(sql`grant usage on schema public to ${app}`)
    await tx.execute(sql`grant select, insert, update on all tables in schema public to ${app}`)
    await tx.execute(sql`revoke update on ${names(KEPT)} from ${app}`)
    await tx.execute(sql`grant delete on ${names(REMOVED_FROM)} to ${app}`)
  })
}

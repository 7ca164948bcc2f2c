import { drizzle } from 'drizzle-orm/node-postgres'
import { migrate } from 'drizzle-orm/node-postgres/migrator'
import pg from 'pg'
import { grantRights } from './rights'

/** Any number that nothing else locks by. */
export const MIGRATION_LOCK = 7_140_021

/**
 * Brings the tables up to date and sets the app's rights. Two at once wait for each other by an advisory lock, since the
 * migrator alone would apply a migration twice. One connection, one session: the lock goes with it whatever happens.
 * @param ownerUrl connection of the role that owns the tables
 * @param appUrl connection of the app; only its role's name is used
 * @param folder where the migrations are
 * @throws whatever the database says of a migration that fails; each migration is one transaction
 */
export async function migrateDatabase(ownerUrl: string, appUrl: string, folder: string): Promise<void> {
  const client = new pg.Client({ connectionString: ownerUrl, connectionTimeoutMillis: 5_000 })
  await client.connect()
  try {
    const db = drizzle(client)
    await client.query('select pg_advisory_lock($1)', [MIGRATION_LOCK])
    await migrate(db, { migrationsFolder: folder })
    const role = roleOf(appUrl)
    if (role) await grantRights(db, role)
  } finally {
    await client.end()
  }
}

function roleOf(url: string): string | undefined {
  return decodeURIComponent(new URL(url).username) || undefined
}

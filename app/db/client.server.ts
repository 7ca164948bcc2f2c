import { drizzle } from 'drizzle-orm/node-postgres'
import pg from 'pg'
import { env } from '~/env.server'
import { errorEntry } from '~/error-entry.server'
import { log } from '~/log.server'

/** Connections of this process to its database. */
export const pool = new pg.Pool({
  connectionString: env.DATABASE_URL,
  connectionTimeoutMillis: 5_000,
  statement_timeout: 15_000,
})

// An idle connection that the database ends must not end the process: the pool opens another when asked.
pool.on('error', (error) => log.warn(errorEntry(error), 'database connection lost'))

/** The database as Drizzle sees it. */
export const db = drizzle(pool)

import { env } from '~/env.server'
import { errorEntry } from '~/error-entry.server'
import { log } from '~/log.server'
import { migrateDatabase } from './migrations'

/** Entry: brings the database of `OWNER_DATABASE_URL` up to date; run from the project's folder. Exits with 1 on failure. */
try {
  await migrateDatabase(env.OWNER_DATABASE_URL, env.DATABASE_URL, 'drizzle')
} catch (error) {
  log.fatal(errorEntry(error), 'migration failed')
  process.exitCode = 1
}

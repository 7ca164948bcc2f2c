import { drizzle } from 'drizzle-orm/node-postgres'
import pg from 'pg'
import { env } from '~/env.server'
import { errorEntry } from '~/error-entry.server'
import { log } from '~/log.server'
import { seedDemo } from './demo'

/** Entry: puts the demo into the database of `OWNER_DATABASE_URL`, whole or not at all. Exits with 1 on failure. */
async function seed() {
  if (!env.DEMO_PASSWORD) throw new Error('DEMO_PASSWORD is missing: the demo has no password of its own.')
  const client = new pg.Client({ connectionString: env.OWNER_DATABASE_URL, connectionTimeoutMillis: 5_000 })
  await client.connect()
  try {
    const password = env.DEMO_PASSWORD
    const today = new Date().toISOString().slice(0, 10)
    await drizzle(client).transaction((db) => seedDemo(db, password, today))
  } finally {
    await client.end()
  }
}

try {
  await seed()
} catch (error) {
  log.fatal(errorEntry(error), 'the demo could not be made')
  process.exitCode = 1
}

import { defineConfig } from 'drizzle-kit'

/** `npm run db:generate` writes a migration for what changed in the schema; nothing here connects to a database. */
export default defineConfig({
  dialect: 'postgresql',
  schema: './app/db/schema/index.ts',
  out: './drizzle',
})

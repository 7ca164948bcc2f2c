import type { NodePgQueryResultHKT } from 'drizzle-orm/node-postgres'
import type { PgDatabase } from 'drizzle-orm/pg-core'

/** A connection pool or a transaction under way: what every read and write is given. */
export type Db = PgDatabase<NodePgQueryResultHKT, Record<string, never>>

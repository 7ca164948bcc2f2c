import { bigint, index, integer, pgTable, text } from 'drizzle-orm/pg-core'

/** Counters of the rate limiter; its column names and types are those that rate-limiter-flexible asks for. */
export const rateLimits = pgTable(
  'rate_limits',
  {
    key: text('key').primaryKey(),
    points: integer('points').notNull().default(0),
    /** Milliseconds since 1970. */
    expire: bigint('expire', { mode: 'number' }),
  },
  (t) => [index('rate_limits_expire').on(t.expire)],
)

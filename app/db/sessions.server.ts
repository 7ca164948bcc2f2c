import { eq, sql } from 'drizzle-orm'
import type { Db } from './database'
import { sessions } from './schema'

/** Moves the expiry of the session with this hash, no further than the session's last day, and notes that it was used. */
export async function prolongSession(db: Db, hash: string, expiresAt: Date): Promise<void> {
  await db
    .update(sessions)
    .set({ expiresAt: sql`least(${expiresAt}, ${sessions.absoluteExpiresAt})`, lastUsedAt: sql`now()` })
    .where(eq(sessions.id, hash))
}

import { createHash } from 'node:crypto'
import type { Adapter, DatabaseSession, DatabaseUser, UserId } from 'lucia'

/** SHA-256 of a session id, lower-case hexadecimal: what the database keeps of it. */
export const sessionHash = (sessionId: string): string => createHash('sha256').update(sessionId).digest('hex')

/**
 * Stands before another adapter so that only the hash of a session id reaches the database: who reads the table cannot sign
 * in with what he finds. Sessions listed by `getUserSessions` carry the hash as their id.
 */
export class HashedSessionAdapter implements Adapter {
  constructor(
    private readonly inner: Adapter,
    /** Moves a session's expiry, no further than its last day, and notes the use. */
    private readonly prolong: (hash: string, expiresAt: Date) => Promise<void>,
  ) {}

  async getSessionAndUser(sessionId: string): Promise<[DatabaseSession | null, DatabaseUser | null]> {
    const [session, user] = await this.inner.getSessionAndUser(sessionHash(sessionId))
    return [session && { ...session, id: sessionId }, user]
  }

  setSession(session: DatabaseSession): Promise<void> {
    return this.inner.setSession({ ...session, id: sessionHash(session.id) })
  }

  updateSessionExpiration(sessionId: string, expiresAt: Date): Promise<void> {
    return this.prolong(sessionHash(sessionId), expiresAt)
  }

  deleteSession(sessionId: string): Promise<void> {
    return this.inner.deleteSession(sessionHash(sessionId))
  }

  deleteUserSessions(userId: UserId): Promise<void> {
    return this.inner.deleteUserSessions(userId)
  }

  getUserSessions(userId: UserId): Promise<DatabaseSession[]> {
    return this.inner.getUserSessions(userId)
  }

  deleteExpiredSessions(): Promise<void> {
    return this.inner.deleteExpiredSessions()
  }
}

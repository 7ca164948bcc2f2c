import { createHash } from 'node:crypto'
import { TimeSpan } from 'lucia'
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible'
import { pool } from '~/db/client.server'
import { type Seconds, seconds } from '~/track/units'
import { clientOf } from './client-address'

const WINDOW = new TimeSpan(15, 'm')
const TABLE = { storeClient: pool, tableName: 'rate_limits', tableCreated: true, duration: WINDOW.seconds() }

/** Wrong tries for one e-mail address from one client, within the window. */
export const TRIES_PER_ADDRESS = 10
/** Wrong tries from one client for any address, within the window: a whole paddock may share one. */
export const TRIES_PER_CLIENT = 100

const perAddress = new RateLimiterPostgres({ ...TABLE, keyPrefix: 'sign-in', points: TRIES_PER_ADDRESS })
const perClient = new RateLimiterPostgres({ ...TABLE, keyPrefix: 'sign-in-client', points: TRIES_PER_CLIENT })

const pairKey = (email: string, client: string) =>
  createHash('sha256').update(`${client}\n${email}`).digest('base64url')

async function take(limiter: RateLimiterPostgres, key: string): Promise<Seconds | null> {
  try {
    await limiter.consume(key)
    return null
  } catch (refusal) {
    if (refusal instanceof RateLimiterRes) return seconds(Math.max(1, Math.ceil(refusal.msBeforeNext / 1000)))
    throw refusal
  }
}

/**
 * Counts a try before its password is looked at, so that tries at the same time cannot pass together. Gives null where it
 * may go on, else how long to wait. Addresses are counted per client: nobody can lock another out from elsewhere.
 *
 * @param email in the form in which addresses are compared
 */
export async function takeTry(email: string, clientAddress: string): Promise<Seconds | null> {
  const client = clientOf(clientAddress)
  return (await take(perClient, client)) ?? (await take(perAddress, pairKey(email, client)))
}

/** Takes a try back that turned out right: only wrong ones count. */
export async function giveBackTry(email: string, clientAddress: string): Promise<void> {
  const client = clientOf(clientAddress)
  await Promise.all([perClient.reward(client), perAddress.delete(pairKey(email, client))])
}

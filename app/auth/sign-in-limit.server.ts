import { createHash } from 'node:crypto'
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible'
import { pool } from '~/db/client.server'
import { type Seconds, seconds } from '~/track/units'
import { clientOf } from './client-address'
import { TRIES_PER_ACCOUNT, TRIES_PER_ADDRESS, TRIES_PER_CLIENT, TRIES_WITHIN } from './sign-in-limit'

const TABLE = { storeClient: pool, tableName: 'rate_limits', tableCreated: true, duration: TRIES_WITHIN.seconds() }

const perAddress = new RateLimiterPostgres({ ...TABLE, keyPrefix: 'sign-in', points: TRIES_PER_ADDRESS })
const perClient = new RateLimiterPostgres({ ...TABLE, keyPrefix: 'sign-in-client', points: TRIES_PER_CLIENT })
const perAccount = new RateLimiterPostgres({ ...TABLE, keyPrefix: 'sign-in-account', points: TRIES_PER_ACCOUNT })

const hashOf = (text: string) => createHash('sha256').update(text).digest('base64url')
const pairKey = (email: string, client: string) => hashOf(`${client}\n${email}`)

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
 * may go on, else how long to wait, at most the window. A try that is refused for its client counts for the client alone: from
 * one place nobody can use up another's tries, and what many places together use up comes back with the window's end.
 *
 * @param email in the form in which addresses are compared
 */
export async function takeTry(email: string, clientAddress: string): Promise<Seconds | null> {
  const client = clientOf(clientAddress)
  return (
    (await take(perClient, client)) ??
    (await take(perAddress, pairKey(email, client))) ??
    (await take(perAccount, hashOf(email)))
  )
}

/** Takes a try back that turned out right: only wrong ones count. */
export async function giveBackTry(email: string, clientAddress: string): Promise<void> {
  const client = clientOf(clientAddress)
  await Promise.all([
    perClient.reward(client),
    perAddress.delete(pairKey(email, client)),
    perAccount.reward(hashOf(email)),
  ])
}

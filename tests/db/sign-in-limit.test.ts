import { afterAll, describe, expect, test } from 'vitest'
import { TRIES_PER_ACCOUNT, TRIES_PER_ADDRESS, TRIES_PER_CLIENT, TRIES_WITHIN } from '~/auth/sign-in-limit'
import { giveBackTry, takeTry } from '~/auth/sign-in-limit.server'
import { pool } from '~/db/client.server'
import { newId } from './support'

afterAll(() => pool.end())

const someone = () => `${newId()}@lanternside.example`

/** Clients that no other test has: each an IPv6 network of its own. */
let networks = 0
const run = newId<string>().replaceAll('-', '').slice(-8)
function newClient(): string {
  networks += 1
  return `2001:${run.slice(0, 4)}:${run.slice(4)}:${networks.toString(16)}::1`
}

async function tries(count: number, of: () => readonly [email: string, client: string]) {
  const waits: (number | null)[] = []
  for (let i = 0; i < count; i++) waits.push(await takeTry(...of()))
  return waits
}
const free = (count: number) => Array<null>(count).fill(null)

describe('wrong tries at signing in', () => {
  test('for one address from one client end after some, and another client goes on', async () => {
    const [email, client] = [someone(), newClient()]
    const waits = await tries(TRIES_PER_ADDRESS + 1, () => [email, client])
    expect(waits.slice(0, -1)).toEqual(free(TRIES_PER_ADDRESS))
    expect(waits.at(-1)).toBeGreaterThan(0)
    expect(await takeTry(email, newClient())).toBeNull()
  })

  test('from one client end whatever the addresses, also where the client changes within its network', async () => {
    const client = newClient()
    const waits = await tries(TRIES_PER_CLIENT + 1, () => [someone(), client])
    expect(waits.slice(0, -1)).toEqual(free(TRIES_PER_CLIENT))
    expect(await takeTry(someone(), client.replace('::1', '::2:3'))).toBeGreaterThan(0)
  })

  test('for one address end whatever the clients, for no longer than the window, and other addresses go on', async () => {
    const email = someone()
    expect(await tries(TRIES_PER_ACCOUNT, () => [email, newClient()])).toEqual(free(TRIES_PER_ACCOUNT))
    const wait = await takeTry(email, newClient())
    expect(wait).toBeGreaterThan(0)
    expect(wait).toBeLessThanOrEqual(TRIES_WITHIN.seconds())
    expect(await takeTry(someone(), newClient())).toBeNull()
  })

  test('that one client has too many of use up nothing of the address’s', async () => {
    const [email, client] = [someone(), newClient()]
    await tries(TRIES_PER_ACCOUNT, () => [email, client])
    expect(await takeTry(email, newClient())).toBeNull()
  })

  test('are given back where a try was right', async () => {
    const email = someone()
    for (let i = 0; i <= TRIES_PER_ACCOUNT; i++) {
      const client = newClient()
      expect(await takeTry(email, client)).toBeNull()
      await giveBackTry(email, client)
    }
  })
})

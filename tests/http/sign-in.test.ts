import { createHash, randomUUID } from 'node:crypto'
import pg from 'pg'
import { afterAll, describe, expect, test } from 'vitest'
import { TRIES_PER_ADDRESS } from '~/auth/sign-in-limit'
import { send } from './send'
import { demoPassword, PEOPLE, sessionIn, signIn, stranger, Visitor, wordsOf } from './visitor'

const email = PEOPLE.driver
const rows = new pg.Client({ connectionString: process.env.TEST_DATABASE_URL })
const connected = rows.connect()
afterAll(() => rows.end())

const sessionRow = async (cookie: string) => {
  await connected
  const hash = createHash('sha256')
    .update(cookie.split('=')[1] ?? '')
    .digest('hex')
  const { rows: found } = await rows.query('select * from sessions where id = $1', [hash])
  return found[0]
}

describe('signing in', () => {
  test('the right password leads to the teams, with a cookie that scripts do not see', async () => {
    const answer = await stranger.post('/sign-in', { email, password: demoPassword })
    expect(answer.status).toBe(302)
    expect(answer.headers.location).toBe('/teams')
    const [cookie] = answer.headers['set-cookie'] as string[]
    expect(cookie).toMatch(/HttpOnly/)
    expect(cookie).toMatch(/SameSite=Lax/i)
    expect(cookie).toMatch(/Path=\//)
  })
  test('the address is read without case and without blanks around it', async () => {
    const answer = await stranger.post('/sign-in', { email: `  ${email.toUpperCase()} `, password: demoPassword })
    expect(answer.status).toBe(302)
  })
  test('it leads back to where the person was going', async () => {
    const next = '/teams/lanternside/books?sort=name'
    const page = await stranger.get('/teams/lanternside/books?sort=name')
    expect(page.headers.location).toBe(`/sign-in?${new URLSearchParams({ next })}`)
    const answer = await stranger.post('/sign-in', { email, password: demoPassword, next })
    expect(answer.headers.location).toBe(next)
  })
  test.each(['https://elsewhere.example/', '//elsewhere.example', '/\\elsewhere.example'])(
    'it never leads to %s',
    async (next) => {
      const answer = await stranger.post('/sign-in', { email, password: demoPassword, next })
      expect(answer.headers.location).toBe('/teams')
    },
  )
  test('only the hash of a session id is stored', async () => {
    const { cookie } = await signIn('driver')
    const id = cookie.split('=')[1]
    expect(await sessionRow(cookie)).toBeDefined()
    await connected
    const { rows: plain } = await rows.query('select 1 from sessions where id = $1', [id])
    expect(plain).toEqual([])
  })
  test('signing in again ends the browser’s session before', async () => {
    const first = await signIn('driver')
    const again = await first.post('/sign-in', { email, password: demoPassword })
    expect(sessionIn(again)).not.toBe('')
    expect(sessionIn(again)).not.toBe(first.cookie)
    expect(await sessionRow(first.cookie)).toBeUndefined()
    expect((await first.get('/teams')).headers.location).toMatch(/^\/sign-in/)
  })
  test('who is signed in is not asked again', async () => {
    const driver = await signIn('driver')
    expect((await driver.get('/sign-in')).headers.location).toBe('/teams')
  })
  test('a made-up session is none, and its cookie is taken away', async () => {
    const answer = await new Visitor('turnstone=abcdefghijklmnopqrstuvwxyz').get('/')
    expect(answer.status).toBe(200)
    expect(String(answer.headers['set-cookie'])).toMatch(/turnstone=;.*Max-Age=0/)
  })
})

describe('a session', () => {
  test('that nobody used for too long has ended', async () => {
    const driver = await signIn('driver')
    const row = await sessionRow(driver.cookie)
    await rows.query(`update sessions set expires_at = now() - interval '1 second' where id = $1`, [row.id])
    expect((await driver.get('/teams')).headers.location).toMatch(/^\/sign-in/)
    expect(await sessionRow(driver.cookie)).toBeUndefined()
  })
  test('in use is prolonged, but not past its last day', async () => {
    const driver = await signIn('driver')
    const { id } = await sessionRow(driver.cookie)
    await rows.query(
      `update sessions set expires_at = now() + interval '1 hour', absolute_expires_at = now() + interval '2 days' where id = $1`,
      [id],
    )
    const answer = await driver.get('/teams')
    expect(sessionIn(answer)).toBe(driver.cookie)
    const row = await sessionRow(driver.cookie)
    expect(row.expires_at).toEqual(row.absolute_expires_at)
  })
  test('is not prolonged by every request', async () => {
    const driver = await signIn('driver')
    expect((await driver.get('/teams')).headers['set-cookie']).toBeUndefined()
  })
  test('of a person who left the team sees the team no more', async () => {
    const driver = await signIn('driver')
    const row = await sessionRow(driver.cookie)
    const member = [row.person_id]
    await rows.query('update memberships set ended_at = now() where person_id = $1', member)
    const after = await driver.get('/teams/lanternside')
    await rows.query('update memberships set ended_at = null where person_id = $1', member)
    expect(after.status).toBe(404)
    expect((await driver.get('/teams/lanternside')).status).toBe(200)
  })
})

describe('the teams of a person', () => {
  const inGreyholm = (role: 'driver' | 'coach', ended: 'null' | 'now()') =>
    rows.query(
      `insert into memberships (team_id, person_id, role)
        select teams.id, people.id, $1 from teams, people where teams.slug = 'greyholm' and people.email = $2
        on conflict (team_id, person_id) do update set role = excluded.role, ended_at = ${ended}`,
      [role, PEOPLE.manager],
    )

  test('one team is gone to at once; of two he chooses, with another role in each', async () => {
    await connected
    const manager = await signIn('manager')
    expect((await manager.get('/teams')).headers.location).toBe('/teams/lanternside')
    await inGreyholm('coach', 'null')
    const both = await manager.get('/teams')
    const theirs = await manager.get('/teams/greyholm/circuits/import')
    await inGreyholm('driver', 'null')
    const asDriver = await manager.get('/teams/greyholm/circuits/import')
    await inGreyholm('driver', 'now()')
    expect(wordsOf(both)).toMatch(/Greyholm Racing you are coach.*Lanternside Racing you are manager/)
    expect(theirs.status).toBe(200)
    expect(asDriver.status).toBe(403)
    expect((await manager.get('/teams/greyholm')).status).toBe(404)
  })
})

describe('signing out', () => {
  test('a link signs nobody out', async () => {
    const driver = await signIn('driver')
    expect((await driver.get('/sign-out')).headers.location).toBe('/')
    expect(await sessionRow(driver.cookie)).toBeDefined()
  })
  test('the button ends the session and takes the cookie away', async () => {
    const driver = await signIn('driver')
    const answer = await driver.post('/sign-out')
    expect(answer.headers.location).toBe('/')
    expect(String(answer.headers['set-cookie'])).toMatch(/Max-Age=0/)
    expect(await sessionRow(driver.cookie)).toBeUndefined()
  })
  test('another site’s button signs nobody out', async () => {
    const driver = await signIn('driver')
    const answer = await send('/sign-out', {
      method: 'POST',
      headers: { Cookie: driver.cookie, Origin: 'https://elsewhere.example' },
    })
    expect(answer.status).toBe(403)
    expect(await sessionRow(driver.cookie)).toBeDefined()
  })
})

describe('what does not let in', () => {
  const unknown = () => `${randomUUID()}@nobody.example`
  const refused = async (fields: Record<string, string>) => {
    const answer = await stranger.post('/sign-in', fields)
    expect(sessionIn(answer)).toBe('')
    return answer
  }

  test('an address that nobody has and a wrong password give the same answer', async () => {
    const address = unknown()
    const [nobody, wrong] = [
      await refused({ email: address, password: 'not his password' }),
      await refused({ email: PEOPLE.manager, password: 'not his password' }),
    ]
    expect(nobody.status).toBe(400)
    expect(wrong.status).toBe(400)
    expect(wordsOf(nobody)).toBe(wordsOf(wrong))
    expect(wordsOf(nobody)).toContain('That did not let you in.')
  })
  test('the typed address is kept, the password is not', async () => {
    const answer = await refused({ email: 'mona@lanternside', password: 'not her password' })
    expect(answer.text).toContain('value="mona@lanternside"')
    expect(answer.text).not.toContain('not her password')
  })
  test('empty fields say so each at its place', async () => {
    const answer = await refused({ email: '', password: '' })
    expect(answer.status).toBe(400)
    expect(wordsOf(answer)).toContain('Which address do you sign in with?')
    expect(wordsOf(answer)).toContain('The password is missing.')
  })
  test('after too many wrong tries for an address the answer says how long to wait, and right ones elsewhere go on', async () => {
    const address = unknown()
    for (let i = 0; i < TRIES_PER_ADDRESS; i++) await refused({ email: address, password: `try ${i}` })
    const answer = await refused({ email: address, password: 'one more' })
    expect(answer.status).toBe(429)
    expect(wordsOf(answer)).toMatch(/Wait \d+ minutes, then try again\. Your account is not locked\./)
    expect((await stranger.post('/sign-in', { email, password: demoPassword })).status).toBe(302)
  })
  test('right tries use up no wrong ones', async () => {
    for (let i = 0; i <= TRIES_PER_ADDRESS; i++) await signIn('coach')
  })
})

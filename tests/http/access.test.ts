import { randomUUID } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { beforeAll, describe, expect, test } from 'vitest'
import { routesOfApp } from './route-table'
import { type Role, signIn, stranger, type Visitor, wordsOf } from './visitor'

const TEAM = '/teams/lanternside'
const BOOK = `${TEAM}/books/marram-head`
const CIRCUIT = `${TEAM}/circuits/marram-head-circuit`

type By = Record<'stranger' | Role, number>

/** What a request answers to whom. */
const everyMember = { stranger: 302, outsider: 404, driver: 200, coach: 200, manager: 200 }
const deskOnly = { stranger: 302, outsider: 404, driver: 403, coach: 200, manager: 200 }
/** A form sent empty: refused, or told that it does not fit. Either way nothing changes. */
const formOfEveryMember = { stranger: 302, outsider: 404, driver: 400, coach: 400, manager: 400 }
const formOfDesk = { stranger: 302, outsider: 404, driver: 403, coach: 400, manager: 400 }

interface Row {
  path: () => string
  get: By
  /** A form sent empty. Left out where the address takes none. */
  post?: By
}

let draft = ''
let geometry = ''

const all = (status: number): By => ({
  stranger: status,
  outsider: status,
  driver: status,
  coach: status,
  manager: status,
})

const TABLE: Record<string, Row> = {
  '/': { path: () => '/', get: all(200) },
  '/health': { path: () => '/health', get: all(200) },
  '/sign-in': {
    path: () => '/sign-in',
    // Whoever is signed in already is sent on.
    get: { ...all(302), stranger: 200 },
    post: { ...all(302), stranger: 400 },
  },
  '/sign-out': { path: () => '/sign-out', get: all(302), post: { ...all(302) } },
  '/teams': { path: () => '/teams', get: all(302) },
  '/teams/:team': { path: () => TEAM, get: everyMember },
  '/teams/:team/books': { path: () => `${TEAM}/books`, get: everyMember },
  '/teams/:team/books/new': { path: () => `${TEAM}/books/new`, get: deskOnly, post: formOfDesk },
  '/teams/:team/books/:book': { path: () => BOOK, get: everyMember },
  '/teams/:team/books/:book/corners/:number': {
    path: () => `${BOOK}/corners/3`,
    get: everyMember,
    post: formOfEveryMember,
  },
  '/teams/:team/books/:book/corners/:number.geojson': { path: () => `${BOOK}/corners/3.geojson`, get: everyMember },
  '/teams/:team/books/:book/operations': {
    path: () => `${BOOK}/operations`,
    // Nothing to read; and a form names no book whose operation it would be.
    get: { stranger: 302, outsider: 404, driver: 400, coach: 400, manager: 400 },
    post: { stranger: 302, outsider: 404, driver: 404, coach: 404, manager: 404 },
  },
  '/teams/:team/circuits': { path: () => `${TEAM}/circuits`, get: everyMember },
  '/teams/:team/circuits/import': { path: () => `${TEAM}/circuits/import`, get: deskOnly, post: formOfDesk },
  '/teams/:team/circuits/import/:draft': {
    path: () => `${TEAM}/circuits/import/${draft}`,
    // A draft is its uploader's alone, and the coach is.
    get: { ...deskOnly, manager: 404 },
    post: { stranger: 302, outsider: 404, driver: 403, coach: 302, manager: 404 },
  },
  '/teams/:team/circuits/:circuit': {
    path: () => CIRCUIT,
    get: everyMember,
    // A form of corners without a row changes nothing.
    post: { ...formOfDesk, coach: 200, manager: 200 },
  },
  '/teams/:team/cars': { path: () => `${TEAM}/cars`, get: everyMember, post: formOfDesk },
  '/teams/:team/geometry/:hash': { path: () => `${TEAM}/geometry/${geometry}`, get: everyMember },
}

const visitors = {} as Record<'stranger' | Role, Visitor>

beforeAll(async () => {
  visitors.stranger = stranger
  for (const role of ['outsider', 'driver', 'coach', 'manager'] as const) visitors[role] = await signIn(role)
  const bytes = readFileSync('tests/fixtures/circuits/sandbar.kml')
  const uploaded = await visitors.coach.upload(`${TEAM}/circuits/import`, { name: 'sandbar.kml', bytes })
  draft = String(uploaded.headers.location).split('/').at(-1) ?? ''
  geometry = /[0-9a-f]{64}/.exec((await visitors.coach.get(`${CIRCUIT}.data`)).text)?.[0] ?? ''
})

const rows = Object.entries(TABLE)
const everyone = ['stranger', 'outsider', 'driver', 'coach', 'manager'] as const

test('every route of the app has its row here, and every row its route', () => {
  expect(Object.keys(TABLE).sort()).toEqual(routesOfApp.map(({ pattern }) => pattern).sort())
})
test('every route that takes a form has a row for it', () => {
  const takesForm = routesOfApp.filter(({ hasAction }) => hasAction).map(({ pattern }) => pattern)
  expect(rows.flatMap(([pattern, { post }]) => (post ? [pattern] : [])).sort()).toEqual(takesForm.sort())
})
test('the addresses asked for are there', () => {
  expect(draft).toMatch(/^[0-9a-f-]{36}$/)
  expect(geometry).toMatch(/^[0-9a-f]{64}$/)
})

describe.each(rows)('%s', (pattern, { path, get, post }) => {
  test.each(everyone)('answers a %s', async (who) => {
    const answer = await visitors[who].get(path())
    expect(answer.status).toBe(get[who])
    if (who === 'stranger' && pattern.startsWith('/teams')) expect(answer.headers.location).toMatch(/^\/sign-in\?next=/)
  })
  if (pattern.startsWith('/teams/:team')) {
    test('lets nobody past its guard who asks for its data only', async () => {
      if (!routesOfApp.find((route) => route.pattern === pattern)?.hasPage) return
      const outside = await visitors.outsider.get(`${path()}.data`)
      expect(outside.status).toBe(404)
      const unknown = await visitors.stranger.get(`${path()}.data`)
      expect(unknown.status).toBe(202)
      expect(unknown.text).toContain('/sign-in?next=')
    })
  }
  if (post) {
    test.each(everyone)('answers an empty form of a %s', async (who) => {
      // Whoever signs out in this test signs in for himself only.
      const visitor = pattern === '/sign-out' && who !== 'stranger' ? await signIn(who) : visitors[who]
      expect((await visitor.post(path())).status).toBe(post[who])
    })
  } else {
    test('takes no form', async () => {
      expect((await visitors.manager.post(path(), { a: '1' })).status).toBe(405)
    })
  }
})

describe('another team', () => {
  test('is as if it were not there, under its own name and under any other', async () => {
    const [theirs, none] = [
      await visitors.driver.get('/teams/greyholm'),
      await visitors.driver.get('/teams/no-such-team'),
    ]
    expect(theirs.status).toBe(404)
    expect(wordsOf(theirs)).toBe(wordsOf(none))
  })
  test('lends nothing of its own to a page of one’s own team', async () => {
    const [theirs] =
      /\/teams\/greyholm\/books\/[a-z-]+/.exec((await visitors.outsider.get('/teams/greyholm')).text) ?? []
    const book = theirs?.split('/').at(-1)
    expect(book).toBeTruthy()
    expect((await visitors.coach.get(`${TEAM}/books/${book}`)).status).toBe(404)
    expect((await visitors.coach.get(`${TEAM}/geometry/${'0'.repeat(64)}`)).status).toBe(404)
  })
  test('takes no layout or car of another into a book', async () => {
    const answer = await visitors.outsider.post('/teams/greyholm/books/new', {
      id: randomUUID(),
      layout: /name="layout"[\s\S]*?<option value="([0-9a-f-]{36})"/.exec(
        (await visitors.coach.get(`${TEAM}/books/new`)).text,
      )?.[1] as string,
      car: /name="car"[\s\S]*?<option value="([0-9a-f-]{36})"/.exec(
        (await visitors.coach.get(`${TEAM}/books/new`)).text,
      )?.[1] as string,
    })
    expect(answer.status).toBe(400)
    expect(wordsOf(answer)).toContain('That circuit is not there any more.')
  })
})

describe('what is not there', () => {
  test.each([
    `${TEAM}/books/no-such-book`,
    `${TEAM}/circuits/no-such-circuit`,
    `${TEAM}/circuits/import/${randomUUID()}`,
    `${TEAM}/circuits/import/not-an-id`,
    `${BOOK}/corners/99`,
    `${TEAM}/no-such-page`,
    '/no-such-page',
  ])('%s answers in plain words', async (path) => {
    const answer = await visitors.coach.get(path)
    expect(answer.status).toBe(404)
    expect(wordsOf(answer)).toContain('Nothing here.')
    expect(answer.text).not.toMatch(/\bat .*\.[jt]s:\d+/)
  })
})

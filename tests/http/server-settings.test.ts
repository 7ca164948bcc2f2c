import { Agent } from 'node:http'
import { describe, expect, it, test } from 'vitest'
import { baseUrl, send } from './send'

const person = { 'User-Agent': 'Mozilla/5.0 (X11; Linux x86_64) Chrome/150.0.0.0', Accept: 'text/html' }
const fromHere = { Origin: baseUrl, 'Content-Type': 'application/x-www-form-urlencoded' }

test('health tells that the process reaches its database', async () => {
  const { status, text, headers } = await send('/health')
  expect({ status, text }).toEqual({ status: 200, text: '{"ok":true}' })
  expect(headers['cache-control']).toBe('no-store')
})

test('a server that takes requests says that it is ready', async () => {
  expect(await send('/ready')).toMatchObject({ status: 200, text: '{"ok":true}' })
})

describe('every answer protects its reader', () => {
  const paths = ['/', '/health', '/ready', '/robots.txt', '/no-such-page', '/assets/no-such-file.js']
  it.each(paths)('%s', async (path) => {
    const { headers } = await send(path, { headers: person })
    expect(headers['x-content-type-options']).toBe('nosniff')
    expect(headers['referrer-policy']).toBe('same-origin')
    expect(headers['permissions-policy']).toBe(
      'geolocation=(self), camera=(self), microphone=(self), screen-wake-lock=(self)',
    )
    expect(headers['content-security-policy']).toMatch(/frame-ancestors 'none'/)
    expect(headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/)
    expect(headers['x-powered-by']).toBeUndefined()
  })
})

describe('the content security policy', () => {
  const directives = (policy: unknown) =>
    Object.fromEntries(
      String(policy)
        .split('; ')
        .map((directive) => [directive.split(' ')[0]!, directive.split(' ').slice(1)]),
    )
  const nonceOf = (policy: unknown) => /'nonce-([^']+)'/.exec(String(policy))![1]!

  it('lets no script run that it does not name', async () => {
    const { headers, text } = await send('/', { headers: person })
    const nonce = nonceOf(headers['content-security-policy'])
    const policy = directives(headers['content-security-policy'])
    expect(policy['script-src']).toEqual(["'self'", `'nonce-${nonce}'`])
    expect(policy['style-src']).toEqual(["'self'", `'nonce-${nonce}'`])
    expect(policy['style-src-attr']).toEqual(["'unsafe-inline'"])
    for (const name of ['img-src', 'media-src', 'worker-src']) expect(policy[name]).toContain('blob:')
    const scripts = [...text.matchAll(/<script([^>]*)>/g)].map(([, attributes]) => attributes!)
    expect(scripts.length).toBeGreaterThan(2)
    expect(scripts.filter((attributes) => !attributes.includes(`nonce="${nonce}"`))).toEqual([])
    expect(text).not.toMatch(/<style(?![^>]*nonce)|\son\w+="/)
  })

  it('has another nonce for each answer', async () => {
    const [first, second] = await Promise.all([send('/'), send('/')])
    expect(nonceOf(first.headers['content-security-policy'])).not.toBe(
      nonceOf(second.headers['content-security-policy']),
    )
  })
})

describe('what changes something must come from a page of this server', () => {
  const post = (headers: Record<string, string>, path = '/sign-in') =>
    send(path, { method: 'POST', headers, body: 'a=1' })

  it.each([
    ['another site', { Origin: 'https://elsewhere.example' }],
    ['a sandboxed page', { Origin: 'null' }],
    ['nowhere', {}],
    ['a neighbour', { 'Sec-Fetch-Site': 'same-site' }],
    [
      'another site that also says it is this one',
      { Origin: 'https://elsewhere.example', 'Sec-Fetch-Site': 'same-origin' },
    ],
  ])('not from %s', async (_from, headers) => {
    expect((await post(headers)).status).toBe(403)
    expect((await post(headers, '/health')).status).toBe(403)
    expect((await send('/sign-in', { method: 'DELETE', headers })).status).toBe(403)
  })

  it.each([
    ['by Origin', { Origin: baseUrl }],
    ['by Sec-Fetch-Site', { 'Sec-Fetch-Site': 'same-origin' }],
  ])('told %s', async (_by, headers) => {
    expect((await post(headers)).status).not.toBe(403)
  })
})

describe('a body', () => {
  const megabyte = 1_000_000
  const piece = Buffer.alloc(100_000, 'a')
  const pieces = (count: number) => Array.from({ length: count }, () => piece)
  const upload = '/teams/lanternside/circuits/import'

  it('of more than 1 MB is refused by its length', async () => {
    const answer = await send('/sign-in', { method: 'POST', headers: fromHere, body: Buffer.alloc(megabyte + 1, 'a') })
    expect(answer.status).toBe(413)
    expect(answer.text).toMatch('More than 1\u00a0MB')
  })

  it('of more than 1 MB is refused also where it does not tell its length', async () => {
    const answer = await send('/sign-in', { method: 'POST', headers: fromHere, pieces: pieces(11) })
    expect(answer.status).toBe(413)
  })

  it('of just less goes through', async () => {
    const whole = await send('/sign-in', { method: 'POST', headers: fromHere, body: Buffer.alloc(megabyte, 'a') })
    const piecewise = await send('/sign-in', { method: 'POST', headers: fromHere, pieces: pieces(10) })
    expect([whole.status, piecewise.status]).not.toContain(413)
  })

  it.each(['', '.data'])('may be 21 MB where circuits are imported%s', async (form) => {
    const headers = { ...fromHere, 'Content-Type': 'application/octet-stream' }
    const small = await send(upload + form, { method: 'POST', headers, body: Buffer.alloc(2 * megabyte) })
    expect(small.status).not.toBe(413)
    const large = await send(upload + form, { method: 'POST', headers, body: Buffer.alloc(21 * megabyte + 1) })
    expect(large.status).toBe(413)
  })

  it.each([
    ['that is no form', 'application/octet-stream', 'a'],
    ['whose parts have no border', 'multipart/form-data', 'a'],
    [
      'that ends too early',
      'multipart/form-data; boundary=b',
      '--b\r\nContent-Disposition: form-data; name="email"\r\n\r\na',
    ],
  ])('%s is a wrong request, not a broken server', async (_what, type, body) => {
    const answer = await send('/sign-in', { method: 'POST', headers: { ...fromHere, 'Content-Type': type }, body })
    expect(answer.status).toBe(400)
    expect(answer.text).toMatch('The form did not arrive whole.')
  })

  it.each(['email[30000000]=a', '__proto__.email=a', '__state__={', `email=a${'&email=a'.repeat(2500)}`])(
    'of fields that no page sends is a wrong request: %.20s',
    async (body) => {
      const answer = await send('/sign-in', { method: 'POST', headers: fromHere, body })
      expect(answer.status).toBe(400)
      expect(answer.text).toMatch('The form did not arrive whole.')
      expect(answer.text.length).toBeLessThan(20_000)
    },
  )

  it.each([
    ['with its length', { body: '' }],
    ['without its length', { pieces: [] }],
  ])('that is empty is answered, told %s', async (_told, nothing) => {
    expect((await send('/sign-in', { method: 'POST', headers: fromHere, ...nothing })).status).toBe(400)
  })

  it('that nobody reads does not hold up the next request on its connection', async () => {
    const agent = new Agent({ keepAlive: true, maxSockets: 1 })
    const large = { method: 'POST', headers: fromHere, body: Buffer.alloc(900_000, 'a'), agent }
    const answers = await Promise.all([send('/health', large), send('/health', large), send('/health', { agent })])
    agent.destroy()
    expect(answers[2].status).toBe(200)
  })

  it('that is refused leaves the server answering', async () => {
    await Promise.allSettled(
      Array.from({ length: 5 }, () => send('/sign-in', { method: 'POST', headers: fromHere, pieces: pieces(30) })),
    )
    expect((await send('/health')).status).toBe(200)
  })
})

describe('files', () => {
  it('with a hash in their name are kept for good', async () => {
    const { text } = await send('/', { headers: person })
    const script = /"(\/assets\/entry\.client-[^"]+\.js)"/.exec(text)![1]!
    const { status, headers } = await send(script)
    expect(status).toBe(200)
    expect(headers['cache-control']).toBe('public, max-age=31536000, immutable')
  })

  it('of another build are missing, plainly', async () => {
    const { status, headers } = await send('/assets/entry.client-gone.js')
    expect(status).toBe(404)
    expect(headers['content-type']).toMatch('text/plain')
  })

  it('beside the folder of files cannot be reached', async () => {
    for (const path of ['/assets/%2e%2e/%2e%2e/server/index.js', '/%2e%2e/server/index.js', '/.vite/manifest.json']) {
      expect((await send(path)).status).toBeGreaterThanOrEqual(400)
    }
  })
})

describe('a page', () => {
  it('is not kept by anyone', async () => {
    expect((await send('/', { headers: person })).headers['cache-control']).toBe('no-store')
    expect((await send('/no-such-page', { headers: person })).headers['cache-control']).toBe('no-store')
  })

  it('that does not exist says so', async () => {
    expect((await send('/no-such-page', { headers: person })).status).toBe(404)
  })

  it('is sent compressed where the reader takes it', async () => {
    expect((await send('/', { headers: { ...person, 'Accept-Encoding': 'gzip' } })).headers['content-encoding']).toBe(
      'gzip',
    )
  })

  it('at a broken address is a wrong request, not a broken server', async () => {
    expect((await send('/%c0%af')).status).toBeLessThan(500)
    expect((await send('/', { headers: { Host: 'a b' } })).status).toBe(400)
    for (const path of ['/teams/%00', '/teams/a%00.data', '/sign-in?next=%00']) {
      expect((await send(path, { headers: person })).status, path).toBe(400)
    }
  })

  it('answers HEAD as GET without the page', async () => {
    const { status, text, headers } = await send('/', { method: 'HEAD', headers: person })
    expect({ status, text }).toEqual({ status: 200, text: '' })
    expect(headers['content-type']).toMatch('text/html')
  })
})

describe('no refusal shows a trace of code', () => {
  const large = Buffer.alloc(1_000_001, 'a')
  const json = { Origin: baseUrl, 'Content-Type': 'application/json' }
  it.each([
    ['a page that is missing', 404, '/no-such-page', { headers: person }],
    ['its data', 404, '/no-such-page.data', { headers: person }],
    ['a file that is missing', 404, '/assets/none.js', {}],
    ['a broken address', 400, '/teams/%00', { headers: person }],
    ['a form from elsewhere', 403, '/sign-in', { method: 'POST', body: 'a=1' }],
    ['a body too large', 413, '/sign-in', { method: 'POST', headers: fromHere, body: large }],
    ['a form that is none', 400, '/sign-in', { method: 'POST', headers: json, body: '{' }],
    ['the same for its data', 400, '/sign-in.data', { method: 'POST', headers: json, body: '{' }],
    ['a page that takes no form', 405, '/', { method: 'POST', headers: fromHere, body: 'a=1' }],
    ['a method that nobody knows', 405, '/sign-in', { method: 'PROPFIND', headers: fromHere }],
  ])('%s', async (_what, status, path, request) => {
    const answer = await send(path, request)
    expect(answer.status).toBe(status)
    expect(answer.text).not.toMatch(/\bat .+\.(js|ts|tsx):\d+|node_modules|file:\/\//)
  })
})

import { createServer, type Server } from 'node:http'
import { connect } from 'node:net'
import { afterEach, describe, expect, it } from 'vitest'
import { freePort, type OwnServer, startServer } from './own-server'
import { send } from './send'

const running: OwnServer[] = []

async function start(settings?: Record<string, string>) {
  const server = await startServer(settings)
  running.push(server)
  return server
}

afterEach(async () => {
  for (const server of running.splice(0)) {
    server.process.kill('SIGKILL')
    await server.ended
  }
})

describe('a server told to stop', () => {
  it.each(['SIGTERM', 'SIGINT'] as const)('by %s ends in order', async (signal) => {
    const server = await start()
    expect((await send('/health', {}, server.baseUrl)).status).toBe(200)
    server.process.kill(signal)
    expect(await server.ended).toBe(0)
    expect(server.output()).toMatch('"msg":"stopped"')
  })

  it('ends when the process that started it is gone', async () => {
    const server = await start()
    server.process.disconnect()
    expect(await server.ended).toBe(0)
  })

  it('finishes what is under way, says it is not ready, takes nothing new', async () => {
    const server = await start()
    const { port } = new URL(server.baseUrl)
    const socket = connect(Number(port), '127.0.0.1')
    let heard = ''
    socket.setEncoding('utf8').on('data', (text: string) => {
      heard += text
    })
    const closed = new Promise((done) => socket.once('close', done))
    await new Promise((done) => socket.write('GET /ready HTTP/1.1\r\nHost: a\r\n', done))
    await send('/health', {}, server.baseUrl)
    server.process.kill('SIGTERM')
    await expect
      .poll(() => send('/health', {}, server.baseUrl).catch((error: Error) => error.message))
      .toMatch('ECONNREFUSED')
    socket.write('\r\n')
    await closed
    expect(heard).toMatch(/^HTTP\/1\.1 503 /)
    expect(heard).toMatch('{"ok":false}')
    expect(await server.ended).toBe(0)
  })
})

describe('a server that cannot start', () => {
  it('says in one line that its port is in use', async () => {
    const port = await freePort()
    const other = await new Promise<Server>((done) => {
      const server = createServer().listen(port, () => done(server))
    })
    const server = await start({ PORT: String(port), LOG_LEVEL: 'silent' })
    expect(await server.ended).toBe(1)
    expect(server.output()).toBe(`Port ${port} is in use by another program. Choose another with PORT.\n`)
    await new Promise((done) => other.close(done))
  })

  it('names the settings that are missing or wrong, not their values', async () => {
    const server = await start({ DATABASE_URL: 'secret-place', TRUST_PROXY_HOPS: 'many' })
    expect(await server.ended).toBe(1)
    expect(server.output()).toMatch('DATABASE_URL, TRUST_PROXY_HOPS')
    expect(server.output()).not.toMatch('secret-place')
  })
})

describe('a server without its database', () => {
  it('answers and says that it is not well', async () => {
    const server = await start({ DATABASE_URL: `postgres://nobody:x@127.0.0.1:${await freePort()}/none` })
    expect(await send('/health', {}, server.baseUrl)).toMatchObject({ status: 503, text: '{"ok":false}' })
    expect(await send('/ready', {}, server.baseUrl)).toMatchObject({ status: 503, text: '{"ok":false}' })
    expect((await send('/assets/none.js', {}, server.baseUrl)).status).toBe(404)
  })
})

describe('behind a proxy that ends TLS', () => {
  const publicUrl = 'https://book.lanternside.example'
  const settings = { PUBLIC_URL: publicUrl, TRUST_PROXY_HOPS: '1' }
  const proxied = { Host: 'book.lanternside.example', 'X-Forwarded-Proto': 'https', 'X-Forwarded-For': '192.0.2.7' }
  const form = { 'Content-Type': 'application/x-www-form-urlencoded', Origin: publicUrl }

  it('forms of the public address are taken, and the browser is told to stay with TLS', async () => {
    const { baseUrl } = await start(settings)
    const answer = await send(
      '/sign-in',
      { method: 'POST', headers: { ...proxied, ...form }, body: 'email=a' },
      baseUrl,
    )
    expect(answer.text).toMatch('name="password"')
    expect(answer.headers['strict-transport-security']).toBe('max-age=31536000; includeSubDomains')
  })

  it('forms are taken also where the proxy does not pass the name on', async () => {
    const { baseUrl } = await start(settings)
    const headers = { 'X-Forwarded-Proto': 'https', ...form }
    const answer = await send('/sign-in', { method: 'POST', headers, body: 'email=a' }, baseUrl)
    expect(answer.text).toMatch('name="password"')
  })

  it('a server on plain HTTP does not tell browsers to use TLS', async () => {
    const { baseUrl } = await start()
    expect((await send('/health', {}, baseUrl)).headers['strict-transport-security']).toBeUndefined()
  })
})

describe('the log', () => {
  it('holds route, status and duration, and nothing that a person sent', async () => {
    const server = await start()
    const headers = {
      Cookie: 'a=hidden-cookie',
      'Content-Type': 'application/x-www-form-urlencoded',
      Origin: server.baseUrl,
    }
    await send('/teams/hidden-team?q=hidden-query', { headers }, server.baseUrl)
    const body = 'email=hidden%40lanternside.example&password=hidden-password'
    await send('/sign-in?next=/hidden-next', { method: 'POST', headers, body }, server.baseUrl)
    server.process.kill('SIGTERM')
    await server.ended
    const lines = server
      .output()
      .trim()
      .split('\n')
      .map((line) => JSON.parse(line))
    const answered = lines.filter(({ msg }) => msg === 'answered')
    expect(answered.map(({ pattern }) => pattern)).toEqual(['/teams/:team', '/sign-in'])
    for (const line of answered) {
      expect(Object.keys(line).sort()).toEqual([
        'level',
        'method',
        'ms',
        'msg',
        'pattern',
        'requestId',
        'status',
        'time',
      ])
    }
    expect(server.output()).not.toMatch('hidden')
  })
})

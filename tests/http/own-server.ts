import { type ChildProcess, spawn } from 'node:child_process'
import { createServer } from 'node:net'
import { resolve } from 'node:path'

const root = resolve(import.meta.dirname, '../..')

/** A port of the loopback address that nothing uses now. */
export function freePort(): Promise<number> {
  return new Promise((done, fail) => {
    const server = createServer().once('error', fail)
    server.listen(0, '127.0.0.1', () => {
      const address = server.address()
      server.close(() => done(typeof address === 'object' && address ? address.port : 0))
    })
  })
}

export type OwnServer = {
  process: ChildProcess
  baseUrl: string
  /** What it has written so far. */
  output: () => string
  /** Its exit code, once it has ended. */
  ended: Promise<number | null>
}

/** Starts the built server on its own port with settings of its own, and waits until it listens or ends. */
export async function startServer(settings: Record<string, string> = {}): Promise<OwnServer> {
  const port = Number(settings.PORT ?? (await freePort()))
  const child = spawn(process.execPath, ['build/server/index.js'], {
    cwd: root,
    env: {
      PATH: process.env.PATH,
      NODE_ENV: 'production',
      DATABASE_URL: process.env.TEST_DATABASE_URL,
      ...settings,
      PORT: String(port),
    },
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  })
  let output = ''
  for (const stream of [child.stdout, child.stderr]) {
    stream?.setEncoding('utf8').on('data', (text: string) => {
      output += text
    })
  }
  const ended = new Promise<number | null>((done) => child.once('exit', done))
  const listening = new Promise<void>((done) => child.once('message', () => done()))
  await Promise.race([ended, listening])
  return { process: child, baseUrl: `http://127.0.0.1:${port}`, output: () => output, ended }
}

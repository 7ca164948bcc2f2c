import { type ChildProcess, fork } from 'node:child_process'
import { once } from 'node:events'
import { createServer } from 'node:net'

/** A web server in a process of its own. */
export interface WebServer {
  url: string
  stop(): Promise<void>
}

/** The app as it is built, on a free port. */
export async function serveApp(databaseUrl: string): Promise<WebServer> {
  const port = await freePort()
  const url = `http://localhost:${port}`
  const child = start('build/server/index.js', {
    DATABASE_URL: databaseUrl,
    LOG_LEVEL: 'warn',
    PORT: String(port),
    PUBLIC_URL: url,
  })
  await told(child, (message) => message === 'listening')
  return { url, stop: () => stop(child) }
}

/** A program that tells its port once it listens. */
export async function serveProgram(program: string): Promise<WebServer> {
  const child = start(program, {})
  const port = await told(child, (message) => typeof message === 'number')
  return { url: `http://127.0.0.1:${port}`, stop: () => stop(child) }
}

const start = (program: string, env: Record<string, string>) =>
  fork(program, {
    env: { ...process.env, ...env, NODE_ENV: 'production' },
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
  })

function told(child: ChildProcess, isIt: (message: unknown) => boolean): Promise<unknown> {
  return new Promise((resolve, reject) => {
    child.on('message', (message) => isIt(message) && resolve(message))
    child.once('exit', (code) => reject(new Error(`the server ended with ${code} before it listened`)))
  })
}

async function stop(child: ChildProcess) {
  if (child.exitCode !== null) return
  child.removeAllListeners('exit')
  const ended = once(child, 'exit')
  child.kill('SIGTERM')
  await ended
}

async function freePort(): Promise<number> {
  const server = createServer()
  server.listen(0, '127.0.0.1')
  await once(server, 'listening')
  const address = server.address()
  server.close()
  await once(server, 'close')
  if (typeof address !== 'object' || !address) throw new Error('no free port')
  return address.port
}

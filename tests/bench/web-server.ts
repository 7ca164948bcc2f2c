import { fork } from 'node:child_process'
import { once } from 'node:events'
import { freePort, startServer } from '../http/own-server'

/** A web server in a process of its own. */
export interface WebServer {
  url: string
  stop(): Promise<void>
}

/** The app as it is built, on a free port. */
export async function serveApp(databaseUrl: string): Promise<WebServer> {
  const port = String(await freePort())
  const url = `http://localhost:${port}`
  const settings = { DATABASE_URL: databaseUrl, LOG_LEVEL: 'warn', PORT: port, PUBLIC_URL: url }
  const server = await startServer(settings)
  if (server.process.exitCode !== null) throw new Error(`the server did not start: ${server.output()}`)
  return {
    url,
    async stop() {
      server.process.kill('SIGTERM')
      await server.ended
    },
  }
}

/** A program that tells its port once it listens. */
export async function serveProgram(program: string): Promise<WebServer> {
  const child = fork(program, { env: { ...process.env, NODE_ENV: 'production' } })
  const [port] = await once(child, 'message')
  return {
    url: `http://127.0.0.1:${port}`,
    async stop() {
      const ended = once(child, 'exit')
      child.kill('SIGTERM')
      await ended
    },
  }
}

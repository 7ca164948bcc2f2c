import type { Server } from 'node:http'
import type { Express } from 'express'
import type { Logger } from 'pino'

/** Milliseconds that open requests have after the server was told to stop. */
const patience = 10_000

type Options = {
  port: number
  /** Address to listen on; all of them when absent. */
  host?: string | undefined
  log: Logger
  /** Called at once when the server is told to stop. */
  onStop: () => void
  /** Frees what the process holds, once the last request has ended. */
  release: () => Promise<void>
}

const startFailures: Record<string, (port: number) => string> = {
  EADDRINUSE: (port) => `Port ${port} is in use by another program. Choose another with PORT.`,
  EACCES: (port) => `Port ${port} needs rights that this process lacks. Choose another with PORT.`,
  EADDRNOTAVAIL: () => 'HOST is not an address of this machine.',
}

function closed(server: Server): Promise<void> {
  return new Promise((resolve) => server.close(() => resolve()))
}

/**
 * Listens, and stops in order on SIGTERM, SIGINT or when the process that started this one is gone: no new connections,
 * 10 s for what is under way, then `release`, then exit 0. A second signal ends the process at once. A process that
 * started this one over a channel is told `listening`.
 */
export function listen(app: Express, { port, host, log, onStop, release }: Options): Server {
  const server = host ? app.listen(port, host) : app.listen(port)
  server.on('listening', () => {
    log.info({ port }, 'listening')
    process.send?.('listening')
  })
  server.on('error', (error: NodeJS.ErrnoException) => {
    const say = startFailures[error.code ?? '']
    process.stderr.write(`${say ? say(port) : error.message}\n`)
    process.exit(1)
  })
  let stopping = false
  const stop = async () => {
    if (stopping) process.exit(1)
    stopping = true
    onStop()
    const timer = setTimeout(() => server.closeAllConnections(), patience)
    await closed(server)
    clearTimeout(timer)
    await release()
    log.info('stopped')
    process.exit(0)
  }
  process.on('SIGTERM', stop).on('SIGINT', stop)
  process.once('disconnect', () => stopping || stop())
  return server
}

import type { ErrorRequestHandler } from 'express'
import type { Logger } from 'pino'
import { errorEntry } from '~/error-entry.server'

const badAddress = 400
const internal = 500

function statusOf(error: unknown): number {
  if (error instanceof URIError) return badAddress
  const { status, code } = error as { status?: unknown; code?: unknown }
  if (code === 'ERR_INVALID_URL') return badAddress
  return typeof status === 'number' && status >= 400 && status < 500 ? status : internal
}

/** Answers what failed outside React Router: a status and one line, never the error. */
export function lastResort(log: Logger): ErrorRequestHandler {
  return (error, _request, response, next) => {
    const status = statusOf(error)
    if (status === internal) log.error({ requestId: response.locals.requestId, ...errorEntry(error) }, 'failed')
    if (response.headersSent) return next(error)
    response.status(status).type('text/plain')
    response.send(status === internal ? 'The server failed.\n' : 'The server does not understand this address.\n')
  }
}

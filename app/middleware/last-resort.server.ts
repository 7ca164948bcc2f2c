import type { ErrorRequestHandler } from 'express'
import type { Logger } from 'pino'
import { errorEntry } from '~/error-entry.server'
import { sendProblem } from '~/middleware/send-problem.server'

/** Whether the sender is to blame: an address that cannot be read, or what a part of the server calls a wrong request. */
function isSendersFault(error: unknown): boolean {
  const { status, code } = error as { status?: unknown; code?: unknown }
  if (error instanceof URIError || code === 'ERR_INVALID_URL') return true
  return typeof status === 'number' && status >= 400 && status < 500
}

/** Answers what failed outside React Router: a status and one line, never the error. */
export function lastResort(log: Logger): ErrorRequestHandler {
  return (error, _request, response, next) => {
    const sendersFault = isSendersFault(error)
    if (!sendersFault) log.error({ requestId: response.locals.requestId, ...errorEntry(error) }, 'failed')
    if (response.headersSent) return next(error)
    sendProblem(response, sendersFault ? 'address' : 'failed')
  }
}

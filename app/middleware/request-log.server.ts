import type { RequestHandler } from 'express'
import type { Logger } from 'pino'

declare global {
  namespace Express {
    interface Locals {
      /** Pattern of the matched route, where React Router answered. */
      pattern?: string
    }
  }
}

/** Logs one line an answer: request id, route pattern, method, status, duration. Never the URL, a header or a body. */
export function requestLog(log: Logger): RequestHandler {
  return (request, response, next) => {
    const from = process.hrtime.bigint()
    response.once('close', () => {
      const { requestId, pattern } = response.locals
      const ms = Number((process.hrtime.bigint() - from) / 10_000n) / 100
      const entry = { requestId, method: request.method, pattern, status: response.statusCode, ms }
      if (response.writableFinished) log.info(entry, 'answered')
      else log.info(entry, 'gone before the answer ended')
    })
    next()
  }
}

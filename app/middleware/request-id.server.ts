import { randomUUID } from 'node:crypto'
import type { RequestHandler } from 'express'

declare global {
  namespace Express {
    interface Locals {
      requestId: string
    }
  }
}

/** Names the request: `res.locals.requestId`, and `X-Request-Id` on the answer. */
export const requestId: RequestHandler = (_request, response, next) => {
  response.locals.requestId = randomUUID()
  response.set('X-Request-Id', response.locals.requestId)
  next()
}

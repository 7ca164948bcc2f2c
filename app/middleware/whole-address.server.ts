import type { RequestHandler } from 'express'
import { sendProblem } from '~/middleware/send-problem.server'

/** Refuses with 400 an address that holds a NUL: nothing has such a name, and no database can be asked for it. */
export const wholeAddress: RequestHandler = (request, response, next) => {
  if (request.url.includes('%00')) return sendProblem(response, 'address')
  next()
}

import type { Response } from 'express'
import { type Params, type ProblemCode, problem } from '~/words/problems'

/** Ends an answer outside the pages: the problem's status and its words as plain text. */
export function sendProblem(response: Response, code: ProblemCode, params?: Params): void {
  const { status, title, text } = problem(code, params)
  response.status(status).type('text/plain').send(`${title} ${text}\n`)
}

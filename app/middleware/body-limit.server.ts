import type { Request, RequestHandler, Response } from 'express'
import { sendProblem } from '~/middleware/send-problem.server'

const megabyte = 1_000_000

/** Bytes that a request may carry, unless its path is named in `largeBodies`. */
const bodyLimit = megabyte

/** Paths that take files, with their limits in bytes; the `.data` form is the one a page's script calls. */
const largeBodies: { path: RegExp; limit: number }[] = [
  { path: /^\/teams\/[^/]+\/circuits\/import(\.data)?$/, limit: 21 * megabyte },
]

/** Bytes above the limit that are read and thrown away, so that the sender comes to read the refusal. */
const drained = 64 * megabyte

/** What the reader of a body meets when the body turns out larger than allowed. The answer is already sent. */
export class BodyTooLarge extends Error {
  override name = 'BodyTooLarge'
}

/** Limit in bytes for the body of a request to this path. */
export function limitFor(path: string): number {
  return largeBodies.find((route) => route.path.test(path))?.limit ?? bodyLimit
}

/** Reads the rest of a body away; a sender without end is cut off. */
function drain(request: Request) {
  let seen = 0
  request.on('data', (chunk: Buffer) => {
    seen += chunk.length
    if (seen > drained) request.destroy()
  })
  request.resume()
}

function refuse(response: Response, limit: number) {
  if (!response.headersSent) sendProblem(response, 'too-much', { megabytes: limit / megabyte })
}

/** Lets the body pass and counts it. What listens to the body hears an error in place of the byte that is too much. */
function countBody(request: Request, response: Response, limit: number) {
  let seen = 0
  const count = (chunk: Buffer) => {
    seen += chunk.length
    if (seen <= limit) return
    request.off('data', count)
    refuse(response, limit)
    drain(request)
    if (request.listenerCount('error') > 0) request.emit('error', new BodyTooLarge())
  }
  // Paused first: a listener alone would let the body run off before its reader is there.
  request.pause()
  request.on('data', count)
  // A body that its reader left half read would block the connection for the next request.
  response.once('finish', () => {
    if (request.readableEnded) return
    request.removeAllListeners('data')
    drain(request)
  })
}

/**
 * Refuses a body above the limit of its path with 413: by `Content-Length` before anything reads it, else as soon as that
 * many bytes have come. Stands before anything that reads a body.
 */
export const limitBody: RequestHandler = (request, response, next) => {
  if (request.method === 'GET' || request.method === 'HEAD') return next()
  const limit = limitFor(request.path)
  if (Number(request.headers['content-length'] ?? 0) > limit) {
    request.once('end', () => refuse(response, limit))
    return drain(request)
  }
  countBody(request, response, limit)
  next()
}

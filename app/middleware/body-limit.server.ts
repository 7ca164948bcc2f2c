import type { Request, RequestHandler, Response } from 'express'

const megabyte = 1_000_000

/** Bytes that a request may carry, unless its path is named in `largeBodies`. */
export const bodyLimit = megabyte

/** Paths that take files, with their limits in bytes; the `.data` form is the one a page's script calls. */
const largeBodies: { path: RegExp; limit: number }[] = [
  { path: /^\/teams\/[^/]+\/circuits\/import(\.data)?$/, limit: 21 * megabyte },
]

/** Bytes read on and thrown away after a refusal, so that the sender comes to read the answer. */
const drained = 64 * megabyte

/** What the reader of a body meets when the body turns out larger than allowed. The answer is already sent. */
export class BodyTooLarge extends Error {
  override name = 'BodyTooLarge'
}

/** Limit in bytes for the body of a request to this path. */
export function limitFor(path: string): number {
  return largeBodies.find((route) => route.path.test(path))?.limit ?? bodyLimit
}

function refuse(response: Response, limit: number) {
  response.set('Connection', 'close').status(413).type('text/plain')
  response.send(`More than ${limit / megabyte} MB was sent. Nothing of it was kept.\n`)
}

function countBody(request: Request, response: Response, limit: number) {
  let seen = 0
  let refused = false
  request.on('data', (chunk: Buffer) => {
    seen += chunk.length
    if (seen > limit + drained) request.destroy()
    if (refused || seen <= limit) return
    refused = true
    if (!response.headersSent) refuse(response, limit)
    if (request.listenerCount('error') > 0) request.emit('error', new BodyTooLarge())
    request.resume()
  })
  request.pause()
}

/**
 * Refuses a body above the limit of its path with 413: at once when `Content-Length` says so, else as soon as that many
 * bytes have come. Stands before anything that reads a body.
 */
export const limitBody: RequestHandler = (request, response, next) => {
  const limit = limitFor(request.path)
  const refusedAtOnce = Number(request.headers['content-length'] ?? 0) > limit
  if (request.method === 'GET' || request.method === 'HEAD') return next()
  countBody(request, response, refusedAtOnce ? 0 : limit)
  if (!refusedAtOnce) return next()
  refuse(response, limit)
  request.resume()
}

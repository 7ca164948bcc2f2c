import type { IncomingHttpHeaders } from 'node:http'
import type { RequestHandler } from 'express'
import { sendProblem } from '~/middleware/send-problem.server'

const reading = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Whether a request that may change something comes from a page of this server: by `Origin` where the browser sends
 * it, else by `Sec-Fetch-Site`. A request with neither header is not from such a page.
 */
export function isSameOrigin(headers: IncomingHttpHeaders, ownOrigins: readonly string[]): boolean {
  if (headers.origin !== undefined) return ownOrigins.includes(headers.origin)
  return headers['sec-fetch-site'] === 'same-origin'
}

/** Refuses with 403 every request that is not GET, HEAD or OPTIONS and does not come from a page of this server. */
export function sameOrigin(publicUrl: string): RequestHandler {
  return (request, response, next) => {
    const own = [publicUrl, `${request.protocol}://${request.get('host')}`]
    if (reading.has(request.method) || isSameOrigin(request.headers, own)) return next()
    sendProblem(response, 'other-site')
  }
}

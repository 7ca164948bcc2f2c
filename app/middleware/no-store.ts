import type { MiddlewareFunction } from 'react-router'

/** Answers are not cached anywhere unless a route says otherwise. */
export const noStore: MiddlewareFunction<Response> = async (_args, next) => {
  const response = await next()
  if (response.headers.has('Cache-Control')) return response
  const headers = new Headers(response.headers)
  headers.set('Cache-Control', 'no-store')
  return new Response(response.body, { status: response.status, statusText: response.statusText, headers })
}

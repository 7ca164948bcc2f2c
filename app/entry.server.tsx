import { PassThrough } from 'node:stream'
import { createReadableStreamFromReadable } from '@react-router/node'
import { isbot } from 'isbot'
import { renderToPipeableStream } from 'react-dom/server'
import {
  type EntryContext,
  type HandleErrorFunction,
  isRouteErrorResponse,
  type RouterContextProvider,
  ServerRouter,
} from 'react-router'
import { GeometryContext } from '~/components/geometry/geometry-store'
import { NonceContext } from '~/components/nonce'
import { errorEntry } from '~/error-entry.server'
import { log } from '~/log.server'
import { BodyTooLarge } from '~/middleware/body-limit.server'
import { nonceContext, requestIdContext } from '~/middleware/context'
import { geometryContext, serverStore } from '~/middleware/geometry.server'

/** Milliseconds after which loaders still waiting in a document are given up. */
export const streamTimeout = 5_000

/** Milliseconds that the render has for sending those refusals. */
const grace = 1_000

/** Bytes from which a part that is ready is sent after the page around it: none, so that drawings show without JavaScript. */
const progressiveChunkSize = Number.POSITIVE_INFINITY

/** The only reporter of errors. Answers a route threw on purpose and requests given up by their sender are none. */
export const handleError: HandleErrorFunction = (error, { request, context }) => {
  if (request.signal.aborted || isRouteErrorResponse(error) || error instanceof BodyTooLarge) return
  log.error({ requestId: context.get(requestIdContext), ...errorEntry(error) }, 'failed')
}

/** Renders a document: as a stream for people, whole for crawlers and for the shell kept on phones. */
export default function handleRequest(
  request: Request,
  status: number,
  headers: Headers,
  routerContext: EntryContext,
  context: RouterContextProvider,
) {
  headers.set('Content-Type', 'text/html; charset=utf-8')
  if (!headers.has('Cache-Control')) headers.set('Cache-Control', 'no-store')
  if (request.method === 'HEAD') return new Response(null, { status, headers })
  const nonce = context.get(nonceContext)
  const whole = routerContext.isSpaMode || isbot(request.headers.get('user-agent'))
  return new Promise<Response>((resolve, reject) => {
    let begun = false
    const failures: unknown[] = []
    const report = (error: unknown) => handleError(error, { request, context, params: {} })
    const begin = () => {
      begun = true
      failures.forEach(report)
      const body = new PassThrough({
        final(done) {
          clearTimeout(timer)
          done()
        },
      })
      body.once('close', () => clearTimeout(timer))
      resolve(
        new Response(createReadableStreamFromReadable(body), { status: failures.length > 0 ? 500 : status, headers }),
      )
      pipe(body)
    }
    const { pipe, abort } = renderToPipeableStream(
      <NonceContext value={nonce}>
        <GeometryContext value={serverStore(context.get(geometryContext))}>
          <ServerRouter context={routerContext} url={request.url} nonce={nonce} />
        </GeometryContext>
      </NonceContext>,
      {
        nonce,
        progressiveChunkSize,
        [whole ? 'onAllReady' : 'onShellReady']: begin,
        onShellError(error: unknown) {
          clearTimeout(timer)
          reject(error)
        },
        onError(error: unknown) {
          // What keeps the document from beginning is rejected below and reported by the caller.
          if (begun) report(error)
          else failures.push(error)
        },
      },
    )
    const timer = setTimeout(abort, streamTimeout + grace)
  })
}

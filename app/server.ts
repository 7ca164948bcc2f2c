import { createRequestHandler } from '@react-router/express'
import compression from 'compression'
import express, { type Response } from 'express'
import { RouterContextProvider, type ServerBuild } from 'react-router'
import { sweepSessions } from '~/auth/sessions.server'
import { db, pool } from '~/db/client.server'
import { sweepImports } from '~/db/imports.server'
import { ping } from '~/db/ping.server'
import { env } from '~/env.server'
import { errorEntry } from '~/error-entry.server'
import { listen } from '~/listen.server'
import { log } from '~/log.server'
import { limitBody } from '~/middleware/body-limit.server'
import {
  clientAddressContext,
  dbContext,
  nonceContext,
  reportPatternContext,
  requestIdContext,
} from '~/middleware/context'
import { geometryContext, makeRequestGeometry } from '~/middleware/geometry.server'
import { lastResort } from '~/middleware/last-resort.server'
import { requestId } from '~/middleware/request-id.server'
import { requestLog } from '~/middleware/request-log.server'
import { sameOrigin } from '~/middleware/same-origin.server'
import { securityHeaders } from '~/middleware/security-headers.server'
import { staticFiles } from '~/middleware/static-files.server'
import { wholeAddress } from '~/middleware/whole-address.server'
import { startSweeps } from '~/sweeps.server'

const production = import.meta.env.PROD
let draining = false

async function pages(): Promise<ServerBuild> {
  const build = await import('virtual:react-router/server-build')
  return { ...build, allowedActionOrigins: [new URL(env.PUBLIC_URL).host] }
}

function contextOf(response: Response): RouterContextProvider {
  const context = new RouterContextProvider()
  context.set(dbContext, db)
  context.set(nonceContext, response.locals.nonce)
  context.set(requestIdContext, response.locals.requestId)
  context.set(clientAddressContext, response.req.ip ?? '')
  context.set(geometryContext, makeRequestGeometry())
  context.set(reportPatternContext, (pattern) => {
    response.locals.pattern = `/${pattern.replace(/^\//, '')}`
  })
  return context
}

async function makeHandler() {
  const mode = production ? 'production' : 'development'
  return createRequestHandler({
    build: await pages(),
    mode,
    getLoadContext: (_request, response) => contextOf(response),
  })
}

/** Made once, since making it works through all routes; in development anew for each request, as the routes may have changed. */
const handler = production ? makeHandler() : undefined

/** The web server. It holds no state: any number of processes may serve side by side. */
export const app = express()
app.disable('x-powered-by')
app.set('trust proxy', env.TRUST_PROXY_HOPS)
app.use((_request, response, next) => {
  if (draining) response.set('Connection', 'close')
  next()
})
app.use(requestId)
app.use(requestLog(log))
app.use(securityHeaders({ publicUrl: env.PUBLIC_URL, production }))
app.get('/ready', async (_request, response) => {
  const ok = !draining && (await ping())
  response
    .set('Cache-Control', 'no-store')
    .status(ok ? 200 : 503)
    .json({ ok })
})
app.use(compression())
if (production) app.use(staticFiles())
app.use(wholeAddress, sameOrigin(env.PUBLIC_URL), limitBody)
app.use(async (request, response, next) => (await (handler ?? makeHandler()))(request, response, next))
app.use(lastResort(log))

if (production) {
  const stopSweeps = startSweeps(
    [
      { name: 'drafts of imports', run: () => sweepImports(db, new Date()) },
      { name: 'sessions', run: sweepSessions },
    ],
    { onError: (sweep, error) => log.error({ sweep, ...errorEntry(error) }, 'sweep failed') },
  )
  listen(app, {
    port: env.PORT,
    host: env.HOST,
    log,
    onStop: () => {
      draining = true
    },
    release: async () => {
      await stopSweeps()
      await pool.end()
    },
  })
}

import express from 'express'
import { createServer } from 'vite'

const vite = await createServer({ server: { middlewareMode: true } })
const web = express()
web.disable('x-powered-by')
web.use(vite.middlewares)
web.use(async (request, response, next) => {
  try {
    const { app } = await vite.environments.ssr.runner.import('./app/server.ts')
    app(request, response, next)
  } catch (error) {
    next(error)
  }
})

const server = web.listen(Number(process.env.PORT), process.env.HOST || undefined, () => process.send?.('listening'))

async function stop() {
  server.close()
  server.closeAllConnections()
  await vite.close()
  process.exit(0)
}
process.once('SIGTERM', stop).once('disconnect', stop)

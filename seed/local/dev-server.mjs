import { createServer as createHttpServer } from 'node:http'
import express from 'express'
import { createServer } from 'vite'

const web = express()
const server = createHttpServer(web)
const vite = await createServer({ server: { middlewareMode: true, hmr: { server } } })
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

async function stop() {
  server.close()
  server.closeAllConnections()
  await vite.close()
  process.exit(0)
}
process.once('SIGTERM', stop).once('disconnect', stop)

server.on('error', (error) => {
  console.error(`Port ${process.env.PORT} cannot be opened: ${error.message}`)
  process.exit(1)
})
server.listen(Number(process.env.PORT), process.env.HOST || undefined, () => process.send?.('listening'))

import { createServer } from 'node:net'
import { Stop } from './steps.mjs'

function listenOnce(options) {
  return new Promise((resolve, reject) => {
    const server = createServer()
    server.once('error', reject)
    server.listen(options, () => {
      const { port } = server.address()
      server.close(() => resolve(port))
    })
  })
}

/** A port of the loopback address that nothing uses now. */
export const freePort = () => listenOnce({ port: 0, host: '127.0.0.1' })

export const isFree = (port, host) =>
  listenOnce({ port, host }).then(
    () => true,
    () => false,
  )

/** The port for the web server. @throws {Stop} when it cannot be had */
export async function webPort(command) {
  const text = process.env.PORT || '3000'
  const port = Number(text)
  if (!Number.isInteger(port) || port < 1 || port > 65_535)
    throw new Stop(`PORT must be a number from 1 to 65535, not "${text}".`)
  try {
    await listenOnce({ port, host: process.env.HOST || undefined })
  } catch (error) {
    if (error.code === 'EADDRINUSE') {
      throw new Stop(`Port ${port} is in use by another program. Choose another: PORT=${port + 1} ${command}`)
    }
    if (error.code === 'EACCES')
      throw new Stop(`Port ${port} is reserved for root. Choose another: PORT=3000 ${command}`)
    throw new Stop(`Port ${port} cannot be opened: ${error.message}`)
  }
  return port
}

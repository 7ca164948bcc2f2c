import { startProcess, untilHealthy } from './children.mjs'
import { signIns } from './demo.mjs'
import { main } from './lifetime.mjs'
import { webPort } from './ports.mjs'
import { prepare } from './prepare.mjs'
import { step } from './steps.mjs'

/** What to put into an address to reach a server that listens on HOST. */
function reachable(host) {
  if (!host || host === '0.0.0.0' || host === '::') return 'localhost'
  return host.includes(':') ? `[${host}]` : host
}

/**
 * Prepares, starts the web server, tells its address and the demo's sign-ins, and serves until it is stopped.
 *
 * @param {{ command: string, server: string[], env: Record<string, string> }} options the command's own name, the
 *   server's program for Node, and what its environment needs
 */
export function serveDemo({ command, server, env }) {
  return main(async () => {
    const port = await webPort(command)
    const prepared = await prepare()
    const web = startProcess(server, { ...prepared.env, ...env, PORT: String(port) })
    const address = `http://${reachable(process.env.HOST)}:${port}`
    await step('Web server', () => untilHealthy(address, web))
    const signingIn = prepared.password === undefined ? [] : ['Sign in as', ...signIns(prepared.password), '']
    const told = ['', `Turnstone: ${process.env.PUBLIC_URL || address}`, '', ...signingIn, 'Ctrl-C stops all of it.']
    console.log(told.join('\n'))
    return (await web.ended) || 1
  })
}

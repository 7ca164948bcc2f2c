import { startProcess, untilHealthy } from './children.mjs'
import { signIns } from './demo.mjs'
import { main } from './lifetime.mjs'
import { webPort } from './ports.mjs'
import { prepare } from './prepare.mjs'
import { step } from './steps.mjs'

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
    const host = process.env.HOST || 'localhost'
    await step('Web server', () => untilHealthy(`http://${host}:${port}`, web))
    console.log(`\nTurnstone: ${process.env.PUBLIC_URL || `http://${host}:${port}`}\n`)
    console.log(['Sign in as', ...signIns(prepared.password), '', 'Ctrl-C stops all of it.'].join('\n'))
    return (await web.ended) || 1
  })
}

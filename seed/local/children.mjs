import { spawn } from 'node:child_process'
import { openSync } from 'node:fs'
import { refuseWhenEnding } from './command.mjs'
import { atEnd } from './lifetime.mjs'
import { logFile, root } from './places.mjs'
import { Stop } from './steps.mjs'

/**
 * Starts a process that runs until this command ends. It has its own process group, so that Ctrl-C reaches this command
 * alone and the order of stopping is kept; a channel tells it when this command was killed.
 *
 * @param {string[]} command arguments for Node
 * @param {Record<string, string | undefined>} env added to this command's environment
 * @param {string} [log] name of the log file that gets its output, which else goes to this command's own
 * @returns {{ ended: Promise<number>, listening: Promise<void> }} `ended` gives the exit code; `listening` is told by
 *   the process itself
 */
export function startProcess(command, env, log) {
  refuseWhenEnding()
  const output = log ? openSync(logFile(log), 'w') : 'inherit'
  const child = spawn(process.execPath, command, {
    cwd: root,
    env: { ...process.env, ...env },
    stdio: ['ignore', output, output, 'ipc'],
    detached: true,
  })
  const ended = new Promise((resolve) => child.once('exit', (code, signal) => resolve(code ?? (signal ? 1 : 0))))
  const listening = new Promise((resolve) => child.on('message', (text) => text === 'listening' && resolve()))
  atEnd(async () => {
    if (child.exitCode === null && child.signalCode === null) child.kill('SIGTERM')
    await ended
  })
  return { ended, listening }
}

/**
 * Waits until a web server listens and its database answers.
 *
 * @throws {Stop} when it ended before, or does not answer
 */
export async function untilHealthy(address, { ended, listening }) {
  const code = await Promise.race([ended, listening])
  if (code !== undefined) throw new Stop('The web server ended before it answered.')
  const answer = await fetch(`${address}/health`, { signal: AbortSignal.timeout(30_000) })
  if (!answer.ok) throw new Stop('The web server does not reach its database.')
}

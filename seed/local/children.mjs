import { spawn } from 'node:child_process'
import { setTimeout as wait } from 'node:timers/promises'
import { atEnd } from './lifetime.mjs'
import { root } from './places.mjs'
import { Stop } from './steps.mjs'

/**
 * Starts a process that runs until this command ends. It has its own process group, so that Ctrl-C reaches this command
 * alone and the order of stopping is kept; a channel tells it when this command was killed.
 *
 * @param {string[]} command arguments for Node
 * @param {Record<string, string | undefined>} env added to this command's environment
 * @returns {{ ended: Promise<number> }} `ended` gives the exit code
 */
export function startProcess(command, env, output = 'inherit') {
  const child = spawn(process.execPath, command, {
    cwd: root,
    env: { ...process.env, ...env },
    stdio: ['ignore', output, output, 'ipc'],
    detached: true,
  })
  const ended = new Promise((resolve) => child.once('exit', (code, signal) => resolve(code ?? (signal ? 1 : 0))))
  atEnd(async () => {
    if (child.exitCode === null && child.signalCode === null) child.kill('SIGTERM')
    await ended
  })
  return { ended }
}

/** Waits until an address answers 200. @throws {Stop} when the process ended before, or after a minute */
export async function untilAnswers(address, { ended }, name) {
  let code
  ended.then((value) => {
    code = value
  })
  for (let tries = 0; tries < 600; tries += 1) {
    if (code !== undefined) throw new Stop(`The ${name} ended before it answered.`)
    if (await answers(address)) return
    await wait(100)
  }
  throw new Stop(`The ${name} does not answer.`)
}

async function answers(address) {
  try {
    return (await fetch(address, { signal: AbortSignal.timeout(5_000) })).ok
  } catch {
    return false
  }
}

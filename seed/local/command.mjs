import { spawn } from 'node:child_process'
import { createWriteStream } from 'node:fs'
import { asRoot, logFile, root } from './places.mjs'
import { knownReason, Stop } from './steps.mjs'

const kept = 200_000
const running = new Set()

let ending = false

/** Ends the commands under way; no other begins, but those that undo. */
export function endCommands() {
  ending = true
  for (const child of running) child.kill('SIGTERM')
}

/** @throws {Stop} when this command is coming to its end */
export function refuseWhenEnding() {
  if (ending) throw new Stop('Stopped.')
}

/**
 * Runs a command to its end.
 *
 * @param {string[]} command program and arguments
 * @param {{ cwd?: string, env?: Record<string, string | undefined>, input?: string, log?: string, unbroken?: boolean }} [options]
 *   `log` names the log file that gets the output; `unbroken` keeps the signals that end this command from that one
 * @returns {Promise<{ code: number | null, stdout: string, output: string }>} `output` holds both streams
 */
export function capture(command, { cwd = root, env, input, log, unbroken = false } = {}) {
  if (!unbroken) refuseWhenEnding()
  const [program, ...rest] = command
  return new Promise((resolve) => {
    const all = { ...process.env, NO_COLOR: '1', ...env }
    const child = spawn(program, rest, { cwd, env: all, stdio: 'pipe', detached: unbroken })
    const file = log ? createWriteStream(logFile(log)) : undefined
    if (!unbroken) running.add(child)
    let stdout = ''
    let output = ''
    const take = (text) => {
      output = (output + text).slice(-kept)
      file?.write(text)
    }
    const finish = (code) => {
      running.delete(child)
      file?.end()
      resolve({ code, stdout, output })
    }
    child.stdout.setEncoding('utf8').on('data', (text) => {
      stdout += text
      take(text)
    })
    child.stderr.setEncoding('utf8').on('data', take)
    child.on('error', (error) => {
      take(`${error.message}\n`)
      finish(null)
    })
    child.on('close', finish)
    child.stdin.on('error', () => undefined)
    child.stdin.end(input ?? '')
  })
}

const colours = new RegExp(`${String.fromCharCode(27)}\\[[0-9;]*m`, 'g')

const tail = (output, lines) => output.replace(colours, '').trimEnd().split('\n').slice(-lines).join('\n')

/**
 * Runs a command that must succeed.
 *
 * @param {string} failure what to say when it does not
 * @throws {Stop}
 */
export async function must(failure, command, options = {}) {
  const result = await capture(command, options)
  if (result.code === 0) return result
  const reason = knownReason(result.output)
  if (reason) throw new Stop(`${failure} ${reason}`)
  throw new Stop(failure, tail(result.output, 40))
}

/** The command as the user that owns the databases: PostgreSQL refuses root. */
export const unprivileged = (command) => (asRoot ? ['runuser', '-u', 'postgres', '--', ...command] : command)

import { spawn } from 'node:child_process'
import { createWriteStream } from 'node:fs'
import { asRoot, logFile, root } from './places.mjs'
import { knownReason, Stop } from './steps.mjs'

const kept = 200_000
const running = new Set()

/** Ends the commands under way. */
export function endCommands() {
  for (const child of running) child.kill('SIGTERM')
}

/**
 * Runs a command to its end.
 *
 * @param {string[]} command program and arguments
 * @param {{ cwd?: string, env?: Record<string, string | undefined>, input?: string, log?: string }} [options]
 *   `log` names the log file that gets the output
 * @returns {Promise<{ code: number | null, stdout: string, output: string }>} `output` holds both streams
 */
export function capture(command, { cwd = root, env, input, log } = {}) {
  const [program, ...rest] = command
  return new Promise((resolve) => {
    const child = spawn(program, rest, { cwd, env: { ...process.env, NO_COLOR: '1', ...env }, stdio: 'pipe' })
    const file = log ? createWriteStream(logFile(log)) : undefined
    running.add(child)
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

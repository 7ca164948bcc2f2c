import { linkSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { endCommands } from './command.mjs'
import { stateFolder } from './places.mjs'
import { explain } from './steps.mjs'

const undo = []
let ending

/** Registers what to do when this command ends, however it ends. Last registered, first done. */
export function atEnd(work) {
  undo.push(work)
}

/** Ends this command in order. */
export function end(code) {
  ending ??= finish(code)
  return ending
}

async function finish(code) {
  endCommands()
  let result = code
  for (const work of undo.reverse()) {
    try {
      await work()
    } catch (error) {
      explain(error)
      result ||= 1
    }
  }
  process.exit(result)
}

/** Ends this command when npm, which started it, was killed and could not pass that on. */
function endWithNpm() {
  if (!process.env.npm_lifecycle_event) return
  const npm = process.ppid
  setInterval(() => process.ppid !== npm && end(1), 500).unref()
}

/** Runs a command: signals and failures end it in order. */
export async function main(work) {
  endWithNpm()
  let signals = 0
  const signalled = (code) => () => {
    signals += 1
    if (signals > 2) process.exit(code)
    end(code)
  }
  process.on('SIGINT', signalled(130)).on('SIGTERM', signalled(143)).on('SIGHUP', signalled(129))
  try {
    const code = await work()
    if (code !== undefined) await end(code)
  } catch (error) {
    if (ending) return
    explain(error)
    await end(1)
  }
}

/** When a process started, in the kernel's ticks; undefined when none of that id runs. With the id it names a process for good. */
function startOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ')
    return fields[0] === 'Z' ? undefined : fields[19]
  } catch (error) {
    if (error.code === 'ENOENT' || error.code === 'ESRCH') return undefined
    throw error
  }
}

/** Name of a process that no later process can have. */
export const nameOf = (pid) => `${pid}-${startOf(pid)}`

/** Whether the process of this name still runs. */
export function isAlive(name) {
  const [pid, start] = name.split('-')
  return start !== undefined && startOf(pid) === start
}

const self = nameOf(process.pid)
const runs = join(stateFolder, 'runs')

/** Notes that this command uses the shared cluster, until it ends. */
export function joinRuns() {
  mkdirSync(runs, { recursive: true })
  writeFileSync(join(runs, self), '')
}

/** Strikes this command from the users of the cluster. @returns {boolean} whether it was the last one */
export function leaveRuns() {
  rmSync(join(runs, self), { force: true })
  const left = readdirSync(runs)
  for (const name of left) if (!isAlive(name)) rmSync(join(runs, name), { force: true })
  return !left.some(isAlive)
}

const lock = join(stateFolder, 'lock')

function takeLock() {
  const own = `${lock}-${self}`
  writeFileSync(own, self)
  try {
    linkSync(own, lock)
    return true
  } catch (error) {
    if (error.code !== 'EEXIST') throw error
  } finally {
    rmSync(own, { force: true })
  }
  let holder = ''
  try {
    holder = readFileSync(lock, 'utf8')
  } catch (error) {
    if (error.code !== 'ENOENT') throw error
  }
  if (holder && !isAlive(holder)) rmSync(lock, { force: true })
  return false
}

let holding = false

function releaseLock() {
  if (holding) rmSync(lock, { force: true })
  holding = false
}

/**
 * Does what only one command of this checkout may do at a time: install, build, start or stop the cluster. What this command
 * does meanwhile, its ending included, has the same right.
 */
export async function alone(work) {
  if (holding) return work()
  for (let tries = 0; !takeLock(); tries += 1) {
    if (tries === 10) console.log('Waiting for another command of this checkout to finish its preparation.')
    await wait(100)
  }
  holding = true
  atEnd(releaseLock)
  try {
    return await work()
  } finally {
    releaseLock()
  }
}

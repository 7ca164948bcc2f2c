import {
  appendFileSync,
  chmodSync,
  chownSync,
  existsSync,
  mkdirSync,
  readFileSync,
  readlinkSync,
  rmSync,
  writeFileSync,
} from 'node:fs'
import { join } from 'node:path'
import { capture, must, unprivileged } from './command.mjs'
import { asRoot } from './places.mjs'
import { freePort, isFree } from './ports.mjs'
import { newestVersion, programsOf } from './postgres-versions.mjs'
import { Stop } from './steps.mjs'

const loopback = '127.0.0.1'
const longestSocketPath = 107

async function numericId(flag) {
  const { stdout } = await must('The user postgres is missing.', ['id', flag, 'postgres'])
  return Number(stdout.trim())
}

/** Makes a folder that the user that runs PostgreSQL owns. */
async function makeOwnFolder(path) {
  mkdirSync(path, { recursive: true })
  chmodSync(path, 0o700)
  if (asRoot) chownSync(path, await numericId('-u'), await numericId('-g'))
}

const settings = (socketFolder, throwAway) =>
  [
    '',
    `listen_addresses = '${loopback}'`,
    `unix_socket_directories = '${socketFolder}'`,
    'max_connections = 60',
    ...(throwAway ? ['fsync = off', 'synchronous_commit = off', 'full_page_writes = off'] : []),
    '',
  ].join('\n')

/** A PostgreSQL cluster of one's own, on the loopback address, in a folder of one's own. */
export class Cluster {
  #folder
  #throwAway
  #starting

  /**
   * @param {string} folder where its data, socket and log are
   * @param {{ throwAway?: boolean }} [options] a throw-away cluster trades safety for speed
   */
  constructor(folder, { throwAway = false } = {}) {
    this.#folder = folder
    this.#throwAway = throwAway
    /** The port it listens on, once started. */
    this.port = 0
    /** The version of PostgreSQL, once started. */
    this.version = ''
  }

  get #data() {
    return join(this.#folder, 'data')
  }
  get #socketFolder() {
    return join(this.#folder, 'socket')
  }
  get #portFile() {
    return join(this.#folder, 'port')
  }

  #program(name) {
    const bin = programsOf(this.version)
    if (!bin) {
      throw new Stop(
        `The data are of PostgreSQL ${this.version}, which is not installed. Install it: apt-get install postgresql-${this.version}`,
      )
    }
    return join(bin, name)
  }

  async #initialise() {
    const socket = join(this.#socketFolder, '.s.PGSQL.65535')
    if (socket.length > longestSocketPath)
      throw new Stop(`The path of the database's folder is too long: ${this.#folder}`)
    await makeOwnFolder(this.#folder)
    await makeOwnFolder(this.#socketFolder)
    this.version = newestVersion()
    const fresh = join(this.#folder, 'data-in-the-making')
    rmSync(fresh, { recursive: true, force: true })
    const command = [this.#program('initdb'), '--pgdata', fresh, '--encoding=UTF8', '--locale=C.UTF-8']
    const rights = ['--auth-local=peer', '--auth-host=scram-sha-256']
    const speed = this.#throwAway ? ['--no-sync'] : []
    await must('The database cluster could not be made.', unprivileged([...command, ...rights, ...speed]), {
      cwd: '/',
      log: 'initdb',
    })
    appendFileSync(join(fresh, 'postgresql.conf'), settings(this.#socketFolder, this.#throwAway))
    await must('The database cluster could not be made.', unprivileged(['mv', fresh, this.#data]), { cwd: '/' })
  }

  /** The server process that works on these data now, whoever started it. */
  #running() {
    const file = join(this.#data, 'postmaster.pid')
    if (!existsSync(file)) return undefined
    const lines = readFileSync(file, 'utf8').split('\n')
    const pid = Number(lines[0])
    try {
      if (readlinkSync(`/proc/${pid}/cwd`) === this.#data) return { pid, port: Number(lines[3]) }
    } catch (error) {
      if (error.code !== 'ENOENT' && error.code !== 'EACCES' && error.code !== 'ESRCH') throw error
    }
    // A note of a process that is gone; its number may have gone to another one, which would keep PostgreSQL from starting.
    rmSync(file, { force: true })
    return undefined
  }

  async #answers() {
    return (await capture(this.#psql('postgres'), { cwd: '/', input: 'select 1' })).code === 0
  }

  async #choosePort() {
    const remembered = existsSync(this.#portFile) ? Number(readFileSync(this.#portFile, 'utf8')) : 0
    const port = remembered > 0 && (await isFree(remembered, loopback)) ? remembered : await freePort()
    writeFileSync(this.#portFile, `${port}\n`)
    return port
  }

  /** Starts it, makes it first where there is none, takes over one that a killed run left behind. @returns {Promise<string>} what was done */
  start() {
    this.#starting = this.#start()
    return this.#starting
  }

  async #start() {
    const made = existsSync(join(this.#data, 'PG_VERSION')) ? '' : 'made and '
    if (made) await this.#initialise()
    this.version = readFileSync(join(this.#data, 'PG_VERSION'), 'utf8').trim()
    const running = this.#running()
    if (running) {
      this.port = running.port
      if (await this.#answers()) return `found running on port ${this.port}`
      await this.#halt('immediate')
    }
    this.port = await this.#choosePort()
    const log = join(this.#folder, 'log')
    const from = existsSync(log) ? readFileSync(log, 'utf8').length : 0
    const start = [
      '--pgdata',
      this.#data,
      '--log',
      log,
      '--wait',
      '--timeout=90',
      '--options',
      `-p ${this.port}`,
      'start',
    ]
    const result = await capture(unprivileged([this.#program('pg_ctl'), ...start]), { cwd: '/', unbroken: true })
    if (result.code !== 0) this.#refused(existsSync(log) ? readFileSync(log, 'utf8').slice(from) : result.output)
    return `${made}started on port ${this.port}`
  }

  #refused(output) {
    const fatal = output.split('\n').filter((line) => /FATAL|PANIC|could not/.test(line))
    const reason = /no space left/i.test(output)
      ? 'The disk is full.'
      : (fatal.at(-1) ?? output.trim().split('\n').at(-1))
    throw new Stop(`PostgreSQL does not start: ${reason}`)
  }

  /** Stops it, if it runs; waits first until a start under way has come to its end. */
  async stop() {
    await Promise.allSettled([this.#starting])
    await this.#halt('fast')
  }

  async #halt(mode) {
    if (!this.version || !this.#running()) return
    const stop = ['--pgdata', this.#data, '--mode', mode, '--wait', '--timeout=60', 'stop']
    const command = unprivileged([this.#program('pg_ctl'), ...stop])
    await must('PostgreSQL does not stop.', command, { cwd: '/', unbroken: true })
  }

  #psql(database) {
    const address = ['--host', this.#socketFolder, '--port', String(this.port), '--dbname', database]
    const quiet = ['--no-psqlrc', '--quiet', '--tuples-only', '--no-align', '--set', 'ON_ERROR_STOP=1']
    return unprivileged([this.#program('psql'), ...address, ...quiet])
  }

  /** Runs statements as the cluster's own superuser. @returns {Promise<string>} their rows, a line each */
  async sql(database, statements) {
    const result = await must('The database could not be prepared.', this.#psql(database), {
      cwd: '/',
      input: statements,
    })
    return result.stdout.trim()
  }

  /** Stops it and removes all it holds. */
  async destroy() {
    await Promise.allSettled([this.#starting])
    if (existsSync(join(this.#data, 'PG_VERSION'))) {
      this.version ||= readFileSync(join(this.#data, 'PG_VERSION'), 'utf8').trim()
      await this.#halt('immediate')
    }
    rmSync(this.#folder, { recursive: true, force: true })
  }
}

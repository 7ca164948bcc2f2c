import { createHash } from 'node:crypto'
import { chmodSync, mkdirSync, realpathSync } from 'node:fs'
import { homedir } from 'node:os'
import { join, resolve } from 'node:path'

/** The checkout. */
export const root = realpathSync(resolve(import.meta.dirname, '../..'))

export const asRoot = process.getuid() === 0

/** Generated secrets and logs of this checkout; ignored by git. */
export const localFolder = join(root, '.local')

const checkout = createHash('sha256').update(root).digest('hex').slice(0, 10)
const states = asRoot ? '/var/lib' : (process.env.XDG_STATE_HOME ?? join(homedir(), '.local/state'))

/** Databases of this checkout. Outside it, where the unprivileged user that runs PostgreSQL can go. */
export const stateFolder = join(states, `turnstone-${checkout}`)

/** Clusters of test runs, one each. */
export const testClusters = join(stateFolder, 'tests')

export function makeFolders() {
  mkdirSync(join(localFolder, 'log'), { recursive: true })
  chmodSync(localFolder, 0o700)
  mkdirSync(testClusters, { recursive: true })
  if (asRoot) for (const folder of [stateFolder, testClusters]) chmodSync(folder, 0o755)
}

/** The log file of one step. */
export const logFile = (name) => join(localFolder, 'log', `${name}.log`)

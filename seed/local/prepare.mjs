import { statfsSync } from 'node:fs'
import { join } from 'node:path'
import { ensureBuild } from './build.mjs'
import { Cluster } from './cluster.mjs'
import { must } from './command.mjs'
import { ensureDatabase } from './database.mjs'
import { ensurePackages } from './debian.mjs'
import { demoPassword, ensureDemo, mayHoldDemo } from './demo.mjs'
import { ensureDependencies } from './dependencies.mjs'
import { alone, atEnd, joinRuns, leaveRuns } from './lifetime.mjs'
import { makeFolders, root, stateFolder } from './places.mjs'
import { secrets } from './secrets.mjs'
import { knownReason, Stop, step } from './steps.mjs'

const leastSpace = 300_000_000

/** Makes the folders and checks that there is room in them. @throws {Stop} */
export function prepareFolders() {
  try {
    makeFolders()
  } catch (error) {
    throw new Stop(`${error.path} cannot be made: ${knownReason(error.message) ?? error.code}`)
  }
  for (const folder of [root, stateFolder]) {
    const { bavail, bsize } = statfsSync(folder)
    if (bavail * bsize < leastSpace) throw new Stop(`The disk is full: less than 300 MB are free at ${folder}.`)
  }
}

/** Installs what is missing. */
export async function prepareTools(packages) {
  await step('Debian packages', () => ensurePackages(packages))
  await step('npm packages', ensureDependencies)
}

async function startCluster() {
  const cluster = new Cluster(join(stateFolder, 'postgres'))
  joinRuns()
  atEnd(() =>
    alone(async () => {
      if (leaveRuns()) await cluster.stop()
    }),
  )
  await step('PostgreSQL', () => cluster.start())
  let urls
  await step('Database and roles', async () => {
    urls = await ensureDatabase(cluster, 'turnstone', secrets())
  })
  return urls
}

/** The database to use: the one of DATABASE_URL, else one of a private cluster. */
async function databaseUrls() {
  const { DATABASE_URL, OWNER_DATABASE_URL } = process.env
  if (DATABASE_URL) return { appUrl: DATABASE_URL, ownerUrl: OWNER_DATABASE_URL || DATABASE_URL }
  return startCluster()
}

/** Brings the tables up to date. */
export async function migrate(env) {
  await must('The database could not be migrated.', [process.execPath, 'build/server/migrate.js'], {
    env: { ...env, NODE_ENV: 'production' },
    log: 'migrate',
  })
}

/** Puts the demo in, where it may be. @returns {Promise<string | undefined>} the password of its people */
async function demo({ appUrl, ownerUrl }, ownCluster) {
  const password = demoPassword()
  const env = { DATABASE_URL: appUrl, OWNER_DATABASE_URL: ownerUrl, DEMO_PASSWORD: password }
  const may = mayHoldDemo(ownerUrl)
  await step('Demo', () => (may ? ensureDemo(env, ownCluster) : 'left out, the database is not on this machine'))
  return may ? password : undefined
}

/**
 * Does all that must be done before the web server starts.
 *
 * @returns {Promise<{ env: Record<string, string | undefined>, password?: string }>} the server's environment, and the
 *   password of the demo's people where there is a demo
 */
export function prepare() {
  prepareFolders()
  return alone(async () => {
    const ownCluster = !process.env.DATABASE_URL
    await prepareTools(ownCluster ? ['postgresql'] : [])
    const urls = await databaseUrls()
    await step('Build', ensureBuild)
    await step('Migrations', () => migrate({ DATABASE_URL: urls.appUrl, OWNER_DATABASE_URL: urls.ownerUrl }))
    const password = await demo(urls, ownCluster)
    return { env: { DATABASE_URL: urls.appUrl, OWNER_DATABASE_URL: undefined, DEMO_PASSWORD: undefined }, password }
  })
}

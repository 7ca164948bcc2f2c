import { readdirSync } from 'node:fs'
import { join } from 'node:path'
import { ensureBuild } from './build.mjs'
import { startProcess, untilHealthy } from './children.mjs'
import { Cluster } from './cluster.mjs'
import { single, sum } from './counts.mjs'
import { ensureDatabase } from './database.mjs'
import { seedDemo } from './demo.mjs'
import { alone, atEnd, isAlive, nameOf } from './lifetime.mjs'
import { testClusters } from './places.mjs'
import { freePort } from './ports.mjs'
import { migrate, prepareFolders, prepareTools } from './prepare.mjs'
import { newPassword } from './secrets.mjs'
import { Stop, step } from './steps.mjs'
import * as suites from './suites.mjs'

process.env.TZ = 'Pacific/Auckland'

const passwords = { owner: newPassword(), app: newPassword() }
const demoPassword = newPassword(9)

/** A cluster for this run alone; what killed runs left behind is removed. */
async function throwAwayCluster() {
  for (const name of readdirSync(testClusters)) {
    if (!isAlive(name)) await new Cluster(join(testClusters, name)).destroy()
  }
  const cluster = new Cluster(join(testClusters, nameOf(process.pid)), { throwAway: true })
  atEnd(() => cluster.destroy())
  await cluster.start()
  return cluster
}

const urlsOf = ({ appUrl, ownerUrl }) => ({ DATABASE_URL: appUrl, OWNER_DATABASE_URL: ownerUrl })

async function migrated(cluster, name) {
  const urls = await ensureDatabase(cluster, name, passwords)
  await migrate(urlsOf(urls))
  return urls
}

/** Starts a web server on a database and gives what tests must know of it. */
async function serve(name, urls) {
  const port = await freePort()
  const baseUrl = `http://localhost:${port}`
  const env = { NODE_ENV: 'production', LOG_LEVEL: 'info', PORT: String(port), PUBLIC_URL: baseUrl }
  const web = startProcess(['build/server/index.js'], { ...env, DATABASE_URL: urls.appUrl }, name)
  await untilHealthy(baseUrl, web)
  return {
    TEST_BASE_URL: baseUrl,
    TEST_DATABASE_URL: urls.appUrl,
    TEST_OWNER_DATABASE_URL: urls.ownerUrl,
    DEMO_PASSWORD: demoPassword,
  }
}

/** What the later suites share, each made when first asked for. */
function house() {
  const once = (make) => {
    let made
    return () => {
      made ??= make()
      return made
    }
  }
  const cluster = once(throwAwayCluster)
  const build = once(() => alone(ensureBuild))
  const demo = once(async () => {
    await build()
    const urls = await migrated(await cluster(), 'demo')
    await seedDemo({ ...urlsOf(urls), DEMO_PASSWORD: demoPassword })
    return urls
  })
  /** A copy of the demo's database, so that one suite does not see what another changed. */
  const served = async (name) => {
    await demo()
    await (await cluster()).sql('postgres', `create database ${name} template demo owner turnstone_owner`)
    return serve(`web-${name}`, await ensureDatabase(await cluster(), name, passwords))
  }
  return { cluster, build, served }
}

const statics = {
  types: suites.types,
  lint: suites.lint,
  unused: suites.unused,
  migrations: suites.migrations,
  unit: () => suites.vitest('unit', ['unit']),
  published: () => suites.vitest('published', ['published']),
  house: () => suites.vitest('house', ['house']),
  faults: () => suites.vitest('faults', ['faults']),
}

function dynamics({ cluster, build, served }) {
  return {
    build: async () => {
      await build()
      return { count: single(true), output: '' }
    },
    db: async () => {
      await build()
      const urls = await migrated(await cluster(), 'rows')
      const env = { TEST_DATABASE_URL: urls.appUrl, TEST_OWNER_DATABASE_URL: urls.ownerUrl }
      return suites.vitest('db', ['db'], env)
    },
    http: async () => suites.vitest('http', ['http'], await served('http')),
    e2e: async () => suites.playwright(await served('e2e')),
    'log of http': () => suites.quietLog('web-http'),
    'log of e2e': () => suites.quietLog('web-e2e'),
  }
}

/** Runs one suite; what breaks in its preparation is a failed test. */
async function runSuite(name, run) {
  let result
  await step(name, async () => {
    try {
      result = await run()
    } catch (error) {
      const output = error instanceof Stop ? `${error.message}\n${error.details}` : error.stack
      result = { count: single(false), output }
    }
    return `${result.count.passed} passed, ${result.count.failed} failed`
  })
  if (result.count.failed > 0) console.log(`\n${result.output.trim()}\n`)
  return result.count
}

/**
 * Runs the suites in order and prints the sum.
 *
 * @param {string[]} only names of suites to run; all when empty
 * @returns {Promise<number>} exit code
 */
export async function testAll(only) {
  prepareFolders()
  await alone(() => prepareTools(['postgresql', 'chromium']))
  const all = { ...statics, ...dynamics(house()) }
  const unknown = only.filter((name) => !(name in all))
  if (unknown.length > 0)
    throw new Stop(`No such suite: ${unknown.join(', ')}. There are: ${Object.keys(all).join(', ')}`)
  const counts = []
  for (const [name, run] of Object.entries(all)) {
    if (only.length === 0 || only.includes(name)) counts.push(await runSuite(name, run))
  }
  const { passed, failed } = sum(counts)
  console.log(`\n${passed} passed, ${failed} failed`)
  return failed > 0 ? 1 : 0
}

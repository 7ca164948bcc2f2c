import { readdirSync } from 'node:fs'
import { join } from 'node:path'
import { ensureBuild } from './build.mjs'
import { startProcess, untilHealthy } from './children.mjs'
import { Cluster } from './cluster.mjs'
import { ensureDatabase } from './database.mjs'
import { seedDemo } from './demo.mjs'
import { alone, atEnd, isAlive, nameOf } from './lifetime.mjs'
import { testClusters } from './places.mjs'
import { freePort } from './ports.mjs'
import { migrate } from './prepare.mjs'
import { newPassword } from './secrets.mjs'

const passwords = { owner: newPassword(), app: newPassword() }

/** Password of the demo's people in this run. */
export const demoPassword = newPassword(9)

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

const once = (make) => {
  let made
  return () => {
    made ??= make()
    return made
  }
}

/**
 * What the suites and the bench share, each made when first asked for: the build, a throw-away cluster, databases in it.
 *
 * `empty(name)` gives a migrated database, `demo()` the demo's, `served(name)` a web server on a copy of that one, so that one
 * suite does not see what another changed.
 */
export function testHouse() {
  const cluster = once(throwAwayCluster)
  const build = once(() => alone(ensureBuild))
  const empty = async (name) => {
    await build()
    const urls = await ensureDatabase(await cluster(), name, passwords)
    await migrate(urlsOf(urls))
    return urls
  }
  const demo = once(async () => {
    const urls = await empty('demo')
    await seedDemo({ ...urlsOf(urls), DEMO_PASSWORD: demoPassword })
    return urls
  })
  const served = async (name) => {
    await demo()
    await (await cluster()).sql('postgres', `create database ${name} template demo owner turnstone_owner`)
    return serve(`web-${name}`, await ensureDatabase(await cluster(), name, passwords))
  }
  return { build, empty, demo, served }
}

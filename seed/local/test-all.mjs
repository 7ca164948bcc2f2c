import { single, sum } from './counts.mjs'
import { alone } from './lifetime.mjs'
import { prepareFolders, prepareTools } from './prepare.mjs'
import { Stop, step } from './steps.mjs'
import * as suites from './suites.mjs'
import { testHouse } from './test-house.mjs'

process.env.TZ = 'Pacific/Auckland'

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

function dynamics({ build, empty, served }) {
  return {
    build: async () => {
      await build()
      return { count: single(true), output: '' }
    },
    db: async () => {
      const urls = await empty('rows')
      const env = { TEST_DATABASE_URL: urls.appUrl, TEST_OWNER_DATABASE_URL: urls.ownerUrl }
      return suites.vitest('db', ['db'], env)
    },
    http: async () => suites.vitest('http', ['http'], await served('http')),
    e2e: async () => suites.playwright(await served('e2e')),
    'log of http': () => suites.quietLog('web-http'),
    'log of e2e': () => suites.quietLog('web-e2e'),
  }
}

const told = new Set()

/** Why a suite could not run. Suites that share a preparation share its failure, which is told in full once. */
function failureOf(error) {
  if (!(error instanceof Stop)) return error.stack
  const details = told.has(error) ? '' : error.details
  told.add(error)
  return `${error.message}\n${details}`
}

/** Runs one suite; what breaks in its preparation is a failed test. */
async function runSuite(name, run) {
  let result
  await step(name, async () => {
    try {
      result = await run()
    } catch (error) {
      result = { count: single(false), output: failureOf(error) }
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
  const all = { ...statics, ...dynamics(testHouse()) }
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

import { cpSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { capture } from './command.mjs'
import { countPlaywright, countVitest, single } from './counts.mjs'
import { localFolder, logFile } from './places.mjs'

const bin = (name) => `node_modules/.bin/${name}`
const reports = join(localFolder, 'test')

/** @typedef {{ count: import('./counts.mjs').Count, output: string }} Result */

function reportFile(name) {
  mkdirSync(reports, { recursive: true })
  const file = join(reports, `${name}.json`)
  rmSync(file, { force: true })
  return file
}

/** A tool that passes or fails as a whole. @returns {Promise<Result>} */
async function whole(name, ...commands) {
  let output = ''
  for (const command of commands) {
    const result = await capture(command, { log: name })
    output += result.output
    if (result.code !== 0) return { count: single(false), output }
  }
  return { count: single(true), output }
}

export const types = () => whole('types', [bin('react-router'), 'typegen'], [bin('tsc')])
export const lint = () => whole('lint', [bin('biome'), 'check', '--error-on-warnings'])
export const unused = () => whole('knip', [bin('knip')])

/** Whether the migrations say all that the schema says. */
export async function migrations() {
  mkdirSync(reports, { recursive: true })
  const folder = mkdtempSync(join(reports, 'drizzle-'))
  try {
    cpSync('drizzle', folder, { recursive: true })
    const before = readdirSync(folder).length
    const made = ['generate', '--dialect=postgresql', '--schema=./app/db/schema/index.ts', `--out=${folder}`]
    const result = await capture([bin('drizzle-kit'), ...made], { log: 'migrations' })
    const same = result.code === 0 && readdirSync(folder).length === before
    return {
      count: single(same),
      output: `${result.output}\nThe schema has changes that no migration has: npm run db:generate\n`,
    }
  } finally {
    rmSync(folder, { recursive: true, force: true })
  }
}

/** Runs projects of Vitest. @returns {Promise<Result>} */
export async function vitest(name, projects, env = {}) {
  const file = reportFile(name)
  const chosen = projects.flatMap((project) => ['--project', project])
  const command = [
    bin('vitest'),
    'run',
    ...chosen,
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${file}`,
  ]
  const { code, output } = await capture(command, { env, log: name })
  return { count: countVitest(file, code), output }
}

/** Runs the browser's tests. @returns {Promise<Result>} */
export async function playwright(env) {
  const file = reportFile('e2e')
  const { code, output } = await capture([bin('playwright'), 'test', '--reporter=list,json'], {
    env: { ...env, PLAYWRIGHT_JSON_OUTPUT_FILE: file },
    log: 'e2e',
  })
  return { count: countPlaywright(file, code), output }
}

/** Whether a server ran without an unexpected error, as its log says. @returns {Result} */
export function quietLog(name) {
  const failures = readFileSync(logFile(name), 'utf8')
    .split('\n')
    .filter((line) => line.startsWith('{') && JSON.parse(line).level >= 50)
  return { count: single(failures.length === 0), output: failures.slice(0, 10).join('\n') }
}

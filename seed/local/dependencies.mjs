import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { must } from './command.mjs'
import { root } from './places.mjs'

const packagesIn = (file) => JSON.parse(readFileSync(join(root, file), 'utf8')).packages

/** Whether what npm says it installed is what the lock file asks for; packages of other platforms may be left out. */
function upToDate() {
  if (!existsSync(join(root, 'node_modules/.package-lock.json'))) return false
  const installed = packagesIn('node_modules/.package-lock.json')
  const wanted = packagesIn('package-lock.json')
  return Object.entries(wanted).every(([path, { version, integrity, optional }]) => {
    if (path === '') return true
    const found = installed[path]
    if (!found || !existsSync(join(root, path, 'package.json'))) return optional === true
    return found.version === version && found.integrity === integrity
  })
}

/** Installs the npm packages where they are missing or not those of the lock file. */
export async function ensureDependencies() {
  if (upToDate()) return 'present'
  await must('npm packages could not be installed.', ['npm', 'ci', '--include=dev', '--no-audit', '--no-fund'], {
    log: 'npm-ci',
    env: { NODE_ENV: undefined, npm_config_production: undefined, npm_config_omit: undefined },
  })
  return 'installed'
}

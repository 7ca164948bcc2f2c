import { createHash } from 'node:crypto'
import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { must } from './command.mjs'
import { root } from './places.mjs'

const folders = ['app', 'public', 'seed']
const files = ['package-lock.json', 'package.json', 'react-router.config.ts', 'tsconfig.json', 'vite.config.ts']
const stamp = join(root, 'build/source-hash')

function filesBelow(folder) {
  return readdirSync(join(root, folder), { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath ?? entry.path, entry.name))
    .filter((path) => !/\.test\.tsx?$/.test(path))
    .sort()
}

/** Hash of all that a build is made from. */
export function sourceHash() {
  const hash = createHash('sha256').update(process.version)
  const sources = [...folders.filter((folder) => existsSync(join(root, folder))).flatMap(filesBelow)]
  for (const path of [...sources, ...files.map((file) => join(root, file))]) {
    const bytes = readFileSync(path)
    hash.update(`\0${path.slice(root.length)}\0${bytes.length}\0`).update(bytes)
  }
  return hash.digest('hex')
}

/** Builds where the last build is not of these sources. */
export async function ensureBuild() {
  const hash = sourceHash()
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === hash) return 'up to date'
  await must('The build failed.', ['node_modules/.bin/react-router', 'build'], {
    log: 'build',
    env: { NODE_ENV: 'production' },
  })
  writeFileSync(stamp, hash)
  return 'built'
}

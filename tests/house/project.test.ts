import { execFileSync } from 'node:child_process'
import { existsSync, readFileSync, statSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it, test } from 'vitest'
import { unexpectedAtTop, unpinned } from './project'
import { root } from './sources'

const read = (path: string) => readFileSync(join(root, path), 'utf8')

function topLevel(): string[] {
  const files = execFileSync('git', ['ls-files', '--cached', '--others', '--exclude-standard'], {
    cwd: root,
    encoding: 'utf8',
  })
  return [
    ...new Set(
      files
        .trim()
        .split('\n')
        .map((file) => file.split('/')[0]!),
    ),
  ]
}

test.runIf(existsSync(join(root, '.git')))('the top level holds five folders and the usual files', () => {
  expect(unexpectedAtTop(topLevel())).toEqual([])
})

test('every version is exact', () => {
  expect(unpinned(JSON.parse(read('package.json')))).toEqual([])
})

test('the lock file names no address of a registry', () => {
  const { packages } = JSON.parse(read('package-lock.json')) as { packages: Record<string, { resolved?: string }> }
  const strange = Object.values(packages).filter(
    ({ resolved }) => resolved && !resolved.startsWith('https://registry.npmjs.org/'),
  )
  expect(strange).toEqual([])
})

test('the check of a push runs the tests', () => {
  expect(read('.ci/run')).toMatch(/^exec npm test$/m)
  expect(statSync(join(root, '.ci/run')).mode & 0o111).toBe(0o111)
})

describe('the checks of the project see', () => {
  it('a folder or a file that does not belong at the top', () => {
    expect(unexpectedAtTop(['app', 'lib', 'notes.txt', '.editorconfig', 'vite.config.ts'])).toEqual([
      'lib',
      'notes.txt',
    ])
  })
  it.each(['^1.2.3', '~1.2.3', '1.x', 'latest', '>=1.2.3', '1.2'])('the version %s', (version) => {
    expect(unpinned({ dependencies: { a: version, b: '1.2.3' } })).toEqual([`a ${version}`])
  })
})

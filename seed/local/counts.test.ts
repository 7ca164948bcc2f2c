import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { countPlaywright, countVitest, sum } from './counts.mjs'

const folder = mkdtempSync(join(tmpdir(), 'counts-'))
afterAll(() => rmSync(folder, { recursive: true }))

let written = 0
function report(content: object) {
  written += 1
  const file = join(folder, `${written}.json`)
  writeFileSync(file, JSON.stringify(content))
  return file
}

const passed = { status: 'passed', assertionResults: [{ status: 'passed' }] }
const failed = { status: 'failed', assertionResults: [{ status: 'passed' }, { status: 'failed' }] }
const unloaded = { status: 'failed', assertionResults: [] }

describe('the count of a run', () => {
  it('is what its tests say', () => {
    const file = report({ numPassedTests: 7, numFailedTests: 2, testResults: [passed, failed] })
    expect(countVitest(file, 1)).toEqual({ passed: 7, failed: 2 })
  })
  it('takes a file that could not be loaded for a failed test', () => {
    const file = report({ numPassedTests: 5, numFailedTests: 0, testResults: [passed, unloaded] })
    expect(countVitest(file, 1)).toEqual({ passed: 5, failed: 1 })
  })
  it('takes a bad end without a failed test for a failed test', () => {
    expect(countVitest(report({ numPassedTests: 3, numFailedTests: 0, testResults: [passed] }), 1).failed).toBe(1)
    expect(countVitest(report({ numPassedTests: 3, numFailedTests: 0, testResults: [passed] }), 0).failed).toBe(0)
  })
  it('takes a run without a report for a failed test', () => {
    expect(countVitest(join(folder, 'none.json'), 0)).toEqual({ passed: 0, failed: 1 })
    expect(countPlaywright(join(folder, 'none.json'), 0)).toEqual({ passed: 0, failed: 1 })
  })
  it('takes a browser test that passed at the second try for a failed one', () => {
    const file = report({ stats: { expected: 4, unexpected: 1, flaky: 2 }, errors: [] })
    expect(countPlaywright(file, 1)).toEqual({ passed: 4, failed: 3 })
  })
  it('takes an error outside the browser tests for a failed one', () => {
    const file = report({ stats: { expected: 6, unexpected: 0, flaky: 0 }, errors: [{ message: 'no tests found' }] })
    expect(countPlaywright(file, 1)).toEqual({ passed: 6, failed: 1 })
  })
  it('adds up over the suites', () => {
    const counts = [
      { passed: 1, failed: 4 },
      { passed: 20, failed: 3 },
    ]
    expect(sum(counts)).toEqual({ passed: 21, failed: 7 })
  })
})

import { describe, expect, it, test } from 'vitest'
import { isTest, sourcesBelow } from './sources'
import { environmentProblem, formProblem, impurities, leftOver, nameProblem } from './text-rules'

const sources = sourcesBelow('app', 'seed', 'tests')
const own = /^tests\/house\/text-rules/

test('pure folders know no clock, chance, network, screen or process', () => {
  expect(sources.flatMap(impurities)).toEqual([])
})

test('only env.server.ts reads the environment', () => {
  expect(sources.flatMap((source) => environmentProblem(source) ?? [])).toEqual([])
})

test('nothing is left open, silenced, swallowed or skipped', () => {
  const looked = sources.filter(({ path }) => !own.test(path))
  expect(looked.flatMap((source) => leftOver(source) ?? [])).toEqual([])
})

test('forms are read by readForm', () => {
  expect(sources.flatMap((source) => formProblem(source) ?? [])).toEqual([])
})

test('every module is named after what it holds', () => {
  expect(sources.flatMap(({ path }) => nameProblem(path) ?? [])).toEqual([])
})

test('no test stands in app/routes', () => {
  expect(sources.filter(({ path }) => path.startsWith('app/routes/') && isTest(path))).toEqual([])
})

describe('the check of pure folders sees', () => {
  it.each([
    'const now = Date.now()',
    'const day = new Date()',
    'const id = Math.random()',
    'const clock = Date.now',
    'const wide = window.innerWidth',
    'const answer = await fetch("/x")',
    'setTimeout(a, 5)',
    'console.log(1)',
    'const home = process.env.HOME',
  ])('%s', (text) => {
    expect(impurities({ path: 'app/track/sun.ts', text })).toHaveLength(1)
    expect(impurities({ path: 'app/db/sun.server.ts', text })).toEqual([])
  })
  it('no fault in words that only look alike', () => {
    const text = "const when: Date = given\nconst document = 'the console'\nread(document)\nmarks.window\n"
    expect(impurities({ path: 'app/book/cuts.ts', text })).toEqual([])
  })
})

describe('the other checks see', () => {
  it.each(['process.env.PORT', 'process . env', "process['env']", "import { env } from 'node:process'"])(
    '%s',
    (text) => {
      expect(environmentProblem({ path: 'app/log.server.ts', text })).toBeDefined()
      expect(environmentProblem({ path: 'app/env.server.ts', text })).toBeUndefined()
    },
  )
  it('a form that a route reads itself', () => {
    const text = 'const form = await request.formData()'
    expect(formProblem({ path: 'app/routes/sign-in.tsx', text })).toBeDefined()
    expect(formProblem({ path: 'app/middleware/read-form.server.ts', text })).toBeUndefined()
  })
  it.each([
    '// TODO later',
    'const a = b as any',
    '// @ts-ignore',
    'load().catch(() => null)',
    'test.skip("x", f)',
    'await page.waitForTimeout(100)',
    'await new Promise((done) => setTimeout(done, 5))',
  ])('%s', (text) => {
    expect(leftOver({ path: 'app/routes/home.tsx', text })).toBeDefined()
  })
  it.each(['app/utils/x.ts', 'app/book/mark-utils.ts', 'app/db/helpers.server.ts'])('%s', (path) => {
    expect(nameProblem(path)).toBeDefined()
  })
  it('no fault in ordinary names', () => {
    expect(nameProblem('app/words/commonly-used.ts')).toBeUndefined()
  })
})

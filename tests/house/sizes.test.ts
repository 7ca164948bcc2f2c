import { describe, expect, it, test } from 'vitest'
import { fileProblem, functionProblems } from './sizes'
import { sourcesBelow } from './sources'

const sources = sourcesBelow('app', 'seed', 'tests')
const lines = (count: number, line: string) => `${line}\n`.repeat(count)

test('files stay under 300 lines, route modules under 150', () => {
  expect(sources.flatMap((source) => fileProblem(source) ?? [])).toEqual([])
})

test('functions stay under 60 lines', () => {
  const code = sources.filter(({ path }) => !path.endsWith('.css'))
  expect(code.flatMap(functionProblems)).toEqual([])
})

describe('the check of sizes', () => {
  it('counts lines, not the end of the last one', () => {
    expect(fileProblem({ path: 'app/track/plane.ts', text: lines(300, 'a()') })).toBeUndefined()
    expect(fileProblem({ path: 'app/track/plane.ts', text: lines(301, 'a()') })).toMatch('301 lines')
  })
  it('allows a route half of it', () => {
    expect(fileProblem({ path: 'app/routes/team/home.tsx', text: lines(150, 'a()') })).toBeUndefined()
    expect(fileProblem({ path: 'app/routes/team/home.tsx', text: lines(151, 'a()') })).toMatch('151 lines')
  })
  it.each([
    ['function', (body: string) => `function long() {\n${body}}\n`],
    ['arrow function', (body: string) => `const long = () => {\n${body}}\n`],
    ['method', (body: string) => `class A {\nlong() {\n${body}}\n}\n`],
    ['element', (body: string) => `export default function long() { return (\n<div>\n${body}</div>)}\n`],
  ])('measures a %s', (_kind, wrap) => {
    expect(functionProblems({ path: 'app/draw/strip.tsx', text: wrap(lines(50, 'a()')) })).toEqual([])
    expect(functionProblems({ path: 'app/draw/strip.tsx', text: wrap(lines(70, 'a()')) })).toHaveLength(1)
  })
})

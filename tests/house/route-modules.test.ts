import { describe, expect, it, test } from 'vitest'
import { exportProblems } from './route-modules'
import { sourcesBelow } from './sources'

const routes = sourcesBelow('app').filter(({ path }) => /^app\/(routes\/.*\.tsx?|root\.tsx)$/.test(path))

test('route modules export in one order and nothing else', () => {
  expect(routes.length).toBeGreaterThan(2)
  expect(routes.flatMap(exportProblems)).toEqual([])
})

describe('the check of exports sees', () => {
  const problems = (text: string) => exportProblems({ path: 'app/routes/a.tsx', text })
  it('an action before the loader', () => {
    expect(problems('export async function action() {}\nexport const loader = () => 1\n')).toHaveLength(1)
  })
  it('a page before its meta', () => {
    expect(problems('export default function Page() {}\nexport const meta = () => []\n')).toHaveLength(1)
  })
  it('an export that is no part of a route', () => {
    expect(problems('export const shared = 1\n')).toHaveLength(1)
  })
  it('no fault in the right order', () => {
    const text = 'export const meta = 1\nconst own = 2\nexport function loader() {}\nexport default () => own\n'
    expect(problems(`${text}export type Shape = 1\nexport function ErrorBoundary() {}\n`)).toEqual([])
  })
})

import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { nextPath } from './next-path'

describe('where to go after signing in', () => {
  test('a path of this site is kept with its query', () => {
    expect(nextPath('/teams/lanternside/books?ground=sim', '/teams')).toBe('/teams/lanternside/books?ground=sim')
  })
  test.each([
    null,
    '',
    'teams',
    '//elsewhere.example/',
    '/\\elsewhere.example',
    '/\t/elsewhere.example',
    '/\n/elsewhere.example',
    'https://elsewhere.example/',
    'javascript:alert(1)',
    '/.//elsewhere.example',
    '/..//elsewhere.example',
  ])('%j goes nowhere else', (next) => {
    expect(nextPath(next, '/teams')).toBe('/teams')
  })
  test('no text at all leads to another site', () => {
    const pieces = fc.constantFrom('/', '\\', '.', '\t', '\n', ':', '@', 'elsewhere.example', 'https', '?', '#', ' ')
    fc.assert(
      fc.property(fc.array(pieces, { maxLength: 8 }), (parts) => {
        const base = 'https://turnstone.example/sign-in'
        expect(new URL(nextPath(parts.join(''), '/teams'), base).origin).toBe('https://turnstone.example')
      }),
      { numRuns: 2000 },
    )
  })
})

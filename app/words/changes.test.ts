import { describe, expect, test } from 'vitest'
import type { ToldChange } from '~/book/changes'
import { metres } from '~/track/units'
import { changeWords } from './changes'

const plain = (text: string) => text.replaceAll('\u00a0', ' ')
const say = (what: ToldChange['what'], more: Partial<ToldChange> = {}) =>
  plain(
    changeWords({
      operation: 'o' as ToldChange['operation'],
      by: null,
      reason: null,
      corner: null,
      thing: { kind: 'mark', mark: 'brake', role: 'target', gear: null },
      count: 1,
      alike: true,
      ...more,
      what,
    }),
  )

describe('a change in words', () => {
  test('a move says how far and which way, and why where a reason was given', () => {
    const sooner = { deed: 'moved', ground: 'real', ahead: metres(-9), left: metres(0.4) } as const
    expect(say(sooner)).toBe('build to moved 9 m sooner')
    expect(say(sooner, { reason: 'the panel moved' })).toBe('build to moved 9 m sooner: the panel moved')
    expect(say({ deed: 'moved', ground: 'sim', ahead: metres(0.2), left: metres(-1.4) })).toBe(
      'build to moved 1 m right in the simulator',
    )
  })
  test('a move of less than a metre keeps its tenths', () => {
    expect(say({ deed: 'moved', ground: 'real', ahead: metres(0.3), left: metres(0) })).toBe(
      'build to moved 0.3 m later',
    )
  })
  test('short values are said, long ones named', () => {
    expect(say({ deed: 'set', set: { gear: 3, manner: 'trail' } })).toBe('build to now 3rd, trail')
    expect(say({ deed: 'set', set: { leastSpeed: 30, line: 'x' } }, { thing: { kind: 'card' } })).toBe(
      'card now 108 km/h at the slowest; rewritten: line',
    )
  })
  test('what was done together is counted, and named where it was the same', () => {
    expect(say({ deed: 'added' }, { count: 40 })).toBe('40 marks added')
    expect(say({ deed: 'added' }, { count: 40, alike: false })).toBe('build to added, and 39 more')
    const moved = { deed: 'moved', ground: 'sim', ahead: metres(8), left: metres(0) } as const
    expect(say(moved, { count: 3 })).toBe('3 marks moved in the simulator')
  })
})

import { describe, expect, it } from 'vitest'
import { assembleBookView } from '~/book/assemble'
import { cornerOf } from '~/book/cuts'
import type { Operation } from '~/book/operation'
import { bookRows, mark, place } from '../../../tests/support/book-rows'
import { type Asked, intentResult, plainResult } from './result'

const view = assembleBookView(
  bookRows({ marks: [mark({ id: 'm-brake', kind: 'brake', role: 'target', gear: 4, real: place(372, 4) })] }),
)
const cut = cornerOf(view, '1')!
const asked: Asked = { intent: 'change', mark: 'm-brake' as never, ground: 'real' }
const seen = { place: place(372, 4), manner: null, gear: 4, speed: null }
const operation = {
  id: 'op',
  set: {
    real: { from: { along: 372, across: 4, tie: null }, to: { along: 375, across: 4, tie: null } },
    gear: { from: 4, to: 3 },
  },
} as unknown as Operation
const sent = { intent: 'change', mark: 'm-brake', seen: JSON.stringify(seen), metres: '130' }

describe('what became of a change, in words', () => {
  it('tells where the mark stands now and offers to take it back', () => {
    const done = intentResult(cut, asked, operation, { kind: 'applied', rev: 4, undo: operation }, sent)
    expect(done).toMatchObject({ kind: 'done', undo: 'op' })
    expect(done.words).toBe('Build to: now 130\u00a0before, car’s width off left edge, on the real track.')
  })

  it('shows both versions of just the fields that met, and a form that starts from theirs', () => {
    const theirs = { real: { along: 370, across: 4, tie: null } }
    const result = intentResult(cut, asked, operation, { kind: 'conflict', rev: 4, theirs }, sent)
    if (result.kind !== 'conflict') throw new Error(result.kind)
    expect([result.mine, result.theirs]).toEqual(['130.0\u00a0before', '135.0\u00a0before'])
    expect(JSON.parse(result.again.seen ?? '')).toMatchObject({ place: theirs.real, gear: 4 })
    expect(result.again.metres).toBe('130')
  })

  it('says what a driver’s change of another’s mark became', () => {
    const result = intentResult(cut, asked, operation, { kind: 'proposed', rev: 4 }, sent)
    expect(result).toMatchObject({ kind: 'done', undo: null })
    expect(result.words).toContain('waits for the coach')
  })

  it('names the reason of a refusal', () => {
    expect(intentResult(cut, asked, operation, { kind: 'refused', reason: 'read-only' }, sent).words).toContain(
      'archived',
    )
    expect(intentResult(cut, asked, null, { kind: 'nothing', rev: 4 }, sent).kind).toBe('done')
  })

  it('leaves alone what was changed again since, when something is taken back', () => {
    const late = plainResult({ kind: 'conflict', rev: 5, theirs: {} }, 'Taken back.', 'Changed since.')
    expect(late).toEqual({ kind: 'refused', words: 'Changed since.' })
    expect(plainResult({ kind: 'proposed', rev: 5 }, 'Taken back.', 'x').words).toContain('waits for the coach')
    expect(plainResult({ kind: 'applied', rev: 5, undo: null }, 'Taken back.', 'x')).toMatchObject({
      words: 'Taken back.',
    })
  })
})

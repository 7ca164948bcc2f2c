import { describe, expect, it } from 'vitest'
import { bookRows, corner, ids, kerb, mark, place, placement } from '../../tests/support/book-rows'
import { assembleBookView } from './assemble'
import { cornerOf, cornerState, overviewOf } from './cuts'
import type { BookRows } from './rows'

const found = (id: string, proof: 'seen' | 'driven', alongMetres: number): BookRows['findings'][number] => ({
  mark: id as never,
  ground: 'real',
  person: ids.driver,
  by: ids.driver,
  condition: ids.dry,
  verdict: 'kept',
  proof,
  along: alongMetres,
  across: 4,
  at: '2026-10-09T10:00:00Z',
})

const marks = [
  mark({ id: 'm-brake', kind: 'brake', role: 'start', real: place(360, 4) }),
  mark({ id: 'm-turnin', kind: 'turnin', real: place(410, 4) }),
  mark({ id: 'm-full', kind: 'full', real: place(530, 4) }),
]

function stateOf(findings: BookRows['findings'], some = marks) {
  const view = assembleBookView(bookRows({ marks: some, findings }))
  return cornerState(view.corners[0]!, ids.dry)
}

describe('the state of a corner', () => {
  it('is as good as its weakest reference; what only the car decides does not count', () => {
    expect(stateOf([found('m-brake', 'driven', 360)])).toBe('draft')
    expect(stateOf([found('m-brake', 'driven', 360), found('m-turnin', 'seen', 410)])).toBe('seen')
    expect(stateOf([found('m-brake', 'driven', 360), found('m-turnin', 'driven', 410)])).toBe('driven')
  })

  it('is empty without marks, a draft with simulator places only', () => {
    expect(stateOf([], [])).toBe('empty')
    expect(stateOf([], [mark({ id: 'm-sim', kind: 'apex', sim: place(505, 4) })])).toBe('draft')
  })
})

describe('cuts of the book', () => {
  it('overview: corners in order with their count of marks', () => {
    const overview = overviewOf(assembleBookView(bookRows({ marks })), ids.dry)
    expect(overview.corners.map((one) => [one.number, one.marks])).toEqual([
      ['1', 3],
      ['2', 0],
    ])
  })

  it('overview: a corner without marks of the condition inherits the dry ones, never their proof', () => {
    const view = assembleBookView(bookRows({ marks, findings: [found('m-brake', 'driven', 360)] }))
    const statesIn = (condition: typeof ids.dry) => overviewOf(view, condition).corners.map((one) => one.state)
    expect(statesIn(ids.wet)).toEqual(['inherited', 'empty'])
    expect(statesIn(ids.dry)).toEqual(['draft', 'empty'])
  })

  it('corner: wraps previous and next round the lap and knows no other number', () => {
    const view = assembleBookView(bookRows({ marks }))
    expect(cornerOf(view, '1')).toMatchObject({ previous: '2', next: '2' })
    expect(cornerOf(view, '7')).toBeNull()
  })

  it('corner: takes landmarks beside its road only, across the start line too', () => {
    const far = { ...kerb, id: 'far' as never, real: placement(1200, null) }
    const overLine = { ...kerb, id: 'over-line' as never, real: placement(120, null) }
    const view = assembleBookView(bookRows({ landmarks: [kerb, far, overLine] }))
    expect(cornerOf(view, '2')?.landmarks.map((one) => one.id)).toEqual(['over-line'])
    expect(cornerOf(view, '1')?.landmarks.map((one) => one.id)).toEqual([ids.kerb])
  })

  it('corner: a lap of one corner leads on to itself', () => {
    const rows = bookRows({ corners: [corner({ id: ids.first, number: '7A' })] })
    expect(cornerOf(assembleBookView(rows), '7A')).toMatchObject({ previous: '7A', next: '7A' })
  })
})

import { describe, expect, it } from 'vitest'
import { bookRows, card, ids, mark, place } from '../../tests/support/book-rows'
import { assembleBookView } from './assemble'
import { missingOf } from './missing'
import type { BookRows } from './rows'

const gapsOf = (rows: Partial<BookRows>, condition = ids.dry) =>
  missingOf(assembleBookView(bookRows(rows)), condition).map(({ gap, corners }) => [
    gap,
    ...corners.map((corner) => corner.number),
  ])

const brake = mark({ id: 'm-brake', kind: 'brake', role: 'start', real: place(360, 4) })
const apex = mark({ id: 'm-apex', kind: 'apex', real: place(505, -3) })

describe('what a book lacks', () => {
  it('a corner without marks is missing altogether; all such corners stand together', () => {
    expect(gapsOf({ marks: [] })).toEqual([['no-marks', '1', '2']])
  })

  it('one brake or lift mark on the real track is enough', () => {
    expect(gapsOf({ marks: [brake] })).toEqual([['no-marks', '2']])
    expect(gapsOf({ marks: [mark({ id: 'm-lift', kind: 'lift', real: place(372, 4) })] })).toEqual([['no-marks', '2']])
  })

  it('marks without a brake among them leave the brake missing, unless the corner is flat', () => {
    expect(gapsOf({ marks: [apex] })).toEqual([
      ['no-marks', '2'],
      ['no-brake', '1'],
    ])
    const cards = [{ ...card(ids.firstCard, ids.first), flat: true }, card(ids.secondCard, ids.second)]
    expect(gapsOf({ marks: [apex], cards })).toEqual([['no-marks', '2']])
  })

  it('a brake known from the simulator only is told apart', () => {
    const marks = [mark({ id: 'm-sim', kind: 'brake', role: 'target', sim: place(371, 4) })]
    expect(gapsOf({ marks })).toEqual([
      ['no-marks', '2'],
      ['sim-only', '1'],
    ])
  })

  it('a card that says no reference was found yet is told as that', () => {
    const cards = [{ ...card(ids.firstCard, ids.first), noReference: true }, card(ids.secondCard, ids.second)]
    expect(gapsOf({ marks: [apex], cards })).toEqual([
      ['no-marks', '2'],
      ['no-reference', '1'],
    ])
  })

  it('dry marks count in the wet', () => {
    expect(gapsOf({ marks: [brake] }, ids.wet)).toEqual([['no-marks', '2']])
  })
})

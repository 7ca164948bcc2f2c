import { describe, expect, it } from 'vitest'
import { fromKmh, metres } from '~/track/units'
import { bookRows, ids, mark, place } from '../../tests/support/book-rows'
import { assembleBookView } from './assemble'
import { againstSim, type DrivenDistance, markLines, secondsBetween } from './distances'
import { marksFor } from './marks-for'

const alongRoad = (): DrivenDistance => (from, to) => metres(to.station - from.station)

function lines(choice: 'sim' | 'real' | 'both') {
  const view = assembleBookView(
    bookRows({
      marks: [
        mark({
          id: 'm-brake',
          kind: 'brake',
          role: 'target',
          speed: fromKmh(183),
          real: place(372, 4),
          sim: place(381, 4),
        }),
        mark({ id: 'm-turnin', kind: 'turnin', speed: fromKmh(138), real: place(410, 4) }),
        mark({ id: 'm-apex', kind: 'apex', sim: place(509, -4) }),
      ],
    }),
  )
  const read = marksFor(view.corners[0]!.marks, null, ids.dry, view.conditions)
  return markLines(read, choice, alongRoad, metres(4.6))
}

describe('the table of a corner’s marks', () => {
  it('tells metres, car lengths and seconds to the next mark, none after the last', () => {
    const [brake, turnin, apex] = lines('both')
    expect(brake?.toNext?.metres).toBe(38)
    expect(brake?.toNext?.lengths).toBeCloseTo(8.26, 2)
    expect(brake?.toNext?.seconds).toBeCloseTo((2 * 38 * 3.6) / (183 + 138), 12)
    expect(turnin?.toNext?.seconds).toBeNull()
    expect(apex?.toNext).toBeNull()
  })

  it('tells the real place where there is one and keeps the simulator’s beside it', () => {
    const [brake, , apex] = lines('both')
    expect([brake?.ground, brake?.other?.toDatum]).toEqual(['real', -124])
    expect([apex?.ground, apex?.other]).toEqual(['sim', null])
  })

  it('leaves out marks that the chosen ground does not have', () => {
    expect(lines('real').map((line) => line.mark.kind)).toEqual(['brake', 'turnin'])
    expect(lines('sim').map((line) => [line.mark.kind, line.place.toDatum])).toEqual([
      ['brake', -124],
      ['apex', 4],
    ])
  })

  it('always compares real against simulator: negative is sooner here', () => {
    expect(lines('sim')[0]?.againstSim).toBe(-9)
    expect(againstSim({ sim: null, real: null })).toBeNull()
  })

  it('gives no time where a speed is missing or nothing moves', () => {
    expect(secondsBetween(metres(10), null, fromKmh(100))).toBeNull()
    expect(secondsBetween(metres(10), fromKmh(0), fromKmh(0))).toBeNull()
  })
})

describe('marks for a reader', () => {
  const view = assembleBookView(
    bookRows({
      marks: [
        mark({ id: 'm-all', kind: 'brake', role: 'start', real: place(360, 4) }),
        mark({ id: 'm-mine', kind: 'brake', role: 'start', forPerson: ids.driver, real: place(364, 4) }),
        mark({ id: 'm-wet', kind: 'brake', role: 'start', condition: ids.wet, real: place(340, 4) }),
        mark({ id: 'm-apex', kind: 'apex', real: place(506, -4) }),
      ],
    }),
  )
  const read = (reader: typeof ids.driver | null, condition: typeof ids.dry) =>
    marksFor(view.corners[0]!.marks, reader, condition, view.conditions).map((one) => [one.mark.id, one.inherited])

  it('shows a driver his own mark of a kind, everyone else the common one', () => {
    expect(read(ids.driver, ids.dry)).toEqual([
      ['m-mine', false],
      ['m-apex', false],
    ])
    expect(read(null, ids.dry)).toEqual([
      ['m-all', false],
      ['m-apex', false],
    ])
  })

  it('shows dry marks in the wet only of kinds the wet has none of, as inherited', () => {
    expect(read(null, ids.wet)).toEqual([
      ['m-wet', false],
      ['m-apex', true],
    ])
  })
})

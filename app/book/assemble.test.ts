import { describe, expect, it } from 'vitest'
import { bookRows, ids, kerb, mark, place, placement } from '../../tests/support/book-rows'
import { assembleBookView, placeOf } from './assemble'

const cornerOf = (rows = bookRows(), number = '1') =>
  assembleBookView(rows).corners.find((corner) => corner.number === number)!

describe('the book as read', () => {
  it('puts corners in driving order, each stretch beginning where the corner before it ends', () => {
    const view = assembleBookView(bookRows())
    expect(view.corners.map((corner) => [corner.number, corner.from, corner.exit])).toEqual([
      ['1', 30, 540],
      ['2', 540, 30],
    ])
  })

  it('tells marks by signed metres to the datum, also across the start line', () => {
    const rows = bookRows({
      marks: [
        mark({ id: 'm-out', card: ids.secondCard, kind: 'trackout', real: place(47, -2) }),
        mark({ id: 'm-in', card: ids.secondCard, kind: 'brake', role: 'start', real: place(1843, 4) }),
      ],
    })
    expect(cornerOf(rows, '2').marks.map((one) => [one.id, one.real?.toDatum])).toEqual([
      ['m-in', -147],
      ['m-out', 57],
    ])
  })

  it('orders marks at one place as a driver does them', () => {
    const rows = bookRows({
      marks: [
        mark({ id: 'm-a', kind: 'throttle', real: place(507, -5) }),
        mark({ id: 'm-b', kind: 'apex', sim: place(507, -5) }),
      ],
    })
    expect(cornerOf(rows).marks.map((one) => one.kind)).toEqual(['apex', 'throttle'])
  })

  it('moves a tied mark with its landmark, by blocks of the kerb and along the kerb’s own edge', () => {
    const tie = {
      landmarkId: ids.kerb,
      along: { from: 'block' as const, block: 4, metres: 0, lengths: 0 },
      across: null,
      words: null,
      acrossWords: null,
    }
    const marks = [mark({ id: 'm-tied', kind: 'apex', real: place(499, -5, tie) })]
    expect(placeOf(cornerOf(bookRows({ marks })).marks[0]!)?.station).toBeCloseTo(490 + 9 * (30 / 27), 9)
    const moved = {
      ...kerb,
      real: placement(498, 528, { edgeLength: kerb.real!.edgeLength, blockLength: kerb.real!.blockLength }),
    }
    expect(placeOf(cornerOf(bookRows({ marks, landmarks: [moved] })).marks[0]!)?.station).toBeCloseTo(508, 9)
  })

  it('reads a lap driven backwards: order, sides, entries and turns change over, nothing is lost', () => {
    const rows = bookRows({ marks: [mark({ id: 'm-one', real: place(520, -3) })] })
    const backwards = bookRows({ ...rows, layout: { ...rows.layout, reversed: true } })
    const one = cornerOf(backwards)
    expect(one.direction).toBe('left')
    expect([one.entry, one.apex, one.exit]).toEqual([1460, 1500, 1540])
    expect(one.marks[0]?.real).toMatchObject({ station: 1480, offset: 3, toDatum: -15 })
    const kerbView = assembleBookView(backwards).landmarks[0]?.real
    expect([kerbView?.station, kerbView?.until]).toEqual([1480, 1510])
  })

  it('moves no mark against its datum when the start line moves', () => {
    const marks = [mark({ id: 'm-one', real: place(395, 4), sim: place(401, 4.5) })]
    const rows = bookRows({ marks })
    const shifted = bookRows({ marks, layout: { ...rows.layout, startAlong: 777 } })
    expect(cornerOf(shifted).marks[0]?.real?.toDatum).toBe(cornerOf(rows).marks[0]?.real?.toDatum)
    expect(cornerOf(shifted).marks[0]?.real?.station).toBe(1618)
  })

  it('gives each place its own proof: a finding of the real place says nothing of the simulator’s', () => {
    const rows = bookRows({
      marks: [mark({ id: 'm-one', real: place(395, 4), sim: place(395.2, 4) })],
      findings: [
        {
          mark: 'm-one' as never,
          ground: 'real',
          person: ids.driver,
          by: ids.coach,
          condition: ids.dry,
          verdict: 'kept',
          proof: 'seen',
          along: 395,
          across: 4,
          at: '2026-10-09T10:00:00Z',
        },
      ],
    })
    const read = cornerOf(rows).marks[0]
    expect(read?.real?.proof).toHaveLength(1)
    expect(read?.sim?.proof).toEqual([])
  })

  it('refuses a corner without a card', () => {
    expect(() => assembleBookView(bookRows({ cards: [] }))).toThrow(/no card/)
  })
})

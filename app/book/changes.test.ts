import { describe, expect, it } from 'vitest'
import { bookRows, ids, kerb, mark, place } from '../../tests/support/book-rows'
import { assembleBookView } from './assemble'
import { type LoggedChange, tellChanges } from './changes'
import type { OperationId } from './ids'
import type { BookRows } from './rows'

const change = (more: Partial<LoggedChange> & Pick<LoggedChange, 'target' | 'set'>): LoggedChange => ({
  operation: `operation-${more.target.id}` as OperationId,
  reason: null,
  undoes: null,
  batch: null,
  by: ids.driver,
  ...more,
})

const brake = mark({ id: 'm-brake', kind: 'brake', role: 'target', real: place(360, 4) })
const tell = (changes: LoggedChange[], rows: Partial<BookRows> = { marks: [brake] }) =>
  tellChanges(changes, assembleBookView(bookRows(rows)))
const ofMark = (set: LoggedChange['set'], more: Partial<LoggedChange> = {}) =>
  change({ target: { kind: 'mark', id: 'm-brake' }, set, ...more })
const moved = (from: number, to: number, across: readonly [number, number] = [4, 4]) =>
  ofMark({ real: { from: place(from, across[0]) as never, to: place(to, across[1]) as never } })

describe('what a change did', () => {
  it('a move is told in metres along the travel and across it', () => {
    expect(tell([moved(360, 351, [4, 5.5])])).toMatchObject([
      {
        corner: { number: '1' },
        thing: { kind: 'mark', mark: 'brake', role: 'target' },
        what: { deed: 'moved', ground: 'real', ahead: -9, left: 1.5 },
      },
    ])
  })

  it('a lap driven against the drawing turns both round', () => {
    const layout = { ...bookRows().layout, reversed: true }
    expect(tell([moved(360, 351, [4, 5.5])], { marks: [brake], layout })).toMatchObject([
      { what: { deed: 'moved', ahead: 9, left: -1.5 } },
    ])
  })

  it('a move across the start line is told the short way round', () => {
    expect(tell([moved(1995, 3)])).toMatchObject([{ what: { ahead: 8 } }])
  })

  it('a first place, a place taken away and a tie alone are told as that', () => {
    const here = place(360, 4) as never
    const deeds = tell([
      ofMark({ sim: { from: null, to: here } }, { operation: 'a' as OperationId }),
      ofMark({ sim: { from: here, to: null } }, { operation: 'b' as OperationId }),
      ofMark({ real: { from: here, to: place(360, 4, {} as never) as never } }, { operation: 'c' as OperationId }),
    ])
    expect(deeds.map(({ what }) => what)).toEqual([
      { deed: 'placed', ground: 'sim' },
      { deed: 'cleared', ground: 'sim' },
      { deed: 'tied', ground: 'real' },
    ])
  })

  it('what takes a change back says so; what takes an addition back drops it', () => {
    const undoes = 'before' as OperationId
    expect(tell([ofMark({ gear: { from: 4, to: 3 } }, { undoes })])).toMatchObject([{ what: { deed: 'undone' } }])
    expect(tell([ofMark({ state: { from: 'live', to: 'dropped' } }, { undoes })])).toMatchObject([
      { what: { deed: 'dropped' } },
    ])
  })

  it('a dropped mark is named by the line that made it', () => {
    const made = { state: { from: null, to: 'live' }, kind: { from: null, to: 'apex' } }
    const told = tell(
      [
        ofMark({ state: { from: 'live', to: 'dropped' } }, { operation: 'later' as OperationId }),
        ofMark({ ...made, cardId: { from: null, to: ids.secondCard } }),
      ],
      { marks: [] },
    )
    expect(told).toMatchObject([
      { corner: { number: '2' }, thing: { mark: 'apex' }, what: { deed: 'dropped' } },
      { what: { deed: 'added' } },
    ])
  })

  it('a new card goes without saying, a changed one does not', () => {
    const card = { kind: 'card', id: ids.firstCard } as const
    expect(tell([change({ target: card, set: { state: { from: null, to: 'live' } } })])).toEqual([])
    expect(tell([change({ target: card, set: { gearOut: { from: null, to: 3 } } })])).toMatchObject([
      { thing: { kind: 'card' }, what: { deed: 'set', set: { gearOut: 3 } } },
    ])
  })

  it('changes made together are one line, told by the first of them', () => {
    const batch = 'together'
    const landmark = change({
      target: { kind: 'landmark', id: kerb.id },
      set: { real: { from: { along: 490 }, to: { along: 502 } } },
      batch,
    })
    expect(tell([landmark, { ...moved(360, 372), batch }])).toMatchObject([
      { thing: { kind: 'landmark', name: 'Apex kerb' }, what: { ahead: 12 }, count: 2, alike: false },
    ])
  })

  it('the same done to several marks is told as that, of a corner only where it was one', () => {
    const batch = 'together'
    const other = mark({ id: 'm-other', card: ids.secondCard, kind: 'apex', real: place(1990, 3) })
    const same = mark({ id: 'm-same', kind: 'apex', real: place(505, 3) })
    const dropped = (id: string) =>
      change({ target: { kind: 'mark', id }, set: { state: { from: 'live', to: 'dropped' } }, batch })
    const rows = { marks: [brake, other, same] }
    expect(tell([dropped('m-brake'), dropped('m-same')], rows)).toMatchObject([
      { corner: { number: '1' }, count: 2, alike: true },
    ])
    expect(tell([dropped('m-brake'), dropped('m-other')], rows)).toMatchObject([
      { corner: null, count: 2, alike: true },
    ])
  })
})

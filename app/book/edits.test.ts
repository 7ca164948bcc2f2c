import { describe, expect, it } from 'vitest'
import { makeLapFrame } from '~/track/lap-frame'
import { along, metres, offset, station } from '~/track/units'
import { bookRows, ids, mark, place } from '../../tests/support/book-rows'
import { assembleBookView } from './assemble'
import { addMark, changeMark, dropMark, nudged, typedPlace } from './edits'
import type { MarkId } from './ids'
import { operationSchema } from './schemas'

const uuid = (tail: number) => `01933c6e-0000-7000-8000-00000000000${tail}`
const making = {
  id: uuid(1) as never,
  madeAt: '2026-10-09T10:00:00Z',
  scope: { kind: 'book' as const, id: uuid(2) as never },
}
const frame = makeLapFrame({ length: metres(2000), startAlong: along(300), reversed: true })
const given = { station: station(1999.99996), offset: offset(3.00049) }
const details = { manner: null, gear: 5, speed: 50 }
const id = uuid(3) as MarkId

describe('what a person does on a page, as operations', () => {
  it('adds a mark with the fields that were given, in metres of the drawn line', () => {
    const added = addMark(
      making,
      {
        id: uuid(3) as never,
        card: uuid(4) as never,
        kind: 'brake',
        role: 'start',
        manner: null,
        condition: uuid(5) as never,
        forPerson: null,
        gear: 5,
        speed: null,
        ground: 'sim',
        at: given,
      },
      frame,
    )
    expect(operationSchema.safeParse(added).success).toBe(true)
    expect(Object.keys(added.set).sort()).toEqual(['cardId', 'conditionId', 'gear', 'kind', 'role', 'sim', 'state'])
    expect(added.set.sim).toEqual({ from: null, to: { along: 300, across: -3, tie: null } })
  })

  const tie = {
    landmarkId: ids.kerb,
    along: { from: 'end' as const, block: null, metres: 2, lengths: 0 },
    across: null,
    words: '100 board, left',
    acrossWords: 'left wheels on the line',
  }
  const movedTo = (along: number, across: number) =>
    changeMark(making, id, 'real', { ...details, place: place(along, across, tie) }, { ...details, at: given }, frame)!

  it('moves a place from what was seen and lets go of the thing it stood at', () => {
    expect(movedTo(120, 4).set.real).toEqual({
      from: { along: 120, across: 4, tie },
      to: { along: 300, across: -3, tie: null },
    })
  })

  it('keeps the words of a tie where the mark still stands at the thing, those across only on the same line', () => {
    expect(movedTo(300.9, -3.2).set.real?.to).toMatchObject({ tie: { ...tie, along: null } })
    expect(movedTo(300.9, -3.4).set.real?.to).toMatchObject({ tie: { words: '100 board, left', acrossWords: null } })
    expect(movedTo(301.2, -3).set.real?.to).toMatchObject({ tie: null })
  })

  it('starts from the place as it is stored, so that the write path finds it unchanged', () => {
    const view = assembleBookView(bookRows({ marks: [mark({ id: 'm-one', real: place(395.123, 4) })] }))
    const stored = view.corners[0]!.marks[0]!.real!.stored
    expect(
      changeMark(making, id, 'real', { ...details, place: stored }, { ...details, at: given }, frame)?.set.real?.from,
    ).toEqual({
      along: 395.123,
      across: 4,
      tie: null,
    })
  })

  it('carries only what differs from what was seen, and nothing where nothing does', () => {
    const seen = { ...details, place: place(300, -3) }
    const same = { ...details, at: given }
    expect(changeMark(making, id, 'real', seen, same, frame)).toBeNull()
    expect(changeMark(making, id, 'real', seen, { ...same, gear: 4, manner: 'brush' }, frame)?.set).toEqual({
      gear: { from: 5, to: 4 },
      manner: { from: null, to: 'brush' },
    })
    expect(changeMark(making, id, 'sim', { ...seen, place: null }, same, frame)?.set.sim?.from).toBeNull()
  })

  it('drops a mark by its state', () => {
    expect(dropMark(making, uuid(3) as MarkId).set).toEqual({ state: { from: 'live', to: 'dropped' } })
  })

  it('nudges forward and left, over the start line too', () => {
    const view = assembleBookView(bookRows({ marks: [mark({ id: 'm-one', real: place(1999.5, -4) })] }))
    const at = view.corners[0]!.marks[0]!.real!
    expect(nudged(at, { ahead: 1, left: 1 }, frame)).toEqual({ station: 0.5, offset: -3 })
    expect(nudged({ ...at, station: station(0.25) }, { ahead: -1, left: 0 }, frame).station).toBe(1999.25)
  })

  it('takes typed metres before or after the datum and a side', () => {
    const typed = { metres: 113, side: 'before' as const, across: 4.9, hand: 'right' as const }
    expect(typedPlace(station(100), typed, frame)).toEqual({ station: 1987, offset: -4.9 })
    expect(typedPlace(station(1990), { ...typed, side: 'after', hand: 'left' }, frame)).toEqual({
      station: 103,
      offset: 4.9,
    })
  })
})

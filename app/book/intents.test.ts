import { describe, expect, it } from 'vitest'
import { makeLapFrame } from '~/track/lap-frame'
import { along, metres } from '~/track/units'
import { bookRows, ids, mark, place, placement } from '../../tests/support/book-rows'
import { assembleBookView } from './assemble'
import { type MarkIntent, operationOf, type Typed } from './intents'
import type { Place } from './place'

const making = {
  id: 'op' as never,
  madeAt: '2026-10-09T10:00:00Z',
  scope: { kind: 'book' as const, id: 'book' as never },
}
const frame = makeLapFrame({ length: metres(2000), startAlong: along(0), reversed: false })
const typed: Typed = {
  ground: 'real',
  metres: 12.3,
  side: 'before',
  across: 4,
  hand: 'left',
  moved: false,
  manner: 'trail',
  gear: null,
  speedKmh: 141.5,
}

/** An apex tied 2 m past the end of a kerb that has since been moved by 8 m: it stands elsewhere than it is stored. */
const tie: Place['tie'] = {
  landmarkId: ids.kerb,
  along: { from: 'end', block: null, metres: 2, lengths: 0 },
  across: null,
  words: 'Two metres past the kerb',
  acrossWords: null,
}
const rows = bookRows({ marks: [mark({ id: 'm-tied', kind: 'apex', real: place(513.987, -4.049, tie) })] })
const kerb = { ...rows.landmarks[0]!, real: placement(498, 528) }
const corner = assembleBookView({ ...rows, landmarks: [kerb] }).corners[0]!
const stored = corner.marks[0]!.real!.stored

const change = (more: Partial<Typed>): MarkIntent => ({
  intent: 'change',
  mark: 'm-tied' as never,
  seen: { place: stored, manner: null, gear: null, speed: null },
  typed: { ...typed, ...more },
})

describe('what a form asks of a mark', () => {
  it('leaves a place that was not moved as it is stored, with its tie, when only the speed changes', () => {
    expect(corner.marks[0]!.real!.station).toBe(530)
    expect(operationOf(change({}), making, corner, frame)?.set).toEqual({
      manner: { from: null, to: 'trail' },
      speed: { from: null, to: 1415 / 36 },
    })
  })

  it('puts a place that was moved where it was typed', () => {
    const set = operationOf(change({ moved: true, manner: null, speedKmh: null }), making, corner, frame)?.set
    expect(set).toEqual({ real: { from: stored, to: { along: 492.7, across: 4, tie: null } } })
  })

  it('takes one place away from what was seen of it', () => {
    const clear: MarkIntent = { intent: 'clear', mark: 'm-tied' as never, ground: 'real', seen: stored }
    expect(operationOf(clear, making, corner, frame)?.set).toEqual({ real: { from: stored, to: null } })
  })

  it('changes nothing where nothing differs', () => {
    expect(operationOf(change({ manner: null, speedKmh: null }), making, corner, frame)).toBeNull()
  })
})

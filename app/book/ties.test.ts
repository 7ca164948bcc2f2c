import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { metres } from '~/track/units'
import { ids, place, placement } from '../../tests/support/book-rows'
import type { Tie } from './place'
import { resolveTie } from './ties'

const LAP = { length: 2000, reversed: false, carLength: 4.6 }
const tied = (along: Tie['along']): Tie => ({
  landmarkId: ids.kerb,
  along,
  across: null,
  words: null,
  acrossWords: null,
})
const at = (along: Tie['along'], where = placement(490, 520), lap = LAP) =>
  resolveTie(place(1, 3, tied(along)), where, lap).along

describe('a tie', () => {
  it('counts car lengths with the length pinned in the book: one before the end of the kerb', () => {
    expect(at({ from: 'end', block: null, metres: 0, lengths: -1 })).toBeCloseTo(515.4, 9)
  })

  it('measures along the landmark’s own edge: the middle of a short inside edge is the middle of the road beside it', () => {
    const kerb = placement(490, 520, { edgeLength: metres(27) })
    expect(at({ from: 'middle', block: null, metres: 0, lengths: 0 }, kerb)).toBeCloseTo(505, 9)
    expect(at({ from: 'start', block: null, metres: 9, lengths: 0 }, kerb)).toBeCloseTo(500, 9)
  })

  it('goes on one to one past either end of the edge', () => {
    const kerb = placement(490, 520, { edgeLength: metres(27) })
    expect(at({ from: 'start', block: null, metres: -7, lengths: 0 }, kerb)).toBeCloseTo(483, 9)
    expect(at({ from: 'end', block: null, metres: 7, lengths: 0 }, kerb)).toBeCloseTo(527, 9)
  })

  it('finds the n-th block from the start', () => {
    const kerb = placement(490, 520, { blockLength: metres(3) })
    expect(at({ from: 'block', block: 3, metres: 0, lengths: 0 }, kerb)).toBeCloseTo(496, 9)
  })

  it('counts against the drawing on a lap driven backwards', () => {
    const lap = { ...LAP, reversed: true }
    expect(at({ from: 'start', block: null, metres: 5, lengths: 0 }, placement(490, 520), lap)).toBeCloseTo(515, 9)
  })

  it('stays where it was without a landmark on this ground or without a point along it', () => {
    expect(resolveTie(place(77, 3, tied({ from: 'end', block: null, metres: 2, lengths: 0 })), null, LAP)).toEqual({
      along: 77,
      across: 3,
    })
    expect(resolveTie(place(78, 3, tied(null)), placement(490, 520), LAP)).toEqual({ along: 78, across: 3 })
    expect(resolveTie(place(79, -3), placement(490, 520), LAP)).toEqual({ along: 79, across: -3 })
  })

  it('moves by as much as its landmark is moved, wherever the drawn line begins', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 1999, noNaN: true }),
        fc.double({ min: 1, max: 200, noNaN: true }),
        fc.double({ min: -60, max: 60, noNaN: true }),
        fc.double({ min: -50, max: 50, noNaN: true }),
        fc.boolean(),
        (start, length, shift, metresAlong, reversed) => {
          const lap = { ...LAP, reversed }
          const wrapped = (value: number) => ((value % 2000) + 2000) % 2000
          const rule = { from: 'end' as const, block: null, metres: metresAlong, lengths: 0 }
          const before = at(rule, placement(start, wrapped(start + length)), lap)
          const after = at(rule, placement(wrapped(start + shift), wrapped(start + length + shift)), lap)
          const moved = wrapped(after - before)
          expect(Math.min(Math.abs(moved - wrapped(shift)), 2000 - Math.abs(moved - wrapped(shift)))).toBeLessThan(1e-6)
        },
      ),
    )
  })
})

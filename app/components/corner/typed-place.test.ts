import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { metres, metresPerSecond, offset } from '~/track/units'
import { kmhField, placeFromTyped, typedFrom } from './typed-place'

describe('a place in a form’s fields', () => {
  it('is told without signs: metres and which side', () => {
    expect(typedFrom({ toDatum: metres(-132.96), offset: offset(-4.9) })).toEqual({
      metres: '133',
      side: 'before',
      across: '4.9',
      hand: 'right',
    })
  })

  it('comes back as it was to the millimetre', () => {
    const near = fc.integer({ min: -400_000, max: 400_000 }).map((value) => value / 1000)
    fc.assert(
      fc.property(near, near, (along, side) => {
        const back = placeFromTyped(typedFrom({ toDatum: metres(along), offset: offset(side) }, 3))
        expect(back?.toDatum).toBeCloseTo(along, 6)
        expect(back?.offset).toBeCloseTo(side, 6)
      }),
    )
  })

  it('is none while a figure is missing', () => {
    expect(placeFromTyped({ metres: '', side: 'before', across: '3', hand: 'left' })).toBeNull()
    expect(placeFromTyped({ metres: '12', side: 'before', across: undefined, hand: 'left' })).toBeNull()
  })

  it('shows a speed in km/h, nothing where there is none', () => {
    expect(kmhField(metresPerSecond(183 / 3.6))).toBe('183')
    expect(kmhField(null)).toBe('')
  })
})

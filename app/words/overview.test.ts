import { describe, expect, test } from 'vitest'
import { fromKmh, metres, type Station } from '~/track/units'
import { gapWords, heightWords, lapDirection, leastSpeedFigure, plateLabel, statesInSum } from './overview'

const plain = (text: string) => text.replaceAll('\u00a0', ' ')

describe('the overview in words', () => {
  test('states are summed with the furthest first; what no corner is in is not said', () => {
    expect(statesInSum(['draft', 'seen', 'driven', 'draft', 'seen', 'draft'])).toBe('1 driven, 2 seen on foot, 3 draft')
    expect(statesInSum(['empty', 'inherited'])).toBe('1 as in the dry, 1 without marks')
  })
  test('a flat corner says flat instead of a speed', () => {
    expect(leastSpeedFigure({ flat: true, leastSpeed: fromKmh(181) })).toBe('flat')
    expect(leastSpeedFigure({ flat: false, leastSpeed: fromKmh(67) })).toBe('67')
    expect(leastSpeedFigure({ flat: false, leastSpeed: null })).toBe('')
  })
  test('a lap turns clockwise, anticlockwise, or crosses itself', () => {
    expect([-1, 1, 0].map(lapDirection)).toEqual(['clockwise', 'anticlockwise', 'crosses itself'])
  })
  test('a plate tells number, name, direction and state', () => {
    expect(plateLabel({ number: '7A', name: 'Limpet', direction: 'left', state: 'seen' })).toBe(
      '7A Limpet, left, seen on foot',
    )
  })
  test('what is missing counts its corners', () => {
    expect(plain(gapWords('no-brake', 1))).toBe('1 corner without a brake mark:')
    expect(plain(gapWords('sim-only', 4))).toBe('Brake mark from the simulator only in 4 corners:')
  })
  test('heights are told by the corner they belong to', () => {
    const at = 120 as Station
    const note = (more: Parameters<typeof heightWords.note>[0]) => plain(heightWords.note(more))
    expect(note({ code: 'crest', at, height: metres(55), corner: 'Lookout' })).toBe('Lookout crest 55 m')
    expect(note({ code: 'crest', at, height: metres(41), corner: null })).toBe('highest 41 m')
    expect(note({ code: 'down', at, height: metres(20), metres: metres(27), corner: 'Slipway' })).toBe(
      'down 27 m to Slipway',
    )
  })
})

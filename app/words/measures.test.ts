import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { degrees, fromKmh, metres, seconds } from '~/track/units'
import {
  againstSimulator,
  count,
  formatCarLengths,
  formatDegrees,
  formatGear,
  formatGradient,
  formatKilometres,
  formatKmhFigure,
  formatMetres,
  formatNumber,
  formatRadius,
  formatSeconds,
  formatSpeed,
  formatToDatum,
} from './measures'

const plain = (text: string) => text.replaceAll('\u00a0', ' ')

describe('numbers', () => {
  test('thousands are set apart by a narrow no-break space, from 1,000 on', () => {
    expect(formatNumber(999)).toBe('999')
    expect(formatNumber(4120)).toBe('4\u202f120')
    expect(formatNumber(12_345_678)).toBe('12\u202f345\u202f678')
  })
  test('halves round away from zero, also where binary fractions fall short', () => {
    expect(formatNumber(2.5)).toBe('3')
    expect(formatNumber(1.005, 2)).toBe('1.01')
    expect(formatNumber(0.285, 2)).toBe('0.29')
  })
  test('no figure carries a minus sign', () => {
    fc.assert(
      fc.property(fc.double({ min: -40_000, max: 40_000, noNaN: true }), fc.nat(3), (value, decimals) => {
        expect(formatNumber(value, decimals)).toMatch(/^\d{1,3}(\u202f\d{3})*(\.\d+)?$/)
      }),
    )
  })
  test('the unit stands after a no-break space', () => {
    expect(formatMetres(metres(113))).toBe('113\u00a0m')
    expect(formatMetres(metres(1240.2))).toBe('1\u202f240\u00a0m')
    expect(formatKilometres(metres(4118))).toBe('4.12\u00a0km')
    expect(formatSeconds(seconds(0.566))).toBe('0.57\u00a0s')
    expect(formatSpeed(fromKmh(104))).toBe('104\u00a0km/h')
    expect(formatKmhFigure(fromKmh(137))).toBe('137')
    expect(formatDegrees(degrees(86.6))).toBe('87°')
  })
})

describe('distance to the datum', () => {
  test('a place before the datum says before, a place after it says after', () => {
    expect(plain(formatToDatum(metres(-113)))).toBe('113 before')
    expect(plain(formatToDatum(metres(14)))).toBe('14 after')
  })
  test('what rounds to nothing stands at the datum', () => {
    for (const near of [0, -0, 0.49, -0.49]) expect(plain(formatToDatum(metres(near)))).toBe('at the datum 0')
    expect(plain(formatToDatum(metres(-0.49), 1))).toBe('0.5 before')
    expect(plain(formatToDatum(metres(0.5)))).toBe('1 after')
  })
})

describe('real against simulator', () => {
  test('a real place earlier on the lap is sooner here', () => {
    expect(plain(againstSimulator(metres(-9)))).toBe('9 m sooner here')
  })
  test('a real place further on is later here', () => {
    expect(plain(againstSimulator(metres(6.4)))).toBe('6 m later here')
  })
  test('under half a metre is no difference', () => {
    expect(againstSimulator(metres(0.4))).toBe('as in the simulator')
    expect(againstSimulator(metres(-0.4))).toBe('as in the simulator')
  })
})

describe('other measures', () => {
  test('car lengths have one decimal below ten and none from ten on', () => {
    expect(plain(formatCarLengths(metres(7.82), metres(4.6)))).toBe('1.7 car lengths')
    expect(plain(formatCarLengths(metres(4.6), metres(4.6)))).toBe('1 car length')
    expect(plain(formatCarLengths(metres(46), metres(4.6)))).toBe('10 car lengths')
    expect(plain(formatCarLengths(metres(-115), metres(4.6)))).toBe('25 car lengths')
  })
  test('a radius shows two significant figures', () => {
    expect(plain(formatRadius(metres(56.4)))).toBe('56 m')
    expect(plain(formatRadius(metres(123)))).toBe('120 m')
    expect(plain(formatRadius(metres(8.43)))).toBe('8.4 m')
  })
  test('a gradient says up or down, and level where it rounds to nothing', () => {
    expect(plain(formatGradient(0.081))).toBe('8 % up')
    expect(plain(formatGradient(-0.06))).toBe('6 % down')
    expect(formatGradient(0.004)).toBe('level')
  })
  test('gears are spoken as ordinals', () => {
    expect([1, 2, 3, 4, 6].map(formatGear)).toEqual(['1st', '2nd', '3rd', '4th', '6th'])
  })
  test('a count takes the noun in the right number', () => {
    expect(plain(count(1, 'corner'))).toBe('1 corner')
    expect(plain(count(13, 'corner'))).toBe('13 corners')
    expect(plain(count(0, 'lap'))).toBe('0 laps')
  })
})

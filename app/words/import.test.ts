import { expect, test } from 'vitest'
import { metres, seconds } from '~/track/units'
import { importWords, lapTime } from './import'

test('a lap time has minutes from a minute on, and tenths', () => {
  expect(lapTime(seconds(58.26))).toBe('58.3\u00a0s')
  expect(lapTime(seconds(59.97))).toBe('1:00.0')
  expect(lapTime(seconds(92.44))).toBe('1:32.4')
  expect(lapTime(seconds(125.02))).toBe('2:05.0')
})
test('a lap says its gap only where one was too long to be taken unasked', () => {
  expect(importWords.lapFigures(metres(4117), seconds(92.4), seconds(1.4))).toBe('4.12\u00a0km, 1:32.4')
  expect(importWords.lapFigures(metres(4117), undefined, seconds(3.25))).toBe('4.12\u00a0km, a gap of 3.3\u00a0s')
})

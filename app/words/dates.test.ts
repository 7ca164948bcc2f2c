import { expect, test } from 'vitest'
import { whenWords } from './dates'

const now = '2026-10-09T18:30:00Z'

test('an instant of the day itself is told by the clock alone', () => {
  expect(whenWords('2026-10-09T07:05:00Z', now, 'UTC')).toBe('07:05')
})
test('the day is that of the zone, not of UTC', () => {
  expect(whenWords('2026-10-08T23:30:00Z', now, 'Atlantic/Azores')).toBe('8 Oct, 23:30')
  expect(whenWords('2026-10-08T23:30:00Z', now, 'Europe/Helsinki')).toBe('02:30')
})
test('an earlier year is named, without the clock', () => {
  expect(whenWords('2025-03-02T11:00:00Z', now, 'UTC')).toBe('2 Mar 2025')
})

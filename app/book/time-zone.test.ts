import { expect, test } from 'vitest'
import { isTimeZone } from './time-zone'

test.each([
  ['Atlantic/Azores', true],
  ['Pacific/Auckland', true],
  ['Atlantic/Nowhere', false],
  ['', false],
])('%j is a time zone: %s', (name, known) => {
  expect(isTimeZone(name)).toBe(known)
})

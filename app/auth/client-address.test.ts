import { expect, test } from 'vitest'
import { clientOf } from './client-address'

test('an IPv4 address is one client', () => {
  expect(clientOf('192.0.2.17')).toBe('192.0.2.17')
})
test('IPv4 written as IPv6 is the same client', () => {
  expect(clientOf('::ffff:192.0.2.17')).toBe('192.0.2.17')
})
test('addresses that share their first 64 bits are one client', () => {
  expect(clientOf('2001:db8:1:2:aaaa::1')).toBe('2001:db8:1:2::/64')
  expect(clientOf('2001:0db8:0001:0002:bbbb:cccc:dddd:eeee')).toBe('2001:db8:1:2::/64')
  expect(clientOf('fe80::1%eth0')).toBe('fe80:0:0:0::/64')
  expect(clientOf('::1')).toBe('0:0:0:0::/64')
})
test('another network is another client', () => {
  expect(clientOf('2001:db8:1:3::1')).not.toBe(clientOf('2001:db8:1:2::1'))
})

/**
 * What counts as one client for a rate limit: an IPv4 address, or the first 64 bits of an IPv6 address, since one household
 * or phone has all addresses below them. IPv4 written as IPv6 (`::ffff:192.0.2.1`) counts as IPv4.
 */
export function clientOf(address: string): string {
  const plain = address.toLowerCase().replace(/%.*$/, '')
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/.exec(plain)
  if (mapped?.[1]) return mapped[1]
  if (!plain.includes(':')) return plain
  const [head = '', tail] = plain.split('::')
  const before = head === '' ? [] : head.split(':')
  const after = tail === undefined || tail === '' ? [] : tail.split(':')
  const zeros = tail === undefined ? 0 : Math.max(0, 8 - before.length - after.length)
  const groups = [...before, ...Array<string>(zeros).fill('0'), ...after]
  return `${groups
    .slice(0, 4)
    .map((group) => group.replace(/^0+(?=.)/, ''))
    .join(':')}::/64`
}

import { createHash } from 'node:crypto'

/**
 * Canonical JSON text of plain data (RFC 8785): members sorted by UTF-16 code units, no white space, numbers and strings as
 * ECMAScript writes them. Members that are `undefined` are left out.
 * @throws TypeError for what JSON cannot hold: NaN, an infinity, a function
 */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`
  if (value !== null && typeof value === 'object') {
    const members = Object.entries(value)
      .filter(([, member]) => member !== undefined)
      .sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0))
      .map(([name, member]) => `${JSON.stringify(name)}:${canonicalJson(member)}`)
    return `{${members.join(',')}}`
  }
  if (typeof value === 'number' && !Number.isFinite(value)) throw new TypeError('JSON has no such number')
  const text = JSON.stringify(value)
  if (text === undefined) throw new TypeError(`JSON has no ${typeof value}`)
  return text
}

/** SHA-256 of a text's UTF-8 bytes, lower-case hexadecimal. */
export const sha256 = (text: string): string => createHash('sha256').update(text, 'utf8').digest('hex')

/** Whether two pieces of plain data say the same. */
export const sameJson = (a: unknown, b: unknown): boolean => canonicalJson(a) === canonicalJson(b)

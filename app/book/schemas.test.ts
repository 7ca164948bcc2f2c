import { describe, expect, it } from 'vitest'
import * as z from 'zod/mini'
import { TARGET_KINDS } from './operation'
import { FIELDS, FIXED_FIELDS, operationSchema, REQUIRED_FIELDS } from './schemas'

const id = '01933c6e-0000-7000-8000-000000000001'
const operation = {
  id,
  v: 1,
  scope: { kind: 'book', id },
  target: { kind: 'mark', id },
  set: { gear: { from: null, to: 3 } },
  madeAt: '2026-10-09T10:00:00+02:00',
}
const ok = (value: unknown) => operationSchema.safeParse(value).success

describe('what an operation may carry', () => {
  it('takes a well-formed operation and no stranger’s', () => {
    expect(ok(operation)).toBe(true)
    expect(ok({ ...operation, v: 2 })).toBe(false)
    expect(ok({ ...operation, extra: 1 })).toBe(false)
    expect(ok({ ...operation, set: {} })).toBe(false)
    expect(ok({ ...operation, madeAt: 'yesterday' })).toBe(false)
    expect(ok({ ...operation, target: { kind: 'person', id } })).toBe(false)
  })

  it('rounds metres to a millimetre and speeds to 0.1 km/h, without a negative zero', () => {
    const place = { along: 395.12349, across: -0.0004, tie: null }
    expect(z.parse(FIELDS.mark.real, place)).toEqual({ along: 395.123, across: 0, tie: null })
    expect(z.parse(FIELDS.mark.speed, 50.0001)).toBe(50)
    expect(Math.abs(z.parse(FIELDS.mark.speed, 183.04 / 3.6) * 3.6 - 183)).toBeLessThan(1e-9)
  })

  it('refuses absurd numbers', () => {
    for (const along of [Number.NaN, Number.POSITIVE_INFINITY, 50_000, '12'])
      expect(FIELDS.mark.real.safeParse({ along, across: 0, tie: null }).success, String(along)).toBe(false)
    expect(FIELDS.mark.speed.safeParse(151).success).toBe(false)
    expect(FIELDS.mark.gear.safeParse(2.5).success).toBe(false)
  })

  it('takes corner numbers as painted: digits, perhaps a letter', () => {
    for (const label of ['7', '13', '7A']) expect(FIELDS.corner.number.safeParse(label).success, label).toBe(true)
    for (const label of ['', '7a', 'A7', '123', '7 A'])
      expect(FIELDS.corner.number.safeParse(label).success, label).toBe(false)
  })

  it('names required and fixed fields that exist', () => {
    for (const kind of TARGET_KINDS)
      for (const field of [...REQUIRED_FIELDS[kind], ...FIXED_FIELDS[kind]])
        expect(Object.keys(FIELDS[kind]), `${kind}.${field}`).toContain(field)
  })
})

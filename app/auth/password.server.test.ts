import { describe, expect, test } from 'vitest'
import { hashPassword, verifyPassword } from './password.server'

describe('passwords', () => {
  test('a hash is argon2id with 19 MiB, 2 passes and 1 lane', async () => {
    expect(await hashPassword('gravel trap 41')).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/)
  })
  test('the same password hashes differently each time', async () => {
    expect(await hashPassword('gravel trap 41')).not.toBe(await hashPassword('gravel trap 41'))
  })
  test('only the right password matches its hash', async () => {
    const hashed = await hashPassword('gravel trap 41')
    expect(await verifyPassword(hashed, 'gravel trap 41')).toBe(true)
    expect(await verifyPassword(hashed, 'gravel trap 42')).toBe(false)
    expect(await verifyPassword(hashed, '')).toBe(false)
  })
  test('composed and decomposed letters are one password', async () => {
    const hashed = await hashPassword('caf\u00e9 in the paddock')
    expect(await verifyPassword(hashed, 'cafe\u0301 in the paddock')).toBe(true)
  })
  test('nobody has the password that stands in for a missing one', async () => {
    expect(await verifyPassword(null, 'stands in where nobody has a password')).toBe(false)
  })
})

import { describe, expect, it } from 'vitest'
import { readEnv } from './env.server'

const database = 'postgres://app:pw@db.lanternside.example/book'

describe('settings', () => {
  it('need a database, and nothing else', () => {
    expect(readEnv({ DATABASE_URL: database })).toMatchObject({
      PORT: 3000,
      PUBLIC_URL: 'http://localhost:3000',
      OWNER_DATABASE_URL: database,
      TRUST_PROXY_HOPS: 0,
    })
    expect(() => readEnv({})).toThrow('DATABASE_URL')
  })

  it('cannot be changed', () => {
    const env = readEnv({ DATABASE_URL: database })
    expect(() => Object.assign(env, { PORT: 4000 })).toThrow(TypeError)
  })

  it('count an empty variable as absent', () => {
    expect(readEnv({ DATABASE_URL: database, PORT: '', HOST: '' })).toMatchObject({ PORT: 3000 })
  })

  it('keep of the public address its origin', () => {
    const given = { DATABASE_URL: database, PORT: '8080', PUBLIC_URL: 'https://book.lanternside.example/teams/' }
    expect(readEnv(given).PUBLIC_URL).toBe('https://book.lanternside.example')
    expect(readEnv({ ...given, PUBLIC_URL: undefined }).PUBLIC_URL).toBe('http://localhost:8080')
  })

  it.each([
    ['PORT', '70000'],
    ['PORT', '80a'],
    ['PUBLIC_URL', 'ftp://book.lanternside.example'],
    ['DATABASE_URL', 'mysql://db.lanternside.example'],
    ['TRUST_PROXY_HOPS', '-1'],
    ['LOG_LEVEL', 'loud'],
  ])('refuse %s=%s by its name, not its value', (name, value) => {
    const read = () => readEnv({ DATABASE_URL: database, [name]: value })
    expect(read).toThrow(name)
    expect(read).not.toThrow(value)
  })

  it('name all that is wrong at once', () => {
    expect(() => readEnv({ PORT: 'x', LOG_LEVEL: 'y' })).toThrow(/PORT.*DATABASE_URL.*LOG_LEVEL/)
  })
})

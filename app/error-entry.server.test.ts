import { DrizzleQueryError } from 'drizzle-orm'
import { expect, it } from 'vitest'
import { errorEntry } from './error-entry.server'

it('an error is logged by its name, its message and where it came from', () => {
  const entry = errorEntry(new RangeError('out of the lap'))
  expect(entry).toMatchObject({ error: 'RangeError', message: 'out of the lap' })
  expect(entry.stack).toMatch(/^ +at /)
})

it('a message that stands in the stack too is logged once', () => {
  expect(errorEntry(new Error('first\n    at second')).stack).not.toMatch('second')
})

it('of a database error stays what repeats no value', () => {
  const refused = Object.assign(new Error('Key (email)=(ilse@lanternside.example) already exists'), {
    severity: 'ERROR',
    code: '23505',
    constraint: 'people_email',
    detail: 'Key (email)=(ilse@lanternside.example)',
  })
  const error = new DrizzleQueryError('insert into people values ($1)', ['ilse@lanternside.example'], refused)
  const entry = errorEntry(error)
  expect(entry).toMatchObject({ error: 'DatabaseError', code: '23505', constraint: 'people_email' })
  expect(JSON.stringify(entry)).not.toMatch('ilse')
})

it('a query that never reached the database keeps its values to itself', () => {
  const lost = Object.assign(new Error('connect ECONNREFUSED'), { code: 'ECONNREFUSED' })
  const entry = errorEntry(new DrizzleQueryError('select $1', ['ilse@lanternside.example'], lost))
  expect(JSON.stringify(entry)).not.toMatch('ilse')
  expect(entry.code).toBe('ECONNREFUSED')
})

it('what is thrown without being an error is logged by its kind alone', () => {
  expect(errorEntry('ilse@lanternside.example')).toEqual({ error: 'string' })
})

import { describe, expect, it, test } from 'vitest'
import * as schema from '~/db/schema'
import { contentTables, strayWrites } from './content-writes'
import { sourcesBelow } from './sources'

test('only operations write what a scope holds', () => {
  expect(sourcesBelow('app').flatMap(strayWrites)).toEqual([])
})

describe('the check of writes', () => {
  it('names tables that exist', () => {
    expect(Object.keys(schema)).toEqual(expect.arrayContaining(contentTables))
  })
  it.each(['db.insert(marks).values(mark)', 'tx\n  .update(cards)\n  .set(card)', 'db.delete(schema.ties)'])(
    'sees %s',
    (text) => {
      expect(strayWrites({ path: 'app/db/books.server.ts', text })).toHaveLength(1)
      expect(strayWrites({ path: 'app/db/apply/grounds.ts', text })).toEqual([])
    },
  )
  it('leaves other tables and other deletes alone', () => {
    const text = 'db.insert(books).values(book); kept.delete(key); db.select().from(marks)'
    expect(strayWrites({ path: 'app/db/books.server.ts', text })).toEqual([])
  })
})

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
  it.each([
    'db.insert(marks).values(mark)',
    'tx\n  .update(cards)\n  .set(card)',
    'db.delete(schema.ties)',
    "import { marks as table } from './schema'; db.insert(table).values(mark)",
    'const table = schema.places\ndb.delete(table)',
    'tx.execute(sql`insert into marks (id) values (1)`)',
    'tx.execute(sql`update "landmark_placements" set along = 0`)',
    'tx.execute(sql`DELETE FROM ties`)',
    'db.update(books).set({ state })',
    'db.insert(layouts).values(layout)',
  ])('sees %s', (text) => {
    expect(strayWrites({ path: 'app/db/books.server.ts', text })).toHaveLength(1)
    expect(strayWrites({ path: 'app/db/apply/grounds.ts', text })).toEqual([])
  })
  it('leaves other tables and other deletes alone', () => {
    const text = 'db.insert(cars).values(car); kept.delete(key); db.select().from(marks).for("update")'
    expect(strayWrites({ path: 'app/db/books.server.ts', text })).toEqual([])
  })
  it('lets the two commands that make a scope make it', () => {
    const text = 'db.insert(books).values(book); db.insert(layouts).values(layout)'
    expect(strayWrites({ path: 'app/db/books.server.ts', text })).toEqual([expect.stringContaining('layouts')])
    expect(strayWrites({ path: 'app/db/circuits.server.ts', text })).toEqual([expect.stringContaining('books')])
  })
})

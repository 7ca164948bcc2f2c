import { createHash } from 'node:crypto'
import { eq, sql } from 'drizzle-orm'
import { drizzle } from 'drizzle-orm/node-postgres'
import pg from 'pg'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { applyOperation } from '~/db/apply.server'
import type { Db } from '~/db/database'
import { MIGRATION_LOCK, migrateDatabase } from '~/db/migrations'
import { changes, editions } from '~/db/schema'
import { addsMark, appUrl, type Book, db, makeTeam, makeTeamBook, newId, newMark, ownerUrl, pool } from './support'

const ownerPool = new pg.Pool({ connectionString: ownerUrl })
const owner = drizzle(ownerPool)
afterAll(() => ownerPool.end())

let book: Book
const edition = newId<string>()
beforeAll(async () => {
  book = await makeTeamBook(await makeTeam())
  await applyOperation(db, book.team.coach, addsMark(book, newMark()))
  const bytes = new TextEncoder().encode('{"formatVersion":1}')
  await db.insert(editions).values({
    teamId: book.team.id,
    id: edition,
    bookId: book.view.book.id,
    number: 1,
    formatVersion: 1,
    bytes,
    sha256: createHash('sha256').update(bytes).digest('hex'),
    publishedBy: book.team.coach.person,
  })
})

/** What the database says to a statement. */
async function codeOf(connection: Db, statement: string): Promise<string> {
  try {
    await connection.transaction(async (tx) => {
      await tx.execute(sql.raw(statement))
      throw new Error('the statement was carried out')
    })
    return 'carried out'
  } catch (error) {
    const cause = (error as { cause?: { code?: string } }).cause
    return cause?.code ?? (error as Error).message
  }
}

const DENIED = '42501'
const RESTRICTED = '23001'

describe('an edition', () => {
  test('keeps its bytes, byte by byte', async () => {
    const [row] = await db.select({ bytes: editions.bytes }).from(editions).where(eq(editions.id, edition))
    expect(new TextDecoder().decode(row?.bytes)).toBe('{"formatVersion":1}')
  })

  test.each(['update editions set number = 2', 'delete from editions', 'truncate editions'])(
    'refuses the app: %s',
    async (statement) => {
      expect(await codeOf(db, statement)).toBe(DENIED)
    },
  )

  test.each(['update editions set number = 2', 'delete from editions', 'truncate editions'])(
    'refuses the owner too: %s',
    async (statement) => {
      expect(await codeOf(owner, statement)).toBe(RESTRICTED)
    },
  )

  test('whose hash is not that of its bytes is refused', async () => {
    const wrong = db.insert(editions).values({
      teamId: book.team.id,
      id: newId<string>(),
      bookId: book.view.book.id,
      number: 2,
      formatVersion: 1,
      bytes: new TextEncoder().encode('{}'),
      sha256: '0'.repeat(64),
      publishedBy: book.team.coach.person,
    })
    await expect(wrong).rejects.toMatchObject({ cause: { constraint: 'editions_sha256' } })
  })
})

describe('the app’s role', () => {
  test.each(['changes', 'findings', 'centrelines', 'grounds'])(
    'adds to %s and changes nothing in it',
    async (table) => {
      expect(await codeOf(db, `update ${table} set team_id = team_id`)).toBe(DENIED)
      expect(await codeOf(db, `delete from ${table}`)).toBe(DENIED)
      expect(await codeOf(db, `truncate ${table}`)).toBe(DENIED)
    },
  )

  test.each([
    'alter table marks add column colour text',
    'alter table editions disable trigger all',
    'drop table marks',
    'create table more (id integer)',
    'drop function editions_stay() cascade',
    'delete from books',
    'delete from marks',
  ])('cannot: %s', async (statement) => {
    expect(await codeOf(db, statement)).toBe(DENIED)
  })

  test('a row cannot point into another team', async () => {
    const other = await makeTeamBook(await makeTeam())
    const statement = sql`update marks set card_id = ${other.cards[0]} where team_id = ${book.team.id}`
    await expect(db.execute(statement)).rejects.toMatchObject({ cause: { code: '23503' } })
  })
})

describe('migrations', () => {
  test('run again, and several at once, change nothing', async () => {
    const state = async () => {
      const { rows } = await ownerPool.query('select count(*)::int as applied from drizzle.__drizzle_migrations')
      const columns = await ownerPool.query(
        "select count(*)::int as columns from information_schema.columns where table_schema = 'public'",
      )
      return [rows[0].applied, columns.rows[0].columns]
    }
    const before = await state()
    await Promise.all([1, 2, 3].map(() => migrateDatabase(ownerUrl, appUrl, 'drizzle')))
    expect(await state()).toEqual(before)
    expect(await codeOf(db, 'delete from editions')).toBe(DENIED)
  })

  test('wait for one that is under way', async () => {
    const client = await ownerPool.connect()
    await client.query('select pg_advisory_lock($1)', [MIGRATION_LOCK])
    let done = false
    const second = migrateDatabase(ownerUrl, appUrl, 'drizzle').then(() => {
      done = true
    })
    const waiting = "select 1 from pg_locks where locktype = 'advisory' and not granted and objid = $1"
    while ((await client.query(waiting, [MIGRATION_LOCK])).rowCount === 0) expect(done).toBe(false)
    expect(done).toBe(false)
    await client.query('select pg_advisory_unlock($1)', [MIGRATION_LOCK])
    client.release()
    await second
    expect(done).toBe(true)
  })

  test('the change log holds a line for each operation that wrote', async () => {
    const { rows } = await pool.query(
      'select count(*)::int as lines, max(rev) as rev from changes where book_id = $1',
      [book.id],
    )
    const [last] = await db
      .select({ rev: changes.rev })
      .from(changes)
      .where(eq(changes.bookId, book.view.book.id))
      .orderBy(sql`${changes.id} desc`)
      .limit(1)
    expect(rows[0]).toEqual({ lines: last?.rev, rev: last?.rev })
  })
})

import { sql } from 'drizzle-orm'
import {
  check,
  customType,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core'
import type { BookId, PersonId } from '~/book/ids'
import type { Json } from '~/book/operation'
import { books } from './books'
import { createdAt, instant, teamId } from './columns'
import { memberships } from './people'

const bytea = customType<{ data: Uint8Array; driverData: Buffer }>({
  dataType: () => 'bytea',
  toDriver: (bytes) => Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength),
  fromDriver: (buffer) => new Uint8Array(buffer.buffer, buffer.byteOffset, buffer.byteLength),
})

/** Largest file that an import takes in: 20 MB. */
export const IMPORT_BYTES = 20 * 1024 * 1024

/** A circuit file on its way in: kept between the steps of an import, swept when nobody came back. */
export const imports = pgTable(
  'imports',
  {
    teamId: teamId(),
    id: uuid('id').notNull(),
    personId: uuid('person_id').$type<PersonId>().notNull(),
    fileName: text('file_name').notNull(),
    bytes: bytea('bytes').notNull(),
    /** What the person chose so far. */
    options: jsonb('options').$type<Json>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    index('imports_age').on(t.createdAt),
    foreignKey({ columns: [t.teamId, t.personId], foreignColumns: [memberships.teamId, memberships.personId] }),
    check('imports_size', sql`octet_length(${t.bytes}) <= ${sql.raw(String(IMPORT_BYTES))}`),
  ],
)

/** A published copy of a book. Its bytes never change; triggers refuse update, delete and truncate. */
export const editions = pgTable(
  'editions',
  {
    teamId: teamId(),
    id: uuid('id').notNull(),
    bookId: uuid('book_id').$type<BookId>().notNull(),
    /** Counted from 1 within the book. */
    number: integer('number').notNull(),
    formatVersion: integer('format_version').notNull(),
    /** Canonical JSON (RFC 8785), UTF-8. */
    bytes: bytea('bytes').notNull(),
    /** SHA-256 of the bytes, lower-case hexadecimal. */
    sha256: text('sha256').notNull(),
    /** Its paper form, made when it was published. */
    pdf: bytea('pdf'),
    publishedBy: uuid('published_by').$type<PersonId>().notNull(),
    publishedAt: instant('published_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('editions_number').on(t.teamId, t.bookId, t.number),
    foreignKey({ columns: [t.teamId, t.bookId], foreignColumns: [books.teamId, books.id] }),
    foreignKey({ columns: [t.teamId, t.publishedBy], foreignColumns: [memberships.teamId, memberships.personId] }),
    check('editions_sha256', sql`${t.sha256} = encode(sha256(${t.bytes}), 'hex')`),
  ],
)

import { sql } from 'drizzle-orm'
import {
  bigint,
  check,
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
import type { BookId, LayoutId, OperationId, PersonId } from '~/book/ids'
import { type FieldChange, type Operation, TARGET_KINDS, type TargetKind } from '~/book/operation'
import { books } from './books'
import { layouts } from './circuits'
import { createdAt, instant, oneOf, teamId } from './columns'
import { memberships } from './people'

/**
 * `applied`: written. `nothing`: everything was so already. `proposed`: waits for a coach. `accepted`, `declined`: a coach's
 * answer to a proposal.
 */
export const OPERATION_STATUSES = ['applied', 'nothing', 'proposed', 'accepted', 'declined'] as const
export type OperationStatus = (typeof OPERATION_STATUSES)[number]

const scope = () => ({
  bookId: uuid('book_id').$type<BookId>(),
  layoutId: uuid('layout_id').$type<LayoutId>(),
})

/** Receipts: every operation that was taken in, once. */
export const operations = pgTable(
  'operations',
  {
    teamId: teamId(),
    id: uuid('id').$type<OperationId>().notNull(),
    /** Order of arrival within the database: operations of one transaction share their instant. */
    arrival: bigint('arrival', { mode: 'number' }).generatedAlwaysAsIdentity().notNull(),
    ...scope(),
    /** Who sent it; null for a job. */
    personId: uuid('person_id').$type<PersonId>(),
    /** SHA-256 of the body's canonical JSON. */
    bodyHash: text('body_hash').notNull(),
    body: jsonb('body').$type<Operation>().notNull(),
    status: text('status').$type<OperationStatus>().notNull(),
    /** The scope's revision after it. */
    rev: integer('rev').notNull(),
    batch: uuid('batch'),
    createdAt: createdAt(),
    decidedBy: uuid('decided_by').$type<PersonId>(),
    decidedAt: instant('decided_at'),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('operations_person').on(t.personId, t.id),
    index('operations_proposed').on(t.teamId, t.arrival).where(sql`status = 'proposed'`),
    index('operations_batch').on(t.teamId, t.batch),
    foreignKey({ columns: [t.teamId, t.bookId], foreignColumns: [books.teamId, books.id] }),
    foreignKey({ columns: [t.teamId, t.layoutId], foreignColumns: [layouts.teamId, layouts.id] }),
    foreignKey({ columns: [t.teamId, t.personId], foreignColumns: [memberships.teamId, memberships.personId] }),
    foreignKey({ columns: [t.teamId, t.decidedBy], foreignColumns: [memberships.teamId, memberships.personId] }),
    oneOf('operations_status', t.status, OPERATION_STATUSES),
    check('operations_scope', sql`num_nonnulls(${t.bookId}, ${t.layoutId}) = 1`),
  ],
)

/** The change log: one line for each operation that changed something, with what was really written. Only ever added. */
export const changes = pgTable(
  'changes',
  {
    teamId: teamId(),
    /** Order of writing within the database. */
    id: bigint('id', { mode: 'number' }).generatedAlwaysAsIdentity().notNull(),
    ...scope(),
    rev: integer('rev').notNull(),
    operationId: uuid('operation_id').$type<OperationId>().notNull(),
    targetKind: text('target_kind').$type<TargetKind>().notNull(),
    targetId: uuid('target_id').notNull(),
    set: jsonb('set').$type<Record<string, FieldChange>>().notNull(),
    reason: text('reason'),
    undoes: uuid('undoes').$type<OperationId>(),
    batch: uuid('batch'),
    /** Whose change it is; null for a job's. */
    byId: uuid('by_id').$type<PersonId>(),
    /** The coach who accepted it, where it was a proposal. */
    acceptedBy: uuid('accepted_by').$type<PersonId>(),
    madeAt: instant('made_at').notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('changes_book_rev').on(t.teamId, t.bookId, t.rev),
    unique('changes_layout_rev').on(t.teamId, t.layoutId, t.rev),
    unique('changes_operation').on(t.teamId, t.operationId),
    index('changes_batch').on(t.teamId, t.batch),
    foreignKey({ columns: [t.teamId, t.bookId], foreignColumns: [books.teamId, books.id] }),
    foreignKey({ columns: [t.teamId, t.layoutId], foreignColumns: [layouts.teamId, layouts.id] }),
    foreignKey({ columns: [t.teamId, t.operationId], foreignColumns: [operations.teamId, operations.id] }),
    foreignKey({ columns: [t.teamId, t.byId], foreignColumns: [memberships.teamId, memberships.personId] }),
    foreignKey({ columns: [t.teamId, t.acceptedBy], foreignColumns: [memberships.teamId, memberships.personId] }),
    oneOf('changes_target_kind', t.targetKind, TARGET_KINDS),
    check('changes_scope', sql`num_nonnulls(${t.bookId}, ${t.layoutId}) = 1`),
  ],
)

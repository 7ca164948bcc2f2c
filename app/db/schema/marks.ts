import { sql } from 'drizzle-orm'
import { check, foreignKey, index, integer, pgTable, primaryKey, text, unique, uuid } from 'drizzle-orm/pg-core'
import type { BookId, CardId, ConditionId, FindingId, LandmarkId, MarkId, PersonId } from '~/book/ids'
import {
  BRAKE_ROLES,
  type BrakeRole,
  FINDING_METHODS,
  FINDING_VERDICTS,
  type FindingMethod,
  type FindingVerdict,
  GROUNDS,
  type Ground,
  MANNERS,
  MARK_KINDS,
  type Manner,
  type MarkKind,
  PROOFS,
  type Proof,
} from '~/book/kinds'
import type { Tie } from '~/book/place'
import { cards, conditions } from './books'
import { createdAt, instant, madeBy, measure, oneOf, teamId } from './columns'
import { CONTENT_STATES, type ContentState, landmarks } from './landmarks'
import { memberships } from './people'

/** One reference of a card. */
export const marks = pgTable(
  'marks',
  {
    teamId: teamId(),
    id: uuid('id').$type<MarkId>().notNull(),
    bookId: uuid('book_id').$type<BookId>().notNull(),
    cardId: uuid('card_id').$type<CardId>().notNull(),
    kind: text('kind').$type<MarkKind>().notNull(),
    role: text('role').$type<BrakeRole>(),
    manner: text('manner').$type<Manner>(),
    conditionId: uuid('condition_id').$type<ConditionId>().notNull(),
    /** null: for everyone of the book. */
    forPerson: uuid('for_person').$type<PersonId>(),
    gear: integer('gear'),
    downshifts: integer('downshifts'),
    speed: measure('speed'),
    state: text('state').$type<ContentState>().notNull(),
    madeBy: madeBy(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('marks_of_book').on(t.teamId, t.bookId, t.id),
    foreignKey({
      columns: [t.teamId, t.bookId, t.cardId],
      foreignColumns: [cards.teamId, cards.bookId, cards.id],
    }),
    foreignKey({
      columns: [t.teamId, t.bookId, t.conditionId],
      foreignColumns: [conditions.teamId, conditions.bookId, conditions.id],
    }),
    foreignKey({ columns: [t.teamId, t.forPerson], foreignColumns: [memberships.teamId, memberships.personId] }),
    foreignKey({ columns: [t.teamId, t.madeBy], foreignColumns: [memberships.teamId, memberships.personId] }),
    oneOf('marks_kind', t.kind, MARK_KINDS),
    oneOf('marks_role', t.role, BRAKE_ROLES),
    oneOf('marks_manner', t.manner, MANNERS),
    oneOf('marks_state', t.state, CONTENT_STATES),
    check('marks_brake_role', sql`${t.role} is null or ${t.kind} = 'brake'`),
  ],
)

/** Where a mark is on one ground: metres of the drawn line, of the car's centre. The two grounds are kept apart for ever. */
export const places = pgTable(
  'places',
  {
    teamId: teamId(),
    markId: uuid('mark_id').$type<MarkId>().notNull(),
    ground: text('ground').$type<Ground>().notNull(),
    along: measure('along').notNull(),
    across: measure('across').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.markId, t.ground] }),
    foreignKey({ columns: [t.teamId, t.markId], foreignColumns: [marks.teamId, marks.id] }),
    oneOf('places_ground', t.ground, GROUNDS),
  ],
)

const TIE_POINTS = ['start', 'middle', 'end', 'block'] as const
const TIE_PARTS = ['left-wheels', 'right-wheels', 'centre'] as const
const TIE_EDGES = ['left-line', 'right-line', 'left-edge', 'right-edge', 'kerb', 'middle'] as const

/** How a place hangs on a landmark; each part may be left open. Gone with its place. */
export const ties = pgTable(
  'ties',
  {
    teamId: teamId(),
    markId: uuid('mark_id').$type<MarkId>().notNull(),
    ground: text('ground').$type<Ground>().notNull(),
    landmarkId: uuid('landmark_id').$type<LandmarkId>(),
    alongFrom: text('along_from').$type<NonNullable<Tie['along']>['from']>(),
    alongBlock: integer('along_block'),
    alongMetres: measure('along_metres'),
    alongLengths: measure('along_lengths'),
    acrossPart: text('across_part').$type<NonNullable<Tie['across']>['part']>(),
    acrossOn: text('across_on').$type<NonNullable<Tie['across']>['on']>(),
    acrossMetres: measure('across_metres'),
    words: text('words'),
    acrossWords: text('across_words'),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.markId, t.ground] }),
    index('ties_landmark').on(t.teamId, t.landmarkId),
    foreignKey({
      columns: [t.teamId, t.markId, t.ground],
      foreignColumns: [places.teamId, places.markId, places.ground],
    }).onDelete('cascade'),
    foreignKey({ columns: [t.teamId, t.landmarkId], foreignColumns: [landmarks.teamId, landmarks.id] }),
    oneOf('ties_along_from', t.alongFrom, TIE_POINTS),
    oneOf('ties_across_part', t.acrossPart, TIE_PARTS),
    oneOf('ties_across_on', t.acrossOn, TIE_EDGES),
    check('ties_along', sql`num_nonnulls(${t.alongFrom}, ${t.alongMetres}, ${t.alongLengths}) in (0, 3)`),
    check('ties_across', sql`num_nonnulls(${t.acrossPart}, ${t.acrossOn}, ${t.acrossMetres}) in (0, 3)`),
  ],
)

/** What someone found of a mark's place. Only ever added. */
export const findings = pgTable(
  'findings',
  {
    teamId: teamId(),
    id: uuid('id').$type<FindingId>().notNull(),
    bookId: uuid('book_id').$type<BookId>().notNull(),
    markId: uuid('mark_id').$type<MarkId>().notNull(),
    ground: text('ground').$type<Ground>().notNull(),
    /** Whose proof it is. */
    personId: uuid('person_id').$type<PersonId>().notNull(),
    /** Who said, saw or drove it. */
    byId: uuid('by_id').$type<PersonId>().notNull(),
    conditionId: uuid('condition_id').$type<ConditionId>().notNull(),
    verdict: text('verdict').$type<FindingVerdict>().notNull(),
    proof: text('proof').$type<Proof>().notNull(),
    method: text('method').$type<FindingMethod>().notNull(),
    /** Metres, as the device told it. */
    accuracy: measure('accuracy'),
    /** Where it was found: metres of the drawn line. */
    along: measure('along').notNull(),
    across: measure('across').notNull(),
    foundAt: instant('found_at').notNull(),
    note: text('note').notNull().default(''),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    index('findings_book').on(t.teamId, t.bookId, t.markId),
    foreignKey({
      columns: [t.teamId, t.bookId, t.markId],
      foreignColumns: [marks.teamId, marks.bookId, marks.id],
    }),
    foreignKey({
      columns: [t.teamId, t.bookId, t.conditionId],
      foreignColumns: [conditions.teamId, conditions.bookId, conditions.id],
    }),
    foreignKey({ columns: [t.teamId, t.personId], foreignColumns: [memberships.teamId, memberships.personId] }),
    foreignKey({ columns: [t.teamId, t.byId], foreignColumns: [memberships.teamId, memberships.personId] }),
    oneOf('findings_ground', t.ground, GROUNDS),
    oneOf('findings_verdict', t.verdict, FINDING_VERDICTS),
    oneOf('findings_proof', t.proof, PROOFS),
    oneOf('findings_method', t.method, FINDING_METHODS),
  ],
)

import { sql } from 'drizzle-orm'
import {
  boolean,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core'
import type { BookId, CardId, CarId, ConditionId, CornerId, LayoutId } from '~/book/ids'
import { CONDITION_KINDS, type ConditionKind } from '~/book/kinds'
import type { KerbNote } from '~/book/place'
import { corners, layouts } from './circuits'
import { createdAt, madeBy, measure, oneOf, teamId } from './columns'
import { CONTENT_STATES, type ContentState } from './landmarks'
import { memberships, teams } from './people'

export const cars = pgTable(
  'cars',
  {
    teamId: teamId().references(() => teams.id),
    id: uuid('id').$type<CarId>().notNull(),
    name: text('name').notNull(),
    length: measure('length').notNull(),
    width: measure('width').notNull(),
    /** Height of the driver's eye over the road. */
    eyeHeight: measure('eye_height').notNull(),
    state: text('state').$type<ContentState>().notNull().default('live'),
    madeBy: madeBy(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    foreignKey({ columns: [t.teamId, t.madeBy], foreignColumns: [memberships.teamId, memberships.personId] }),
    oneOf('cars_state', t.state, CONTENT_STATES),
  ],
)

/** One team's notebook for one layout and one car. A scope of operations. */
export const books = pgTable(
  'books',
  {
    teamId: teamId(),
    id: uuid('id').$type<BookId>().notNull(),
    slug: text('slug').notNull(),
    name: text('name').notNull(),
    layoutId: uuid('layout_id').$type<LayoutId>().notNull(),
    carId: uuid('car_id').$type<CarId>().notNull(),
    /** The car's length when the book was made: what its car lengths mean, whatever the car becomes. */
    carLength: measure('car_length').notNull(),
    rev: integer('rev').notNull().default(0),
    state: text('state').$type<'live' | 'archived'>().notNull().default('live'),
    copiedFrom: uuid('copied_from').$type<BookId>(),
    madeBy: madeBy(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('books_slug').on(t.teamId, t.slug),
    index('books_layout').on(t.teamId, t.layoutId),
    foreignKey({ columns: [t.teamId, t.layoutId], foreignColumns: [layouts.teamId, layouts.id] }),
    foreignKey({ columns: [t.teamId, t.carId], foreignColumns: [cars.teamId, cars.id] }),
    foreignKey({ columns: [t.teamId, t.copiedFrom], foreignColumns: [t.teamId, t.id] }),
    foreignKey({ columns: [t.teamId, t.madeBy], foreignColumns: [memberships.teamId, memberships.personId] }),
    oneOf('books_state', t.state, ['live', 'archived']),
  ],
)

export const conditions = pgTable(
  'conditions',
  {
    teamId: teamId(),
    id: uuid('id').$type<ConditionId>().notNull(),
    bookId: uuid('book_id').$type<BookId>().notNull(),
    kind: text('kind').$type<ConditionKind>().notNull(),
    name: text('name').notNull(),
    /** Order in lists, compared byte by byte. */
    rank: text('rank').notNull(),
    state: text('state').$type<ContentState>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('conditions_of_book').on(t.teamId, t.bookId, t.id),
    foreignKey({ columns: [t.teamId, t.bookId], foreignColumns: [books.teamId, books.id] }),
    oneOf('conditions_kind', t.kind, CONDITION_KINDS),
    oneOf('conditions_state', t.state, CONTENT_STATES),
  ],
)

/** What a book says of one corner: one card for each corner, as long as the corner lives. */
export const cards = pgTable(
  'cards',
  {
    teamId: teamId(),
    id: uuid('id').$type<CardId>().notNull(),
    bookId: uuid('book_id').$type<BookId>().notNull(),
    cornerId: uuid('corner_id').$type<CornerId>().notNull(),
    gearIn: integer('gear_in'),
    gearOut: integer('gear_out'),
    speedIn: measure('speed_in'),
    leastSpeed: measure('least_speed'),
    flat: boolean('flat').notNull().default(false),
    noReference: boolean('no_reference').notNull().default(false),
    line: text('line').notNull().default(''),
    kerbs: jsonb('kerbs').$type<KerbNote[]>().notNull().default(sql`'[]'::jsonb`),
    surface: text('surface').notNull().default(''),
    water: text('water').notNull().default(''),
    car: text('car').notNull().default(''),
    mistake: text('mistake').notNull().default(''),
    traffic: text('traffic').notNull().default(''),
    limits: text('limits').notNull().default(''),
    backup: text('backup').notNull().default(''),
    next: text('next').notNull().default(''),
    setsUp: uuid('sets_up').$type<CornerId>(),
    compromisedFor: uuid('compromised_for').$type<CornerId>(),
    state: text('state').$type<'live'>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('cards_of_book').on(t.teamId, t.bookId, t.id),
    uniqueIndex('cards_corner').on(t.teamId, t.bookId, t.cornerId),
    foreignKey({ columns: [t.teamId, t.bookId], foreignColumns: [books.teamId, books.id] }),
    foreignKey({ columns: [t.teamId, t.cornerId], foreignColumns: [corners.teamId, corners.id] }),
    foreignKey({ columns: [t.teamId, t.setsUp], foreignColumns: [corners.teamId, corners.id] }),
    foreignKey({ columns: [t.teamId, t.compromisedFor], foreignColumns: [corners.teamId, corners.id] }),
    oneOf('cards_state', t.state, ['live']),
  ],
)

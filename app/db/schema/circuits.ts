import { sql } from 'drizzle-orm'
import {
  boolean,
  check,
  doublePrecision,
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
import type { FeatureCollection } from 'geojson'
import type { CircuitId, CornerId, GeometryHash, LayoutId } from '~/book/ids'
import { TURN_DIRECTIONS, type TurnDirection } from '~/book/kinds'
import type { Position } from '~/track/units'
import { createdAt, madeBy, measure, oneOf, teamId } from './columns'
import { memberships, teams } from './people'

export const circuits = pgTable(
  'circuits',
  {
    teamId: teamId().references(() => teams.id),
    id: uuid('id').$type<CircuitId>().notNull(),
    slug: text('slug').notNull(),
    name: text('name').notNull(),
    /** IANA zone of the circuit's clock. */
    timeZone: text('time_zone').notNull(),
    madeBy: madeBy(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('circuits_slug').on(t.teamId, t.slug),
    foreignKey({ columns: [t.teamId, t.madeBy], foreignColumns: [memberships.teamId, memberships.personId] }),
  ],
)

const hash = (name: string) => text(name).$type<GeometryHash>()
const isHash = (name: string, column: ReturnType<typeof sql>) => check(name, sql`${column} ~ '^[0-9a-f]{64}$'`)

/** Centrelines as drawn, named by the SHA-256 of their positions' canonical JSON; never changed, never removed. */
export const centrelines = pgTable(
  'centrelines',
  {
    teamId: teamId().references(() => teams.id),
    hash: hash('hash').notNull(),
    /** GeoJSON positions in drawing order, the first not repeated. */
    positions: jsonb('positions').$type<Position[]>().notNull(),
    /** Metres of the closed ring. */
    length: measure('length').notNull(),
    /** The ring in the small, for lists: as `outlineOf` makes it. */
    outline: doublePrecision('outline').array().notNull(),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.hash] }), isHash('centrelines_hash', sql`${t.hash}`)],
)

/** What surrounds the road (gravel, buildings, coast, pit lane), as one GeoJSON object named by hash; never changed. */
export const grounds = pgTable(
  'grounds',
  {
    teamId: teamId().references(() => teams.id),
    hash: hash('hash').notNull(),
    features: jsonb('features').$type<FeatureCollection>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.hash] }), isHash('grounds_hash', sql`${t.hash}`)],
)

/** A way round a circuit: a drawn line, where its start line lies on it and which way it is driven. A scope of operations. */
export const layouts = pgTable(
  'layouts',
  {
    teamId: teamId(),
    id: uuid('id').$type<LayoutId>().notNull(),
    circuitId: uuid('circuit_id').$type<CircuitId>().notNull(),
    name: text('name').notNull(),
    centrelineHash: hash('centreline_hash').notNull(),
    groundHash: hash('ground_hash'),
    /** Metres of the drawn line. */
    startAlong: measure('start_along').notNull(),
    reversed: boolean('reversed').notNull(),
    roadWidth: measure('road_width').notNull(),
    /** The centreline's length, kept here so that stations need no geometry. */
    length: measure('length').notNull(),
    supersedes: uuid('supersedes').$type<LayoutId>(),
    rev: integer('rev').notNull().default(0),
    state: text('state').$type<'live' | 'archived'>().notNull().default('live'),
    madeBy: madeBy(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    index('layouts_circuit').on(t.teamId, t.circuitId),
    foreignKey({ columns: [t.teamId, t.circuitId], foreignColumns: [circuits.teamId, circuits.id] }),
    foreignKey({ columns: [t.teamId, t.centrelineHash], foreignColumns: [centrelines.teamId, centrelines.hash] }),
    foreignKey({ columns: [t.teamId, t.groundHash], foreignColumns: [grounds.teamId, grounds.hash] }),
    foreignKey({ columns: [t.teamId, t.supersedes], foreignColumns: [t.teamId, t.id] }),
    foreignKey({ columns: [t.teamId, t.madeBy], foreignColumns: [memberships.teamId, memberships.personId] }),
    oneOf('layouts_state', t.state, ['live', 'archived']),
  ],
)

export const CORNER_STATES = ['live', 'dropped', 'merged'] as const

/** Corners. The id is stable, the number is a label. All places are metres of the drawn line. */
export const corners = pgTable(
  'corners',
  {
    teamId: teamId(),
    id: uuid('id').$type<CornerId>().notNull(),
    layoutId: uuid('layout_id').$type<LayoutId>().notNull(),
    number: text('number').notNull(),
    name: text('name').notNull(),
    /** Of the line as drawn. */
    direction: text('direction').$type<TurnDirection>().notNull(),
    turnDegrees: measure('turn_degrees').notNull(),
    leastRadius: measure('least_radius').notNull(),
    entry: measure('entry').notNull(),
    apex: measure('apex').notNull(),
    exit: measure('exit').notNull(),
    datumAlong: measure('datum_along').notNull(),
    datumWords: text('datum_words').notNull(),
    state: text('state').$type<(typeof CORNER_STATES)[number]>().notNull(),
    /** The corner that took a merged one in. */
    mergedInto: uuid('merged_into').$type<CornerId>(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    unique('corners_of_layout').on(t.teamId, t.layoutId, t.id),
    foreignKey({ columns: [t.teamId, t.layoutId], foreignColumns: [layouts.teamId, layouts.id] }),
    foreignKey({
      columns: [t.teamId, t.layoutId, t.mergedInto],
      foreignColumns: [t.teamId, t.layoutId, t.id],
    }),
    oneOf('corners_direction', t.direction, TURN_DIRECTIONS),
    oneOf('corners_state', t.state, CORNER_STATES),
    check('corners_merged', sql`(${t.state} = 'merged') = (${t.mergedInto} is not null)`),
  ],
)

import { foreignKey, index, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core'
import type { CornerId, LandmarkId, LayoutId, StretchId } from '~/book/ids'
import { GROUNDS, type Ground, LANDMARK_KINDS, type LandmarkKind, STRETCH_KINDS, type StretchKind } from '~/book/kinds'
import { corners, layouts } from './circuits'
import { createdAt, madeBy, measure, oneOf, teamId } from './columns'
import { memberships } from './people'

export const CONTENT_STATES = ['live', 'dropped'] as const
export type ContentState = (typeof CONTENT_STATES)[number]

/** A thing on the ground; a layout's. */
export const landmarks = pgTable(
  'landmarks',
  {
    teamId: teamId(),
    id: uuid('id').$type<LandmarkId>().notNull(),
    layoutId: uuid('layout_id').$type<LayoutId>().notNull(),
    kind: text('kind').$type<LandmarkKind>().notNull(),
    name: text('name').notNull(),
    /** What is written on it: a name, not a measure. */
    text: text('text'),
    cornerId: uuid('corner_id').$type<CornerId>(),
    height: measure('height'),
    state: text('state').$type<ContentState>().notNull(),
    madeBy: madeBy(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    index('landmarks_layout').on(t.teamId, t.layoutId),
    foreignKey({ columns: [t.teamId, t.layoutId], foreignColumns: [layouts.teamId, layouts.id] }),
    foreignKey({
      columns: [t.teamId, t.layoutId, t.cornerId],
      foreignColumns: [corners.teamId, corners.layoutId, corners.id],
    }),
    foreignKey({ columns: [t.teamId, t.madeBy], foreignColumns: [memberships.teamId, memberships.personId] }),
    oneOf('landmarks_kind', t.kind, LANDMARK_KINDS),
    oneOf('landmarks_state', t.state, CONTENT_STATES),
  ],
)

/** A length of road with a property of its own: surface, grip, camber, a part the simulator lacks. */
export const stretches = pgTable(
  'stretches',
  {
    teamId: teamId(),
    id: uuid('id').$type<StretchId>().notNull(),
    layoutId: uuid('layout_id').$type<LayoutId>().notNull(),
    kind: text('kind').$type<StretchKind>().notNull(),
    name: text('name').notNull(),
    state: text('state').$type<ContentState>().notNull(),
    madeBy: madeBy(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.id] }),
    index('stretches_layout').on(t.teamId, t.layoutId),
    foreignKey({ columns: [t.teamId, t.layoutId], foreignColumns: [layouts.teamId, layouts.id] }),
    foreignKey({ columns: [t.teamId, t.madeBy], foreignColumns: [memberships.teamId, memberships.personId] }),
    oneOf('stretches_kind', t.kind, STRETCH_KINDS),
    oneOf('stretches_state', t.state, CONTENT_STATES),
  ],
)

/** Where a thing stands on one ground: metres of the drawn line, left positive. */
const placement = () => ({
  ground: text('ground').$type<Ground>().notNull(),
  along: measure('along').notNull(),
  until: measure('until'),
  across: measure('across'),
  acrossTo: measure('across_to'),
  edgeLength: measure('edge_length'),
  blockLength: measure('block_length'),
  width: measure('width'),
  words: text('words'),
})

export const landmarkPlacements = pgTable(
  'landmark_placements',
  { teamId: teamId(), landmarkId: uuid('landmark_id').$type<LandmarkId>().notNull(), ...placement() },
  (t) => [
    primaryKey({ columns: [t.teamId, t.landmarkId, t.ground] }),
    foreignKey({ columns: [t.teamId, t.landmarkId], foreignColumns: [landmarks.teamId, landmarks.id] }),
    oneOf('landmark_placements_ground', t.ground, GROUNDS),
  ],
)

export const stretchPlacements = pgTable(
  'stretch_placements',
  { teamId: teamId(), stretchId: uuid('stretch_id').$type<StretchId>().notNull(), ...placement() },
  (t) => [
    primaryKey({ columns: [t.teamId, t.stretchId, t.ground] }),
    foreignKey({ columns: [t.teamId, t.stretchId], foreignColumns: [stretches.teamId, stretches.id] }),
    oneOf('stretch_placements_ground', t.ground, GROUNDS),
  ],
)

import * as z from 'zod/mini'
import { toMillimetre } from '~/track/units'
import {
  BRAKE_ROLES,
  CONDITION_KINDS,
  LANDMARK_KINDS,
  MANNERS,
  MARK_KINDS,
  STATES,
  STRETCH_KINDS,
  TURN_DIRECTIONS,
} from './kinds'
import { OPERATION_VERSION, TARGET_KINDS, type TargetKind } from './operation'

/** Schemas of everything an operation may carry: the only gate between what was sent and what is written. */

const METRES_LIMIT = 40_000
const SPEED_LIMIT = 150

/** Metres rounded to 1 mm, so that two devices that mean the same place say the same number. */
export const lengthSchema = z.pipe(
  z.number().check(z.gte(-METRES_LIMIT), z.lte(METRES_LIMIT)),
  z.transform(toMillimetre),
)
const length = lengthSchema
/** Speed in m/s on the grid of 0.1 km/h. */
const speed = z.pipe(
  z.number().check(z.gte(0), z.lte(SPEED_LIMIT)),
  z.transform((value: number) => Math.round(value * 36) / 36),
)
const angle = z.number().check(z.gte(0), z.lte(1080))
const gear = z.int().check(z.gte(1), z.lte(10))
const id = z.uuid()
const name = z.string().check(z.trim(), z.minLength(1), z.maxLength(80))
const text = z.string().check(z.maxLength(2000))
const shortText = z.string().check(z.trim(), z.maxLength(200))
const rank = z.string().check(z.minLength(1), z.maxLength(200))
const state = z.enum(STATES)

const tie = z.strictObject({
  landmarkId: z.nullable(id),
  along: z.nullable(
    z.strictObject({
      from: z.enum(['start', 'middle', 'end', 'block']),
      block: z.nullable(z.int().check(z.gte(1), z.lte(500))),
      metres: length,
      lengths: z.number().check(z.gte(-200), z.lte(200)),
    }),
  ),
  across: z.nullable(
    z.strictObject({
      part: z.enum(['left-wheels', 'right-wheels', 'centre']),
      on: z.enum(['left-line', 'right-line', 'left-edge', 'right-edge', 'kerb', 'middle']),
      metres: length,
    }),
  ),
  words: z.nullable(shortText),
  acrossWords: z.nullable(shortText),
})
/** A place as an operation carries it. */
export const placeSchema = z.strictObject({ along: length, across: length, tie: z.nullable(tie) })
const placement = z.strictObject({
  along: length,
  until: z.nullable(length),
  across: z.nullable(length),
  acrossTo: z.nullable(length),
  edgeLength: z.nullable(length),
  blockLength: z.nullable(length),
  width: z.nullable(length),
  words: z.nullable(shortText),
})
const datum = z.strictObject({ along: length, words: shortText })
const kerbs = z.array(z.strictObject({ part: shortText, words: text })).check(z.maxLength(12))

/**
 * Fields of each target kind. `null` is a value of every field but `state` of a thing that exists: it means "empty". Fields
 * under `fixed` are set when the thing is made and never again.
 */
export const FIELDS = {
  book: { state, name },
  condition: { state, kind: z.enum(CONDITION_KINDS), name, rank },
  card: {
    state,
    cornerId: id,
    gearIn: gear,
    gearOut: gear,
    speedIn: speed,
    leastSpeed: speed,
    flat: z.boolean(),
    noReference: z.boolean(),
    line: text,
    kerbs,
    surface: text,
    water: text,
    car: text,
    mistake: text,
    traffic: text,
    limits: text,
    backup: text,
    next: text,
    setsUp: id,
    compromisedFor: id,
  },
  mark: {
    state,
    cardId: id,
    kind: z.enum(MARK_KINDS),
    role: z.enum(BRAKE_ROLES),
    manner: z.enum(MANNERS),
    conditionId: id,
    forPerson: id,
    gear,
    downshifts: gear,
    speed,
    sim: placeSchema,
    real: placeSchema,
  },
  layout: { state, name, startAlong: length, reversed: z.boolean(), roadWidth: length },
  corner: {
    state,
    number: z.string().check(z.trim(), z.regex(/^[0-9]{1,2}[A-Z]?$/)),
    name,
    direction: z.enum(TURN_DIRECTIONS),
    turnDegrees: angle,
    leastRadius: length,
    entry: length,
    apex: length,
    exit: length,
    datum,
    mergedInto: id,
  },
  landmark: {
    state,
    kind: z.enum(LANDMARK_KINDS),
    name,
    text: shortText,
    cornerId: id,
    height: length,
    real: placement,
    sim: placement,
  },
  stretch: { state, kind: z.enum(STRETCH_KINDS), name, real: placement, sim: placement },
} as const satisfies Record<TargetKind, Record<string, z.ZodMiniType>>

/** Fields that cannot be changed once the thing exists. */
export const FIXED_FIELDS: Record<TargetKind, readonly string[]> = {
  book: [],
  condition: ['kind'],
  card: ['cornerId'],
  mark: ['kind'],
  layout: [],
  corner: [],
  landmark: ['kind'],
  stretch: ['kind'],
}

/** Fields that must be given, not null, when a thing is made. */
export const REQUIRED_FIELDS: Record<TargetKind, readonly string[]> = {
  book: ['name'],
  condition: ['kind', 'name', 'rank'],
  card: ['cornerId'],
  mark: ['cardId', 'kind', 'conditionId'],
  layout: ['name', 'startAlong', 'reversed', 'roadWidth'],
  corner: ['number', 'name', 'direction', 'turnDegrees', 'leastRadius', 'entry', 'apex', 'exit', 'datum'],
  landmark: ['kind', 'name'],
  stretch: ['kind', 'name'],
}

const change = z.strictObject({ from: z.json(), to: z.json() })

/** The frame of an operation; field values are checked against `FIELDS` afterwards. */
export const operationSchema = z.strictObject({
  id,
  v: z.literal(OPERATION_VERSION),
  scope: z.strictObject({ kind: z.enum(['book', 'layout']), id }),
  target: z.strictObject({ kind: z.enum(TARGET_KINDS), id }),
  set: z
    .record(z.string(), change)
    .check(z.refine((set) => Object.keys(set).length > 0 && Object.keys(set).length <= 40)),
  madeAt: z.iso.datetime({ offset: true }),
  reason: z.optional(z.string().check(z.maxLength(500))),
  undoes: z.optional(id),
  batch: z.optional(id),
})

import type * as z from 'zod/mini'
import { ROAD_WIDTH } from '~/book/limits'
import type { FieldChange, Json, TargetKind } from '~/book/operation'
import { FIELDS, FIXED_FIELDS, REQUIRED_FIELDS } from '~/book/schemas'
import { wrap } from '~/track/lap-frame'
import { toMillimetre } from '~/track/units'
import { sameJson } from '../canonical'
import { rangeProblems } from '../checks'

/** Values of a target's fields, in their normal form: what is compared and written. */
export type Values = Record<string, Json>

/** What is wrong with one field of an operation. */
export interface Problem {
  field: string
  code: string
}

/** Fields that are never null once a thing exists: what null stands for in them. */
const EMPTY: Partial<Record<TargetKind, Values>> = {
  card: {
    flat: false,
    noReference: false,
    kerbs: [],
    line: '',
    surface: '',
    water: '',
    car: '',
    mistake: '',
    traffic: '',
    limits: '',
    backup: '',
    next: '',
  },
}

const SCHEMAS: Record<TargetKind, Record<string, z.ZodMiniType>> = FIELDS

/** The states a thing of each kind may be put into. A card lives as long as its corner. */
const STATES_OF: Record<TargetKind, readonly string[]> = {
  book: ['live', 'archived'],
  condition: ['live', 'dropped'],
  card: ['live'],
  mark: ['live', 'dropped'],
  layout: ['live', 'archived'],
  corner: ['live', 'dropped', 'merged'],
  landmark: ['live', 'dropped'],
  stretch: ['live', 'dropped'],
}

export const fieldsOf = (kind: TargetKind): readonly string[] => Object.keys(FIELDS[kind])

const emptyOf = (kind: TargetKind, field: string): Json => EMPTY[kind]?.[field] ?? null

/**
 * A field's value in its normal form: trimmed and rounded as its schema says, places brought onto the lap, empty text and null
 * the same. `null` as an answer means that the value is not one of this field's.
 * @param length of the drawn line in metres
 */
function normalValue(kind: TargetKind, field: string, value: Json, length: number): { value: Json } | null {
  if (value === null || value === '') return { value: emptyOf(kind, field) }
  const parsed = SCHEMAS[kind][field]?.safeParse(value)
  if (!parsed?.success) return null
  const onLap = ontoLap(kind, field, parsed.data as Json, length)
  return onLap === OUT ? null : { value: onLap === '' ? emptyOf(kind, field) : onLap }
}

const OUT = Symbol('not on the lap')

/** Fields that are a place along the drawn line, or hold some. */
const ALONG_FIELDS: Partial<Record<TargetKind, readonly string[]>> = {
  mark: ['sim', 'real'],
  layout: ['startAlong'],
  corner: ['entry', 'apex', 'exit', 'datum'],
  landmark: ['sim', 'real'],
  stretch: ['sim', 'real'],
}

function ontoLap(kind: TargetKind, field: string, value: Json, length: number): Json | typeof OUT {
  if (!ALONG_FIELDS[kind]?.includes(field)) return value
  if (typeof value === 'number') return alongOnLap(value, length)
  const parts = value as Record<string, Json>
  const moved: Record<string, Json> = { ...parts }
  for (const name of ['along', 'until']) {
    const part = parts[name]
    if (typeof part !== 'number') continue
    const onLap = alongOnLap(part, length)
    if (onLap === OUT) return OUT
    moved[name] = onLap
  }
  return moved
}

/** Up to a lap too far or too little is a place on the lap (a nudge across the drawn line's first position); more is a mistake. */
function alongOnLap(value: number, length: number): number | typeof OUT {
  if (value < -length || value >= 2 * length) return OUT
  return wrap(toMillimetre(wrap(value, length)), length)
}

/** All fields of a thing in their normal form; of one that does not exist yet where `stored` is null. */
export function normalNow(kind: TargetKind, stored: Values | null, length: number): Values {
  return Object.fromEntries(
    fieldsOf(kind).map((field) => [
      field,
      stored === null ? emptyOf(kind, field) : (normalValue(kind, field, stored[field] ?? null, length)?.value ?? null),
    ]),
  )
}

/** An operation's changes in their normal form, and what is wrong with them whatever is stored. */
export function normalSet(kind: TargetKind, set: Record<string, FieldChange>, length: number) {
  const normal: Record<string, FieldChange> = {}
  const problems: Problem[] = []
  for (const [field, change] of Object.entries(set)) {
    if (!fieldsOf(kind).includes(field)) {
      problems.push({ field, code: 'unknown-field' })
      continue
    }
    const from = normalValue(kind, field, change.from, length)
    const to = normalValue(kind, field, change.to, length)
    if (!from || !to || (field === 'state' && !isStateOf(kind, to.value))) problems.push({ field, code: 'invalid' })
    else normal[field] = { from: from.value, to: to.value }
  }
  return { set: normal, problems }
}

const isStateOf = (kind: TargetKind, state: Json) => typeof state === 'string' && STATES_OF[kind].includes(state)

/** What is wrong with the fields of a thing as they would stand after the change. */
export function resultProblems(kind: TargetKind, making: boolean, now: Values, after: Values): Problem[] {
  const missing = REQUIRED_FIELDS[kind].filter((field) => after[field] === null)
  const changed = making ? [] : FIXED_FIELDS[kind].filter((field) => !sameJson(now[field], after[field]))
  return [
    ...missing.map((field) => ({ field, code: 'required' })),
    ...changed.map((field) => ({ field, code: 'fixed' })),
    ...togetherProblems(kind, after),
  ]
}

/** Fields that must fit each other. */
function togetherProblems(kind: TargetKind, after: Values): Problem[] {
  const problems: Problem[] = []
  if (kind === 'mark' && after.role !== null && after.kind !== 'brake')
    problems.push({ field: 'role', code: 'brake-only' })
  if (kind === 'mark' || kind === 'landmark' || kind === 'stretch') {
    if (after.sim === null && after.real === null) problems.push({ field: 'real', code: 'place-required' })
  }
  if (kind === 'corner' && (after.state === 'merged') !== (after.mergedInto !== null))
    problems.push({ field: 'mergedInto', code: 'merged-only' })
  if (kind === 'corner' && !(Number(after.leastRadius) > 0))
    problems.push({ field: 'leastRadius', code: 'out-of-range' })
  if (kind === 'layout') problems.push(...rangeProblems('roadWidth', Number(after.roadWidth), ROAD_WIDTH))
  return problems
}

/**
 * Holds each change against what is now: what is so already needs no writing, what is still as its maker saw it is written,
 * anything else is somebody's change in between.
 */
export function compare(set: Record<string, FieldChange>, now: Values) {
  const written: Record<string, FieldChange> = {}
  const theirs: Values = {}
  for (const [field, { from, to }] of Object.entries(set)) {
    const current = now[field] ?? null
    if (sameJson(current, to)) continue
    if (sameJson(current, from)) written[field] = { from, to }
    else theirs[field] = current
  }
  return { written, theirs }
}

/** The values that a set of changes leads to. */
export const valuesTo = (set: Record<string, FieldChange>): Values =>
  Object.fromEntries(Object.entries(set).map(([field, { to }]) => [field, to]))

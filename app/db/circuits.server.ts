import { and, eq } from 'drizzle-orm'
import type { FeatureCollection } from 'geojson'
import type { Actor } from '~/book/actions'
import type { CircuitId, CornerId, GeometryHash, LayoutId, TeamId } from '~/book/ids'
import type { TurnDirection } from '~/book/kinds'
import { ROAD_WIDTH } from '~/book/limits'
import { type Json, OPERATION_VERSION, type Operation } from '~/book/operation'
import type { Datum } from '~/book/place'
import { makeCentreline } from '~/track/centreline'
import { wrap } from '~/track/lap-frame'
import { outlineOf } from '~/track/outline'
import { type Position, toMillimetre } from '~/track/units'
import { newId } from './apply/new-id'
import { applyAll } from './apply.server'
import { canonicalJson, sha256 } from './canonical'
import { nameProblems, type Problem, rangeProblems, zoneProblems } from './checks'
import { commander, type Declined, lockTeam, type Member } from './command'
import type { Db } from './database'
import { centrelines, circuits, grounds, layouts } from './schema'
import { freeSlug } from './slugs'
import { isStorable } from './storable'

/** A corner of a circuit that is brought in. Places are metres of the drawn line. */
export interface NewCorner {
  id: CornerId
  number: string
  name: string
  /** Of the line as drawn. */
  direction: TurnDirection
  turnDegrees: number
  leastRadius: number
  entry: number
  apex: number
  exit: number
  datum: Datum
}

/** A circuit with its first layout. The line is as drawn; start line and direction are the layout's. */
export interface NewCircuit {
  circuit: { id: CircuitId; name: string; timeZone: string }
  layout: { id: LayoutId; name: string; startAlong: number; reversed: boolean; roadWidth: number }
  /** GeoJSON positions in drawing order, the first not repeated. */
  positions: readonly Position[]
  ground: FeatureCollection | null
  corners: readonly NewCorner[]
}

export type ImportOutcome = { kind: 'made'; circuit: CircuitId; slug: string; layout: LayoutId } | Declined

class Undone extends Error {
  constructor(readonly outcome: Declined) {
    super('the import is taken back')
  }
}

/** A line of fewer positions is no circuit. */
const LEAST_POSITIONS = 8

function problemsOf({ circuit, layout, positions, ground }: NewCircuit): Problem[] {
  const isLine = positions.length >= LEAST_POSITIONS && isStorable(positions)
  return [
    ...nameProblems('circuit.name', circuit.name),
    ...zoneProblems('circuit.timeZone', circuit.timeZone),
    ...nameProblems('layout.name', layout.name),
    ...rangeProblems('layout.roadWidth', layout.roadWidth, ROAD_WIDTH),
    ...(isLine ? [] : [{ field: 'positions', code: 'invalid' as const }]),
    ...(isLine ? rangeProblems('layout.startAlong', layout.startAlong, [0, makeCentreline(positions).length]) : []),
    ...(isStorable(ground) ? [] : [{ field: 'ground', code: 'invalid' as const }]),
  ]
}

/**
 * Brings a circuit in, whole or not at all; its corners stand in the change log like any later change. Sending the same ids again
 * makes nothing more.
 */
export async function importCircuit(db: Db, actor: Actor, input: NewCircuit): Promise<ImportOutcome> {
  const asked = await commander(db, actor, 'circuit.change')
  if (asked.kind !== 'member') return asked
  const { member } = asked
  const problems = problemsOf(input)
  if (problems.length > 0) return { kind: 'invalid', problems }
  try {
    return await db.transaction(async (tx) => {
      await lockTeam(tx, member.team)
      const again = await slugOfCircuit(tx, member, input.circuit.id)
      if (again) return { kind: 'made', circuit: input.circuit.id, slug: again, layout: input.layout.id }
      const slug = await addCircuit(tx, member, input.circuit)
      await addLayout(tx, member, input)
      await addCorners(tx, actor, input)
      return { kind: 'made', circuit: input.circuit.id, slug, layout: input.layout.id }
    })
  } catch (error) {
    if (error instanceof Undone) return error.outcome
    throw error
  }
}

async function slugOfCircuit(db: Db, { team }: Member, id: CircuitId): Promise<string | null> {
  const isIt = and(eq(circuits.teamId, team), eq(circuits.id, id))
  const [row] = await db.select({ slug: circuits.slug }).from(circuits).where(isIt)
  return row?.slug ?? null
}

async function addCircuit(db: Db, { team, person }: Member, { id, name, timeZone }: NewCircuit['circuit']) {
  const known = await db.select({ slug: circuits.slug }).from(circuits).where(eq(circuits.teamId, team))
  const slug = freeSlug(
    name,
    known.map((row) => row.slug),
  )
  await db.insert(circuits).values({ teamId: team, id, slug, name: name.trim(), timeZone, madeBy: person })
  return slug
}

async function addLayout(db: Db, { team, person }: Member, { circuit, layout, positions, ground }: NewCircuit) {
  const { hash, length } = await storeCentreline(db, team, positions)
  await db.insert(layouts).values({
    teamId: team,
    id: layout.id,
    circuitId: circuit.id,
    name: layout.name.trim(),
    centrelineHash: hash,
    groundHash: ground && (await storeGround(db, team, ground)),
    startAlong: wrap(toMillimetre(layout.startAlong), length),
    reversed: layout.reversed,
    roadWidth: toMillimetre(layout.roadWidth),
    length,
    madeBy: person,
  })
}

/** JSON of stored numbers has no −0, and neither may the text that names them. */
const withoutMinusZero = (positions: readonly Position[]) =>
  positions.map((position) => position.map((value) => (value ?? 0) + 0) as unknown as Position)

async function storeCentreline(db: Db, team: TeamId, drawn: readonly Position[]) {
  const positions = withoutMinusZero(drawn)
  const line = makeCentreline(positions)
  const { length } = line
  const hash = sha256(canonicalJson(positions)) as GeometryHash
  const outline = outlineOf(line)
  await db.insert(centrelines).values({ teamId: team, hash, positions, length, outline }).onConflictDoNothing()
  return { hash, length }
}

async function storeGround(db: Db, team: TeamId, features: FeatureCollection) {
  const hash = sha256(canonicalJson(features)) as GeometryHash
  await db.insert(grounds).values({ teamId: team, hash, features }).onConflictDoNothing()
  return hash
}

async function addCorners(db: Db, actor: Actor, { layout, corners }: NewCircuit) {
  const madeAt = new Date().toISOString()
  const operations = corners.map((corner) => cornerOperation(layout.id, corner, madeAt))
  if (operations.length === 0) return
  const by = actor.kind === 'person' ? actor.person : null
  const manner = { by, acceptedBy: null, asked: true, propose: false, batch: newId<string>() }
  const done = await applyAll(db, actor, operations, manner)
  if (done.kind !== 'stopped') return
  const number = corners[done.at]?.number ?? ''
  const problems = done.outcome.kind === 'invalid' ? done.outcome.problems : [{ field: '', code: done.outcome.kind }]
  throw new Undone({
    kind: 'invalid',
    problems: problems.map(({ field, code }) => ({ field: `corners.${number}.${field}`, code })),
  })
}

function cornerOperation(layout: LayoutId, { id, ...fields }: NewCorner, madeAt: string): Operation {
  const values: Record<string, Json> = { state: 'live', ...fields, datum: { ...fields.datum } }
  return {
    id: newId(),
    v: OPERATION_VERSION,
    scope: { kind: 'layout', id: layout },
    target: { kind: 'corner', id },
    set: Object.fromEntries(Object.entries(values).map(([field, to]) => [field, { from: null, to }])),
    madeAt,
  }
}

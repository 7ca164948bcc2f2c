import { and, asc, desc, eq } from 'drizzle-orm'
import type { Actor } from '~/book/actions'
import type { CircuitId, GeometryHash, LayoutId } from '~/book/ids'
import type { CornerRow, LandmarkRow, StretchRow } from '~/book/rows'
import { type Along, along, type Metres, metres } from '~/track/units'
import type { Db } from './database'
import { ownTeam } from './own-team'
import { readLandmarks, readStretches } from './read-landmarks.server'
import { books, centrelines, circuits, corners, layouts } from './schema'

/** A circuit's layout in a list. */
export interface CircuitEntry {
  id: CircuitId
  slug: string
  name: string
  layout: { id: LayoutId; name: string; length: Metres }
  /** The road in the small: metres east and north by turns, in drawing order. */
  outline: number[]
  corners: number
  books: number
}

const byName = [asc(circuits.name), asc(circuits.id), asc(layouts.createdAt), asc(layouts.id)]
const onCircuit = and(eq(layouts.teamId, circuits.teamId), eq(layouts.circuitId, circuits.id))

/** Entries on one page of a list. */
export const CIRCUITS_A_PAGE = 24

export interface CircuitsPage {
  entries: CircuitEntry[]
  /** Whether another page follows. */
  goesOn: boolean
}

/**
 * A page of the team's circuits by name, one entry for each layout.
 * @param page counted from 1
 */
export async function readCircuits(db: Db, actor: Actor, page = 1): Promise<CircuitsPage> {
  const rows = await db
    .select({
      id: circuits.id,
      slug: circuits.slug,
      name: circuits.name,
      layout: {
        id: layouts.id,
        name: layouts.name,
        length: layouts.length,
      },
      outline: centrelines.outline,
      corners: db.$count(
        corners,
        and(eq(corners.teamId, layouts.teamId), eq(corners.layoutId, layouts.id), eq(corners.state, 'live')),
      ),
      books: db.$count(books, and(eq(books.teamId, layouts.teamId), eq(books.layoutId, layouts.id))),
    })
    .from(circuits)
    .innerJoin(layouts, onCircuit)
    .innerJoin(centrelines, and(eq(centrelines.teamId, layouts.teamId), eq(centrelines.hash, layouts.centrelineHash)))
    .where(and(ownTeam(actor, circuits.teamId), eq(layouts.state, 'live')))
    .orderBy(...byName)
    .limit(CIRCUITS_A_PAGE + 1)
    .offset((page - 1) * CIRCUITS_A_PAGE)
  const entries = rows
    .slice(0, CIRCUITS_A_PAGE)
    .map((row) => ({ ...row, layout: { ...row.layout, length: metres(row.layout.length) } }))
  return { entries, goesOn: rows.length > CIRCUITS_A_PAGE }
}

/** A layout by name, to choose from. */
export interface LayoutChoice {
  id: LayoutId
  circuit: string
  name: string
  length: Metres
}

/** Every layout of the team that a book can be made for, by its circuit's name. */
export async function readLayouts(db: Db, actor: Actor): Promise<LayoutChoice[]> {
  const rows = await db
    .select({ id: layouts.id, circuit: circuits.name, name: layouts.name, length: layouts.length })
    .from(circuits)
    .innerJoin(layouts, onCircuit)
    .where(and(ownTeam(actor, circuits.teamId), eq(layouts.state, 'live')))
    .orderBy(...byName)
  return rows.map((row) => ({ ...row, length: metres(row.length) }))
}

/** A circuit with one layout, as its editor needs it. Places are metres of the drawn line. */
export interface CircuitForEditing {
  circuit: { id: CircuitId; slug: string; name: string; timeZone: string }
  layout: {
    id: LayoutId
    name: string
    rev: number
    length: Metres
    roadWidth: Metres
    startAlong: Along
    reversed: boolean
    centreline: GeometryHash
    ground: GeometryHash | null
  }
  /** Live ones, in the order of the drawn line. */
  corners: CornerRow[]
  landmarks: LandmarkRow[]
  stretches: StretchRow[]
}

/** The circuit of this name with its latest layout, or null where the actor's team has none. */
export async function readCircuit(db: Db, actor: Actor, slug: string): Promise<CircuitForEditing | null> {
  const [row] = await db
    .select({
      circuit: { id: circuits.id, slug: circuits.slug, name: circuits.name, timeZone: circuits.timeZone },
      layout: {
        id: layouts.id,
        name: layouts.name,
        rev: layouts.rev,
        length: layouts.length,
        roadWidth: layouts.roadWidth,
        startAlong: layouts.startAlong,
        reversed: layouts.reversed,
        centreline: layouts.centrelineHash,
        ground: layouts.groundHash,
      },
    })
    .from(circuits)
    .innerJoin(layouts, onCircuit)
    .where(and(ownTeam(actor, circuits.teamId), eq(circuits.slug, slug), eq(layouts.state, 'live')))
    .orderBy(desc(layouts.createdAt), desc(layouts.id))
    .limit(1)
  if (!row) return null
  const { layout } = row
  return {
    circuit: row.circuit,
    layout: {
      ...layout,
      length: metres(layout.length),
      roadWidth: metres(layout.roadWidth),
      startAlong: along(layout.startAlong),
    },
    corners: await readLayoutCorners(db, actor, layout.id),
    landmarks: await readLandmarks(db, actor, layout.id),
    stretches: await readStretches(db, actor, layout.id),
  }
}

async function readLayoutCorners(db: Db, actor: Actor, layout: LayoutId): Promise<CornerRow[]> {
  const rows = await db
    .select({
      id: corners.id,
      number: corners.number,
      name: corners.name,
      direction: corners.direction,
      turnDegrees: corners.turnDegrees,
      leastRadius: corners.leastRadius,
      entry: corners.entry,
      apex: corners.apex,
      exit: corners.exit,
      datumAlong: corners.datumAlong,
      datumWords: corners.datumWords,
    })
    .from(corners)
    .where(and(ownTeam(actor, corners.teamId), eq(corners.layoutId, layout), eq(corners.state, 'live')))
    .orderBy(asc(corners.apex), asc(corners.id))
  return rows.map(({ datumAlong, datumWords, ...corner }) => ({
    ...corner,
    leastRadius: metres(corner.leastRadius),
    datum: { along: along(datumAlong), words: datumWords },
  }))
}

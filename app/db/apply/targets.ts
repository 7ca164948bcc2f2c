import { and, eq, getTableColumns } from 'drizzle-orm'
import type { PgColumn, PgTable } from 'drizzle-orm/pg-core'
import type { PersonId, TeamId } from '~/book/ids'
import type { Json, TargetKind } from '~/book/operation'
import type { Datum } from '~/book/place'
import type { Db } from '../database'
import { books, cards, conditions, corners, landmarks, layouts, marks, stretches } from '../schema'
import { type GroundStore, landmarkGrounds, markGrounds, stretchGrounds } from './grounds'
import { fieldsOf, type Values } from './values'

/** How things of one kind are stored. Fields are columns of the same name but those that `grounds` and a datum hold. */
interface Storage {
  table: PgTable
  scope: 'bookId' | 'layoutId' | 'id'
  hasMaker: boolean
  grounds?: GroundStore
}

const STORAGE: Record<TargetKind, Storage> = {
  book: { table: books, scope: 'id', hasMaker: true },
  condition: { table: conditions, scope: 'bookId', hasMaker: false },
  card: { table: cards, scope: 'bookId', hasMaker: false },
  mark: { table: marks, scope: 'bookId', hasMaker: true, grounds: markGrounds },
  layout: { table: layouts, scope: 'id', hasMaker: true },
  corner: { table: corners, scope: 'layoutId', hasMaker: false },
  landmark: { table: landmarks, scope: 'layoutId', hasMaker: true, grounds: landmarkGrounds },
  stretch: { table: stretches, scope: 'layoutId', hasMaker: true, grounds: stretchGrounds },
}

/** Whether a thing of this kind keeps who made it. */
export const hasMaker = (kind: TargetKind): boolean => STORAGE[kind].hasMaker

/** A thing as it is stored. */
export interface Stored {
  /** The book or layout it is in. */
  scopeId: string
  madeBy: PersonId | null
  values: Values
}

const columnsOf = (table: PgTable): Record<string, PgColumn> => getTableColumns(table)

const groundFields = ['sim', 'real'] as const

/** Names of the columns that hold a kind's fields. */
function columnNames(kind: TargetKind): string[] {
  const { grounds } = STORAGE[kind]
  const apart: readonly string[] = grounds ? groundFields : []
  return fieldsOf(kind).flatMap((field) => {
    if (apart.includes(field)) return []
    return field === 'datum' ? ['datumAlong', 'datumWords'] : [field]
  })
}

/** One thing of a team, whatever scope it is in, or null. */
export async function load(db: Db, team: TeamId, kind: TargetKind, id: string): Promise<Stored | null> {
  const { table, scope, hasMaker, grounds } = STORAGE[kind]
  const columns = columnsOf(table)
  const names = [...columnNames(kind), scope, ...(hasMaker ? ['madeBy'] : [])]
  const [row] = await db
    .select(Object.fromEntries(names.map((name) => [name, columns[name]!])))
    .from(table)
    .where(and(eq(columns.teamId!, team), eq(columns.id!, id)))
  if (!row) return null
  const { madeBy, datumAlong, datumWords, ...values } = row as Values
  if (kind === 'corner') values.datum = { along: datumAlong!, words: datumWords! }
  return {
    scopeId: row[scope] as string,
    madeBy: (madeBy as PersonId | undefined) ?? null,
    values: grounds ? { ...values, ...(await grounds.read(db, team, id)) } : values,
  }
}

/** Values as columns: a datum is two of them; places are kept apart. */
function toColumns(kind: TargetKind, values: Values): Values {
  const names = new Set(columnNames(kind))
  const { datum, ...rest } = values
  const columns = Object.fromEntries(Object.entries(rest).filter(([field]) => names.has(field)))
  if (!datum) return columns
  const { along, words } = datum as unknown as Datum
  return { ...columns, datumAlong: along, datumWords: words }
}

async function addGrounds(db: Db, team: TeamId, kind: TargetKind, id: string, values: Values) {
  const { grounds } = STORAGE[kind]
  for (const ground of groundFields) {
    const value: Json = values[ground] ?? null
    if (value !== null) await grounds?.add(db, team, id, ground, value)
  }
}

/** Adds a thing. */
export async function make(
  db: Db,
  team: TeamId,
  kind: TargetKind,
  id: string,
  scopeId: string,
  madeBy: PersonId | null,
  values: Values,
): Promise<void> {
  const { table, scope, hasMaker } = STORAGE[kind]
  const own = { teamId: team, id, [scope]: scopeId, ...(hasMaker ? { madeBy } : {}) }
  await db.insert(table).values({ ...toColumns(kind, values), ...own })
  await addGrounds(db, team, kind, id, values)
}

/** Writes some fields of a thing. */
export async function change(db: Db, team: TeamId, kind: TargetKind, id: string, values: Values): Promise<void> {
  const { table, grounds } = STORAGE[kind]
  const columns = columnsOf(table)
  const own = toColumns(kind, values)
  if (Object.keys(own).length > 0) {
    await db
      .update(table)
      .set(own)
      .where(and(eq(columns.teamId!, team), eq(columns.id!, id)))
  }
  for (const ground of groundFields) if (ground in values) await grounds?.remove(db, team, id, ground)
  await addGrounds(db, team, kind, id, values)
}

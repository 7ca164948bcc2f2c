import { and, desc, eq, inArray, lt, type SQL } from 'drizzle-orm'
import type { Actor } from '~/book/actions'
import type { Json } from '~/book/operation'
import { commander, type Declined, type Member } from './command'
import type { Db } from './database'
import { ownTeam, personOf } from './own-team'
import { IMPORT_BYTES, imports } from './schema'
import { isStorable } from './storable'

/** A circuit file between the steps of its import. It is its uploader's alone. */
export interface ImportDraft {
  id: string
  fileName: string
  bytes: Uint8Array
  /** What the person chose so far. */
  options: Json
}

/** How long a draft waits for its uploader to come back. */
export const DRAFT_DAYS = 1
const DAY_MS = 86_400_000
/** How many drafts of one person a team keeps: the latest. */
export const DRAFTS_KEPT = 5

const isOwn = (actor: Actor, id: string): SQL | undefined => {
  const person = personOf(actor)
  return and(ownTeam(actor, imports.teamId), eq(imports.id, id), person ? eq(imports.personId, person) : undefined)
}

/** Keeps an uploaded file, and of the person's older ones the latest few. The same id again keeps what is there. */
export async function putImport(db: Db, actor: Actor, draft: ImportDraft): Promise<{ kind: 'kept' } | Declined> {
  const asked = await commander(db, actor, 'circuit.change')
  if (asked.kind !== 'member') return asked
  if (draft.bytes.byteLength > IMPORT_BYTES)
    return { kind: 'invalid', problems: [{ field: 'file', code: 'too-large' }] }
  if (!isStorable([draft.fileName, draft.options]))
    return { kind: 'invalid', problems: [{ field: 'file', code: 'invalid' }] }
  const { team, person } = asked.member
  const { id, fileName, bytes, options } = draft
  await db
    .insert(imports)
    .values({ teamId: team, id, personId: person, fileName, bytes, options })
    .onConflictDoNothing()
  await dropOlder(db, asked.member)
  return { kind: 'kept' }
}

async function dropOlder(db: Db, { team, person }: Member): Promise<void> {
  const own = and(eq(imports.teamId, team), eq(imports.personId, person))
  const older = db
    .select({ id: imports.id })
    .from(imports)
    .where(own)
    .orderBy(desc(imports.createdAt), desc(imports.id))
    .offset(DRAFTS_KEPT)
  await db.delete(imports).where(and(own, inArray(imports.id, older)))
}

/** The actor's own draft, or null. */
export async function readImport(db: Db, actor: Actor, id: string): Promise<ImportDraft | null> {
  const [row] = await db
    .select({ id: imports.id, fileName: imports.fileName, bytes: imports.bytes, options: imports.options })
    .from(imports)
    .where(isOwn(actor, id))
  return row ?? null
}

/** Keeps what the person chose; false where there is no such draft of his. */
export async function setImportOptions(db: Db, actor: Actor, id: string, options: Json): Promise<boolean> {
  const changed = await db.update(imports).set({ options }).where(isOwn(actor, id)).returning({ id: imports.id })
  return changed.length > 0
}

/** Removes a draft: it was accepted, or given up. */
export async function dropImport(db: Db, actor: Actor, id: string): Promise<void> {
  await db.delete(imports).where(isOwn(actor, id))
}

/** Removes every team's drafts that nobody came back to. A job's, not a person's. Answers how many there were. */
export async function sweepImports(db: Db, now: Date): Promise<number> {
  const before = new Date(now.getTime() - DRAFT_DAYS * DAY_MS)
  const swept = await db.delete(imports).where(lt(imports.createdAt, before)).returning({ id: imports.id })
  return swept.length
}

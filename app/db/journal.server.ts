import { and, eq, inArray, isNull } from 'drizzle-orm'
import * as z from 'zod/mini'
import type { Action, Actor } from '~/book/actions'
import { type FindingEntry, findingSchema } from '~/book/finding'
import type { BookId, ConditionId, FindingId, MarkId, PersonId, TeamId } from '~/book/ids'
import { may } from '~/book/may'
import { wrap } from '~/track/lap-frame'
import { sameJson } from './canonical'
import { isSensibleInstant } from './checks'
import { commander, type Declined, type Member } from './command'
import type { Db } from './database'
import { ownTeam } from './own-team'
import { books, conditions, findings, layouts, marks, memberships } from './schema'
import { isStorable } from './storable'

export type JournalOutcome = { kind: 'added'; added: number } | { kind: 'refused'; reason: 'id-in-use' } | Declined

/** A phone's clock may run ahead by this much; beyond it a finding would lie in the future. */
const CLOCK_SLACK_MS = 5 * 60_000

type Problem = { field: string; code: string }
const invalid = (problems: readonly Problem[]): JournalOutcome => ({ kind: 'invalid', problems })

/**
 * Adds what the actor found, all of it or nothing. Sending the same finding again adds nothing; the same id with another content
 * is refused. A finding moves no mark. A driver says what he saw and drove himself, and tells others; the desk speaks for others too.
 * @param inputs findings as they came, unchecked; see `findingSchema`
 */
export async function addFindings(db: Db, actor: Actor, inputs: readonly unknown[]): Promise<JournalOutcome> {
  if (!isStorable(inputs)) return invalid([{ field: '', code: 'not-storable' }])
  const parsed = z.array(findingSchema).safeParse(inputs)
  if (!parsed.success)
    return invalid(parsed.error.issues.map(({ path, code }) => ({ field: path.join('.'), code: code ?? 'invalid' })))
  const entries = parsed.data
  const latest = Date.now() + CLOCK_SLACK_MS
  const wrong = entries.findIndex(({ foundAt }) => !isSensibleInstant(foundAt) || Date.parse(foundAt) > latest)
  if (wrong >= 0) return invalid([{ field: `${wrong}.foundAt`, code: 'out-of-range' }])
  try {
    return await db.transaction(async (tx) => {
      const asked = await commander(tx, actor, 'finding.add')
      return asked.kind === 'member' ? addAll(tx, actor, asked.member, entries) : asked
    })
  } catch (error) {
    if (error instanceof Taken) return { kind: 'refused', reason: 'id-in-use' }
    throw error
  }
}

/** Thrown to take everything back: an id is in use for another finding. */
class Taken extends Error {}

async function addAll(db: Db, actor: Actor, member: Member, entries: FindingEntry[]): Promise<JournalOutcome> {
  const known = await knownMarks(db, actor, entries)
  const rows: NewFinding[] = []
  const problems: Problem[] = []
  for (const [at, entry] of entries.entries()) {
    const mark = known.get(entry.mark)
    if (!mark) return { kind: 'not-found' }
    const answer = may(actor, actionOf(entry, member), { archived: mark.archived })
    if (!answer.ok) return { kind: 'refused', reason: answer.reason }
    if (Math.abs(entry.along) > 2 * mark.length) problems.push({ field: `${at}.along`, code: 'out-of-range' })
    rows.push(rowOf(entry, member, mark))
  }
  problems.push(...(await strangers(db, member.team, entries)), ...(await conditionsElsewhere(db, member.team, rows)))
  return problems.length > 0 ? invalid(problems) : insert(db, member.team, rows)
}

/** What one driver tells another is told; what another saw or drove, or that he lost his reference, is his own to say. */
const actionOf = ({ person, proof, verdict }: FindingEntry, member: Member): Action =>
  person === member.person || (proof === 'told' && verdict !== 'gone') ? 'finding.add' : 'finding.add-for-another'

interface KnownMark {
  book: BookId
  archived: boolean
  length: number
}

async function knownMarks(db: Db, actor: Actor, entries: readonly FindingEntry[]) {
  const ids = [...new Set(entries.map(({ mark }) => mark as MarkId))]
  const rows = await db
    .select({ id: marks.id, book: books.id, state: books.state, length: layouts.length })
    .from(marks)
    .innerJoin(books, and(eq(books.teamId, marks.teamId), eq(books.id, marks.bookId)))
    .innerJoin(layouts, and(eq(layouts.teamId, books.teamId), eq(layouts.id, books.layoutId)))
    .where(and(ownTeam(actor, marks.teamId), inArray(marks.id, ids)))
  return new Map<string, KnownMark>(
    rows.map(({ id, book, state, length }) => [id, { book, archived: state === 'archived', length }]),
  )
}

type NewFinding = typeof findings.$inferInsert

function rowOf(entry: FindingEntry, { team, person }: Member, mark: KnownMark): NewFinding {
  return {
    teamId: team,
    id: entry.id as FindingId,
    bookId: mark.book,
    markId: entry.mark as MarkId,
    ground: entry.ground,
    personId: entry.person as PersonId,
    byId: person,
    conditionId: entry.condition as ConditionId,
    verdict: entry.verdict,
    proof: entry.proof,
    method: entry.method,
    accuracy: entry.accuracy,
    along: wrap(entry.along, mark.length),
    across: entry.across,
    foundAt: new Date(entry.foundAt),
    note: entry.note,
  }
}

/** Findings for someone who is not in the team. */
async function strangers(db: Db, team: TeamId, entries: readonly FindingEntry[]): Promise<Problem[]> {
  const rows = await db
    .select({ id: memberships.personId })
    .from(memberships)
    .where(and(eq(memberships.teamId, team), isNull(memberships.endedAt)))
  const members = new Set<string>(rows.map(({ id }) => id))
  return entries.flatMap(({ person }, at) =>
    members.has(person) ? [] : [{ field: `${at}.person`, code: 'not-found' }],
  )
}

/** Findings in a condition that is not of the mark's book. */
async function conditionsElsewhere(db: Db, team: TeamId, rows: readonly NewFinding[]): Promise<Problem[]> {
  const ids = [...new Set(rows.map(({ conditionId }) => conditionId))]
  const found = await db
    .select({ id: conditions.id, book: conditions.bookId })
    .from(conditions)
    .where(and(eq(conditions.teamId, team), inArray(conditions.id, ids), eq(conditions.state, 'live')))
  const bookOf = new Map(found.map(({ id, book }) => [id, book]))
  return rows.flatMap(({ conditionId, bookId }, at) =>
    bookOf.get(conditionId) === bookId ? [] : [{ field: `${at}.condition`, code: 'not-found' }],
  )
}

async function insert(db: Db, team: TeamId, rows: NewFinding[]): Promise<JournalOutcome> {
  if (rows.length === 0) return { kind: 'added', added: 0 }
  const added = await db.insert(findings).values(rows).onConflictDoNothing().returning({ id: findings.id })
  if (added.length === rows.length) return { kind: 'added', added: added.length }
  const stored = await db
    .select()
    .from(findings)
    .where(
      and(
        eq(findings.teamId, team),
        inArray(
          findings.id,
          rows.map(({ id }) => id),
        ),
      ),
    )
  const byId = new Map(stored.map(({ createdAt: _, ...row }) => [row.id, plain(row)]))
  const differs = rows.some((row) => !sameJson(byId.get(row.id), plain(row)))
  if (differs) throw new Taken()
  return { kind: 'added', added: added.length }
}

/** A row as data that can be compared. */
const plain = (row: NewFinding) => ({ ...row, foundAt: (row.foundAt as Date).toISOString() })

import { and, count, eq, inArray, isNull, ne } from 'drizzle-orm'
import type { BookId, CardId, ConditionId, CornerId, LandmarkId, PersonId, TeamId } from '~/book/ids'
import type { Json, TargetKind } from '~/book/operation'
import type { Place } from '~/book/place'
import { sameJson } from '../canonical'
import type { Db } from '../database'
import { cards, conditions, corners, landmarks, marks, memberships } from '../schema'
import type { LockedScope } from './scopes'
import type { Problem, Values } from './values'

interface Reach {
  db: Db
  team: TeamId
  scope: LockedScope
}

type Check = (reach: Reach, value: Json) => Promise<boolean>

const some = (rows: readonly unknown[]) => rows.length > 0

const liveCard: Check = async ({ db, team, scope }, id) =>
  some(
    await db
      .select({ id: cards.id })
      .from(cards)
      .innerJoin(corners, and(eq(corners.teamId, cards.teamId), eq(corners.id, cards.cornerId)))
      .where(
        and(
          eq(cards.teamId, team),
          eq(cards.bookId, scope.scope.id as BookId),
          eq(cards.id, id as CardId),
          eq(corners.state, 'live'),
        ),
      ),
  )

const liveCondition: Check = async ({ db, team, scope }, id) =>
  some(
    await db
      .select({ id: conditions.id })
      .from(conditions)
      .where(
        and(
          eq(conditions.teamId, team),
          eq(conditions.bookId, scope.scope.id as BookId),
          eq(conditions.id, id as ConditionId),
          eq(conditions.state, 'live'),
        ),
      ),
  )

const liveCorner: Check = async ({ db, team, scope }, id) =>
  some(
    await db
      .select({ id: corners.id })
      .from(corners)
      .where(
        and(
          eq(corners.teamId, team),
          eq(corners.layoutId, scope.layout),
          eq(corners.id, id as CornerId),
          eq(corners.state, 'live'),
        ),
      ),
  )

const member: Check = async ({ db, team }, id) =>
  some(
    await db
      .select({ id: memberships.personId })
      .from(memberships)
      .where(and(eq(memberships.teamId, team), eq(memberships.personId, id as PersonId), isNull(memberships.endedAt))),
  )

/** Dropping or moving a landmark locks the books of its layout too: it stays as it is while something is being tied to it. */
const tiedLandmark: Check = async ({ db, team, scope }, value) => {
  const id = (value as unknown as Place).tie?.landmarkId
  if (!id) return true
  return some(
    await db
      .select({ id: landmarks.id })
      .from(landmarks)
      .where(
        and(
          eq(landmarks.teamId, team),
          eq(landmarks.layoutId, scope.layout),
          eq(landmarks.id, id as LandmarkId),
          eq(landmarks.state, 'live'),
        ),
      ),
  )
}

/** Fields that name another thing, which must be alive and of the same book, layout or team. */
const REFERENCES: Partial<Record<TargetKind, Record<string, Check>>> = {
  mark: { cardId: liveCard, conditionId: liveCondition, forPerson: member, sim: tiedLandmark, real: tiedLandmark },
  card: { cornerId: liveCorner, setsUp: liveCorner, compromisedFor: liveCorner },
  corner: { mergedInto: liveCorner },
  landmark: { cornerId: liveCorner },
}

/**
 * References that lead nowhere. An id of another team, another book or nobody's all answer the same. A thing that comes to life
 * is checked whole, any other only where it changes.
 */
export async function referenceProblems(
  reach: Reach,
  kind: TargetKind,
  now: Values,
  after: Values,
): Promise<Problem[]> {
  const revived = now.state !== 'live' && after.state === 'live'
  const problems: Problem[] = []
  for (const [field, holds] of Object.entries(REFERENCES[kind] ?? {})) {
    const value = after[field] ?? null
    if (value === null || (!revived && sameJson(now[field], value))) continue
    if (!(await holds(reach, value))) problems.push({ field, code: 'not-found' })
  }
  return problems
}

/** Things that cannot go while live marks depend on them; the dry condition never goes. */
export async function leavingProblems(
  { db, team }: Reach,
  kind: TargetKind,
  id: string,
  now: Values,
  after: Values,
): Promise<Problem[]> {
  if (now.state !== 'live' || after.state === 'live') return []
  const inUse = [{ field: 'state', code: 'in-use' }]
  const live = and(eq(marks.teamId, team), eq(marks.state, 'live'))
  if (kind === 'condition') {
    if (now.kind === 'dry') return inUse
    const [found] = await db
      .select({ marks: count() })
      .from(marks)
      .where(and(live, eq(marks.conditionId, id as ConditionId)))
    return found && found.marks > 0 ? inUse : []
  }
  if (kind === 'corner') {
    const ofCorner = db
      .select({ id: cards.id })
      .from(cards)
      .where(and(eq(cards.teamId, team), eq(cards.cornerId, id as CornerId)))
    const [found] = await db
      .select({ marks: count() })
      .from(marks)
      .where(and(live, inArray(marks.cardId, ofCorner)))
    return found && found.marks > 0 ? inUse : []
  }
  return []
}

/** Whether two live corners of a layout carry one number. */
export async function numberTaken(db: Db, team: TeamId, scope: LockedScope, id: string, number: Json) {
  const rows = await db
    .select({ id: corners.id })
    .from(corners)
    .where(
      and(
        eq(corners.teamId, team),
        eq(corners.layoutId, scope.layout),
        eq(corners.state, 'live'),
        eq(corners.number, number as string),
        ne(corners.id, id as CornerId),
      ),
    )
  return some(rows)
}

import { and, asc, eq, inArray, or, type SQL, sql } from 'drizzle-orm'
import type { Actor } from '~/book/actions'
import type { CardId, OperationId, PersonId } from '~/book/ids'
import { may } from '~/book/may'
import type { Operation, Outcome, Scope } from '~/book/operation'
import { applyAll } from './apply.server'
import type { Db } from './database'
import { isBy, ownTeam, personOf } from './own-team'
import { marks, operations } from './schema'

/** An operation that waits for a coach. */
export interface Proposal {
  id: OperationId
  by: PersonId | null
  operation: Operation
  batch: string | null
  /** Instant at which it came in, ISO 8601. */
  at: string
}

/**
 * What waits for a coach, of one scope or of the whole team, in the order in which it came in.
 * @param card only what is about this card: itself, its marks, dropped ones too, and marks that would be made on it or moved to it
 */
export async function listProposals(db: Db, actor: Actor, scope: Scope | null, card?: CardId): Promise<Proposal[]> {
  const inScope = scope && (scope.kind === 'book' ? eq(operations.bookId, scope.id) : eq(operations.layoutId, scope.id))
  const rows = await db
    .select({
      id: operations.id,
      by: operations.personId,
      operation: operations.body,
      batch: operations.batch,
      at: operations.createdAt,
    })
    .from(operations)
    .where(
      and(
        ownTeam(actor, operations.teamId),
        eq(operations.status, 'proposed'),
        inScope ?? undefined,
        card && aboutCard(db, actor, card),
      ),
    )
    .orderBy(asc(operations.arrival))
  return rows.map((row) => ({ ...row, at: row.at.toISOString() }))
}

function aboutCard(db: Db, actor: Actor, card: CardId): SQL | undefined {
  const target = sql`(${operations.body} #>> '{target,id}')::uuid`
  const itsMarks = db
    .select({ id: sql<string>`${marks.id}` })
    .from(marks)
    .where(and(ownTeam(actor, marks.teamId), eq(marks.cardId, card)))
  return or(
    eq(target, card),
    inArray(target, itsMarks),
    eq(sql`(${operations.body} #>> '{set,cardId,to}')::uuid`, card),
  )
}

/**
 * A coach's answer to a proposal, and to all that the same person proposed together with it. An accepted one is held against what is now: where
 * that has changed since, the answer is the conflict and the proposal still waits.
 */
export async function decideProposal(
  db: Db,
  actor: Actor,
  id: OperationId,
  decision: 'accept' | 'decline',
): Promise<Outcome> {
  const answer = may(actor, 'proposal.decide')
  if (!answer.ok) return { kind: 'refused', reason: answer.reason }
  if (actor.kind !== 'person') return { kind: 'refused', reason: 'role' }
  return db.transaction(async (tx) => {
    const proposals = await lockProposals(tx, actor, id)
    const first = proposals[0]
    if (!first) return { kind: 'not-found' }
    const outcome = decision === 'accept' ? await accept(tx, actor, proposals) : declined
    if (outcome.kind === 'applied' || outcome.kind === 'nothing')
      await settle(tx, actor, proposals, decision === 'accept' ? 'accepted' : 'declined')
    return outcome
  })
}

const declined: Outcome = { kind: 'nothing', rev: 0 }

interface Waiting {
  id: OperationId
  by: PersonId | null
  operation: Operation
  batch: string | null
}

/**
 * An open proposal with all that its maker proposed together with it, locked, in the order in which they came in. A batch and its
 * maker never change, so they are read before anything is locked: everyone who decides on a batch takes its locks in one order.
 */
async function lockProposals(db: Db, actor: Actor, id: OperationId): Promise<Waiting[]> {
  const ofTeam = ownTeam(actor, operations.teamId)
  const [asked] = await db
    .select({ batch: operations.batch, by: operations.personId })
    .from(operations)
    .where(and(ofTeam, eq(operations.id, id)))
  if (!asked) return []
  const { batch, by } = asked
  const together =
    batch === null ? eq(operations.id, id) : and(eq(operations.batch, batch), isBy(operations.personId, by))
  const open = await db
    .select({ id: operations.id, by: operations.personId, operation: operations.body, batch: operations.batch })
    .from(operations)
    .where(and(ofTeam, eq(operations.status, 'proposed'), together))
    .orderBy(asc(operations.arrival))
    .for('update')
  return open.some((proposal) => proposal.id === id) ? open : []
}

/** Accepts what one person proposed together: it is written under his name. */
async function accept(db: Db, actor: Actor, proposals: readonly Waiting[]): Promise<Outcome> {
  const [first] = proposals
  const manner = {
    by: first?.by ?? null,
    acceptedBy: personOf(actor),
    asked: true,
    propose: false,
    batch: first?.batch ?? null,
  }
  const done = await applyAll(
    db,
    actor,
    proposals.map(({ operation }) => operation),
    manner,
  )
  if (done.kind === 'stopped') return done.outcome
  return done.outcomes.find(({ kind }) => kind === 'applied') ?? done.outcomes[0] ?? declined
}

async function settle(db: Db, actor: Actor, proposals: readonly Waiting[], status: 'accepted' | 'declined') {
  for (const { id } of proposals)
    await db
      .update(operations)
      .set({ status, decidedBy: personOf(actor), decidedAt: new Date() })
      .where(and(ownTeam(actor, operations.teamId), eq(operations.id, id)))
}

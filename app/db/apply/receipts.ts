import { and, eq, or } from 'drizzle-orm'
import type { OperationId, PersonId, TeamId } from '~/book/ids'
import type { FieldChange, Operation, Scope } from '~/book/operation'
import { canonicalJson, sha256 } from '../canonical'
import type { Db } from '../database'
import { changes, type OperationStatus, operations } from '../schema'

/** An operation's body by name: two bodies with one hash say the same. */
export const bodyHash = (operation: Operation) => sha256(canonicalJson(operation))

/** Columns that say which scope a row belongs to. */
export const scopeColumns = (scope: Scope) => ({
  bookId: scope.kind === 'book' ? scope.id : null,
  layoutId: scope.kind === 'layout' ? scope.id : null,
})

export interface Receipt {
  person: PersonId | null
  bodyHash: string
  status: OperationStatus
  rev: number
}

/** What is known of an operation's id: this person's, in whatever team, or anyone's in this team. */
export async function findReceipts(db: Db, team: TeamId, person: PersonId | null, id: OperationId): Promise<Receipt[]> {
  return db
    .select({
      person: operations.personId,
      bodyHash: operations.bodyHash,
      status: operations.status,
      rev: operations.rev,
    })
    .from(operations)
    .where(
      and(
        eq(operations.id, id),
        or(eq(operations.teamId, team), person === null ? undefined : eq(operations.personId, person)),
      ),
    )
}

interface Taken {
  team: TeamId
  person: PersonId | null
  operation: Operation
  status: OperationStatus
  rev: number
  batch: string | null
}

/** Notes that an operation was taken in; false where its id is in use already. */
export async function addReceipt(db: Db, { team, person, operation, status, rev, batch }: Taken): Promise<boolean> {
  const added = await db
    .insert(operations)
    .values({
      teamId: team,
      id: operation.id,
      ...scopeColumns(operation.scope),
      personId: person,
      bodyHash: bodyHash(operation),
      body: operation,
      status,
      rev,
      batch,
    })
    .onConflictDoNothing()
    .returning({ id: operations.id })
  return added.length > 0
}

interface Written {
  team: TeamId
  by: PersonId | null
  acceptedBy: PersonId | null
  operation: Operation
  set: Record<string, FieldChange>
  rev: number
  batch: string | null
}

/** One line in the change log. */
export async function addChange(db: Db, { team, by, acceptedBy, operation, set, rev, batch }: Written): Promise<void> {
  await db.insert(changes).values({
    teamId: team,
    ...scopeColumns(operation.scope),
    rev,
    operationId: operation.id,
    targetKind: operation.target.kind,
    targetId: operation.target.id,
    set,
    reason: operation.reason ?? null,
    undoes: operation.undoes ?? null,
    batch,
    byId: by,
    acceptedBy,
    madeAt: new Date(operation.madeAt),
  })
}

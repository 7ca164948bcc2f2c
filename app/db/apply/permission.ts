import { and, eq, ne } from 'drizzle-orm'
import type { Action, Actor, Answer, Facts } from '~/book/actions'
import type { LandmarkId, PersonId, TeamId } from '~/book/ids'
import { may } from '~/book/may'
import type { FieldChange, TargetKind } from '~/book/operation'
import type { Db } from '../database'
import { marks, ties } from '../schema'

interface Touched {
  kind: TargetKind
  id: string
  making: boolean
  madeBy: PersonId | null
  set: Record<string, FieldChange>
}

/** Every action that an operation amounts to, with whose thing it touches. */
function actionsOf({ kind, making, madeBy, set }: Touched): [Action, Facts][] {
  switch (kind) {
    case 'book':
      return Object.keys(set).map((field) => [field === 'state' ? 'book.archive' : 'book.rename', {}])
    case 'condition':
      return [['condition.change', {}]]
    case 'card':
      return [[making ? 'circuit.change' : 'card.change', {}]]
    case 'mark':
      return [making ? ['mark.add', {}] : ['mark.change', { madeBy }]]
    case 'layout':
    case 'corner':
      return [['circuit.change', {}]]
    case 'landmark':
    case 'stretch':
      return [making ? ['landmark.add', {}] : ['landmark.change', { madeBy }]]
  }
}

/** Fields of a landmark that move what is tied to it. */
const MOVES_TIED = ['state', 'sim', 'real']

/** Another person with a live mark tied to this landmark, or null. */
async function otherTiedPerson(db: Db, team: TeamId, landmark: string, actor: Actor): Promise<PersonId | null> {
  if (actor.kind !== 'person') return null
  const [row] = await db
    .select({ madeBy: marks.madeBy })
    .from(ties)
    .innerJoin(marks, and(eq(marks.teamId, ties.teamId), eq(marks.id, ties.markId)))
    .where(
      and(
        eq(ties.teamId, team),
        eq(ties.landmarkId, landmark as LandmarkId),
        eq(marks.state, 'live'),
        ne(marks.madeBy, actor.person),
      ),
    )
    .limit(1)
  return row?.madeBy ?? null
}

/**
 * Whether the actor may make this change. Moving or dropping a landmark to which another's mark is tied is changing what another
 * made. A flat no outweighs "another's".
 */
export async function mayApply(
  db: Db,
  team: TeamId,
  actor: Actor,
  touched: Touched,
  archived: boolean,
): Promise<Answer> {
  const { kind, id, making, set } = touched
  const movesTied = kind === 'landmark' && !making && MOVES_TIED.some((field) => field in set)
  const other = movesTied ? await otherTiedPerson(db, team, id, actor) : null
  const answers = actionsOf(other ? { ...touched, madeBy: other } : touched).map(([action, facts]) =>
    may(actor, action, { ...facts, archived }),
  )
  const refused = answers.filter((answer) => !answer.ok)
  return refused.find((answer) => answer.reason !== 'another-persons') ?? refused[0] ?? { ok: true }
}

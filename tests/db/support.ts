import type { SQL } from 'drizzle-orm'
import { drizzle } from 'drizzle-orm/node-postgres'
import pg from 'pg'
import { v7 } from 'uuid'
import { afterAll } from 'vitest'
import type { Actor } from '~/book/actions'
import type { BookId, CarId, CircuitId, CornerId, LandmarkId, LayoutId, MarkId, PersonId, TeamId } from '~/book/ids'
import type { Role } from '~/book/kinds'
import { type Json, OPERATION_VERSION, type Operation, type Outcome, type Scope } from '~/book/operation'
import type { BookView } from '~/book/view'
import { makeBook } from '~/db/books.server'
import { addCar } from '~/db/cars.server'
import { importCircuit, type NewCircuit, type NewCorner } from '~/db/circuits.server'
import { readBook } from '~/db/read-book.server'
import { memberships, people, teams } from '~/db/schema'
import { along, type Position } from '~/track/units'

/** A real database; every test makes teams of its own in it. */

const url = process.env.TEST_DATABASE_URL
const ownerAddress = process.env.TEST_OWNER_DATABASE_URL
if (!url || !ownerAddress) throw new Error('TEST_DATABASE_URL and TEST_OWNER_DATABASE_URL name the database for tests')

export const appUrl: string = url
export const ownerUrl: string = ownerAddress
export const pool = new pg.Pool({ connectionString: appUrl })
export const db = drizzle(pool)
afterAll(() => pool.end())

export const newId = <Kind extends string>() => v7() as Kind

export type Person = Extract<Actor, { kind: 'person' }>

export interface Team {
  id: TeamId
  slug: string
  manager: Person
  coach: Person
  driver: Person
  second: Person
}

/** A team with a manager, a coach and two drivers. */
export async function makeTeam(): Promise<Team> {
  const id = newId<TeamId>()
  const slug = `team-${id}`
  await db.insert(teams).values({ id, slug, name: `Team ${id}` })
  const join = async (name: string, role: Role): Promise<Person> => {
    const person = newId<PersonId>()
    await db.insert(people).values({ id: person, name, email: `${person}@example.test` })
    await db.insert(memberships).values({ teamId: id, personId: person, role })
    return { kind: 'person', person, team: id, role }
  }
  return {
    id,
    slug,
    manager: await join('Manager', 'manager'),
    coach: await join('Coach', 'coach'),
    driver: await join('Driver', 'driver'),
    second: await join('Second driver', 'driver'),
  }
}

const METRES_PER_DEGREE = 111_200

/** A ring of about 1.2 km round a point in open sea, each one elsewhere. */
let rings = 0
function ring(): Position[] {
  rings += 1
  const [lng, lat] = [-30 - rings / 100, 40]
  return Array.from({ length: 120 }, (_, at) => {
    const angle = (at / 120) * 2 * Math.PI
    const [east, north] = [200 * Math.cos(angle), 180 * Math.sin(angle)]
    return [lng + east / (METRES_PER_DEGREE * Math.cos((lat * Math.PI) / 180)), lat + north / METRES_PER_DEGREE]
  })
}

export const corner = (number: string, apex: number, more: Partial<NewCorner> = {}): NewCorner => ({
  id: newId<CornerId>(),
  number,
  name: `Corner ${number}`,
  direction: 'left',
  turnDegrees: 95,
  leastRadius: 42,
  entry: apex - 35,
  apex,
  exit: apex + 38,
  datum: { along: along(apex + 2), words: 'from the middle of the apex kerb' },
  ...more,
})

export function circuit(corners: NewCorner[] = [corner('1', 250), corner('2', 700)]): NewCircuit {
  return {
    circuit: { id: newId<CircuitId>(), name: 'Sandbar', timeZone: 'Atlantic/Azores' },
    layout: { id: newId<LayoutId>(), name: 'Long', startAlong: 0, reversed: false, roadWidth: 11 },
    positions: ring(),
    ground: null,
    corners,
  }
}

export interface Book {
  team: Team
  id: BookId
  slug: string
  layout: LayoutId
  scope: Scope
  layoutScope: Scope
  corners: readonly NewCorner[]
  view: BookView
  dry: string
  wet: string
  /** Of the first and the second corner. */
  cards: [string, string]
}

/** A team's book of a circuit with two corners. */
export async function makeTeamBook(team: Team): Promise<Book> {
  const drawn = circuit()
  await importCircuit(db, team.coach, drawn)
  const car = newId<CarId>()
  await addCar(db, team.coach, { id: car, name: 'Car 41', length: 4.6, width: 2, eyeHeight: 1.12 })
  const id = newId<BookId>()
  const made = await makeBook(db, team.coach, { id, name: 'Sandbar', layout: drawn.layout.id, car })
  if (made.kind !== 'made') throw new Error(`no book: ${made.kind}`)
  const view = await bookOf(team, made.slug)
  return {
    team,
    id,
    slug: made.slug,
    layout: drawn.layout.id,
    scope: { kind: 'book', id },
    layoutScope: { kind: 'layout', id: drawn.layout.id },
    corners: drawn.corners,
    view,
    dry: view.conditions.find(({ kind }) => kind === 'dry')!.id,
    wet: view.conditions.find(({ kind }) => kind === 'wet')!.id,
    cards: [view.corners[0]!.card.id, view.corners[1]!.card.id],
  }
}

/** The book as it is read now. */
export async function bookOf(team: Team, slug: string): Promise<BookView> {
  const view = await readBook(db, team.manager, slug)
  if (!view) throw new Error(`no book ${slug}`)
  return view
}

export async function markOf(book: Book, id: string) {
  const view = await bookOf(book.team, book.slug)
  return view.corners.flatMap(({ marks }) => marks).find((mark) => mark.id === id)
}

export const place = (alongMetres: number, across: number, tie: Json = null) => ({ along: alongMetres, across, tie })

/** A tie of its own kind on a landmark: metres after (+) its start. */
export const tieTo = (landmarkId: string, metres: number) => ({
  landmarkId,
  along: { from: 'start', block: null, metres, lengths: 0 },
  across: null,
  words: 'by the post',
  acrossWords: null,
})

type Changes = Record<string, [from: Json, to: Json]>

export function operation(scope: Scope, kind: Operation['target']['kind'], id: string, changes: Changes): Operation {
  const set = Object.fromEntries(Object.entries(changes).map(([field, [from, to]]) => [field, { from, to }]))
  return { id: newId(), v: OPERATION_VERSION, scope, target: { kind, id }, set, madeAt: '2026-11-14T15:09:26.535Z' }
}

const fromNothing = (fields: Record<string, Json>): Changes =>
  Object.fromEntries(Object.entries({ state: 'live', ...fields }).map(([field, to]) => [field, [null, to]]))

/** Adds a brake mark of the first corner, and whatever else is given. */
export function addsMark(book: Book, id: string, more: Record<string, Json> = {}): Operation {
  const fields = { cardId: book.cards[0], kind: 'brake', conditionId: book.dry, real: place(120, 3.2), ...more }
  return operation(book.scope, 'mark', id, fromNothing(fields))
}

/** Adds a post beside the road. */
export function addsLandmark(book: Book, id: string, at: number): Operation {
  const placement = {
    along: at,
    until: null,
    across: 7.4,
    acrossTo: null,
    edgeLength: null,
    blockLength: null,
    width: null,
    words: null,
  }
  const fields = { kind: 'marker-post', name: 'White post', real: placement, sim: placement }
  return operation(book.layoutScope, 'landmark', id, fromNothing(fields))
}

export const newMark = () => newId<MarkId>()
export const newLandmark = () => newId<LandmarkId>()

/** The outcome, which must be of this kind. */
export function expectKind<Kind extends Outcome['kind']>(
  outcome: Outcome,
  kind: Kind,
): Extract<Outcome, { kind: Kind }> {
  if (outcome.kind !== kind) throw new Error(`${kind} expected: ${JSON.stringify(outcome)}`)
  return outcome as Extract<Outcome, { kind: Kind }>
}

/**
 * Runs works that come upon what `lock` holds: each begins when all before it wait, and the lock is let go when all wait.
 * @param lock a statement that locks rows
 * @throws where a work ends without having waited
 */
export async function inLine<Answer>(lock: SQL, works: readonly (() => Promise<Answer>)[]): Promise<Answer[]> {
  const running: Promise<Answer>[] = []
  let ended = 0
  await db.transaction(async (holder) => {
    await holder.execute(lock)
    for (const work of works) {
      const run = work()
      running.push(run)
      const end = () => {
        ended += 1
      }
      run.then(end, end)
      while (ended === 0 && (await waiting()) < running.length);
      if (ended > 0) throw new Error('nothing held it')
    }
  })
  return Promise.all(running)
}

/** How many connections to this database wait for a lock. */
async function waiting(): Promise<number> {
  const { rows } =
    await pool.query(`select count(distinct pid)::int as pids from pg_locks join pg_stat_activity using (pid)
    where not granted and datname = current_database()`)
  return rows[0].pids
}

import { drizzle } from 'drizzle-orm/node-postgres'
import pg from 'pg'
import { v7 } from 'uuid'
import type { Actor } from '~/book/actions'
import { addMark } from '~/book/edits'
import type { BookId, ConditionId, MarkId, OperationId } from '~/book/ids'
import type { MarkKind } from '~/book/kinds'
import type { BookView } from '~/book/view'
import { applyBatch } from '~/db/apply.server'
import { makeBook } from '~/db/books.server'
import { readCars } from '~/db/cars.server'
import type { Db } from '~/db/database'
import { readBook } from '~/db/read-book.server'
import { findSignIn, readTeamOf } from '~/db/read-people.server'
import { makeLapFrame } from '~/track/lap-frame'
import { along, offset, station } from '~/track/units'

const KINDS: readonly MarkKind[] = ['brake', 'gear', 'turnin', 'release', 'apex', 'throttle', 'full', 'trackout']

/** Makes a book with so many marks on the layout of another book, spread over its corners; answers with its slug. */
export async function makeBigBook(
  databaseUrl: string,
  of: { email: string; team: string; book: string },
  marks: number,
) {
  const client = new pg.Client({ connectionString: databaseUrl })
  await client.connect()
  try {
    const db = drizzle(client)
    const actor = await actorOf(db, of.email, of.team)
    const model = await known(readBook(db, actor, of.book), 'the model book')
    const [car] = await readCars(db, actor)
    if (!car) throw new Error('the team has no car')
    const id = v7() as BookId
    const made = await makeBook(db, actor, { id, name: `Bench ${marks}`, layout: model.layout.id, car: car.id })
    if (made.kind !== 'made') throw new Error(`no book was made: ${made.kind}`)
    const book = await known(readBook(db, actor, made.slug), 'the new book')
    const batch = await applyBatch(db, actor, marksFor(book, marks))
    if (batch.kind !== 'applied') throw new Error('the marks were not written')
    return made.slug
  } finally {
    await client.end()
  }
}

async function known<Thing>(reading: Promise<Thing | null>, name: string): Promise<Thing> {
  const thing = await reading
  if (thing === null) throw new Error(`${name} is not there`)
  return thing
}

async function actorOf(db: Db, email: string, slug: string): Promise<Actor> {
  const { person } = await known(findSignIn(db, email), email)
  const { team, role } = await known(readTeamOf(db, person, slug), slug)
  return { kind: 'person', person, team: team.id, role }
}

function marksFor(book: BookView, count: number) {
  const { layout, corners, conditions } = book
  const frame = makeLapFrame({ ...layout, startAlong: along(layout.startAlong) })
  const condition = conditions.find((one) => one.kind === 'dry')?.id as ConditionId
  return Array.from({ length: count }, (_, i) => {
    const corner = corners[i % corners.length]!
    const making = {
      id: v7() as OperationId,
      madeAt: new Date().toISOString(),
      scope: { kind: 'book', id: book.book.id } as const,
    }
    const kind = KINDS[Math.floor(i / corners.length) % KINDS.length]!
    const mark = {
      id: v7() as MarkId,
      card: corner.card.id,
      kind,
      role: null,
      manner: null,
      condition,
      forPerson: null,
      gear: null,
      speed: null,
      ground: 'real' as const,
      at: { station: station((corner.datum.station + (i % 37)) % layout.length), offset: offset((i % 9) - 4) },
    }
    return addMark(making, mark, frame)
  })
}

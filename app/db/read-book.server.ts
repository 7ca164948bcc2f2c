import { and, asc, eq, sql } from 'drizzle-orm'
import type { Actor } from '~/book/actions'
import { assembleBookView } from '~/book/assemble'
import type { BookId, LayoutId } from '~/book/ids'
import type { BookRows, CardRow, CornerRow, MarkRow } from '~/book/rows'
import type { BookView } from '~/book/view'
import { along, metres, metresPerSecond } from '~/track/units'
import type { Db } from './database'
import { ownTeam } from './own-team'
import { placeColumns, placeFrom } from './placing'
import { readLandmarks, readStretches } from './read-landmarks.server'
import { books, cards, cars, circuits, conditions, corners, findings, layouts, marks, places, ties } from './schema'

/**
 * The working book as it is now, or null where the actor's team has none of this name. Seven reads in one snapshot, however many
 * marks it has.
 */
export async function readBook(db: Db, actor: Actor, slug: string): Promise<BookView | null> {
  const rows = await db.transaction((tx) => readRows(tx, actor, slug), {
    isolationLevel: 'repeatable read',
    accessMode: 'read only',
  })
  return rows && assembleBookView(rows)
}

async function readRows(db: Db, actor: Actor, slug: string): Promise<BookRows | null> {
  const head = await readHead(db, actor, slug)
  if (!head) return null
  const { id } = head.book
  const [cornerRows, cardRows] = await readCorners(db, actor, id, head.layout.id)
  return {
    ...head,
    conditions: await readConditions(db, actor, id),
    corners: cornerRows,
    cards: cardRows,
    marks: await readMarks(db, actor, id),
    findings: await readFindings(db, actor, id),
    landmarks: await readLandmarks(db, actor, head.layout.id),
    stretches: await readStretches(db, actor, head.layout.id),
  }
}

type Head = Pick<BookRows, 'book' | 'circuit' | 'layout' | 'car'>

async function readHead(db: Db, actor: Actor, slug: string): Promise<Head | null> {
  const [row] = await db
    .select({
      book: { id: books.id, slug: books.slug, name: books.name, state: books.state, rev: books.rev },
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
      car: { id: cars.id, name: cars.name, length: books.carLength, width: cars.width, eyeHeight: cars.eyeHeight },
    })
    .from(books)
    .innerJoin(layouts, and(eq(layouts.teamId, books.teamId), eq(layouts.id, books.layoutId)))
    .innerJoin(circuits, and(eq(circuits.teamId, layouts.teamId), eq(circuits.id, layouts.circuitId)))
    .innerJoin(cars, and(eq(cars.teamId, books.teamId), eq(cars.id, books.carId)))
    .where(and(ownTeam(actor, books.teamId), eq(books.slug, slug)))
  if (!row) return null
  const { state, ...book } = row.book
  const { layout, car } = row
  return {
    book: { ...book, archived: state === 'archived' },
    circuit: row.circuit,
    layout: { ...layout, length: metres(layout.length), roadWidth: metres(layout.roadWidth) },
    car: { ...car, length: metres(car.length), width: metres(car.width), eyeHeight: metres(car.eyeHeight) },
  }
}

function readConditions(db: Db, actor: Actor, book: BookId): Promise<BookRows['conditions']> {
  return db
    .select({ id: conditions.id, kind: conditions.kind, name: conditions.name })
    .from(conditions)
    .where(and(ownTeam(actor, conditions.teamId), eq(conditions.bookId, book), eq(conditions.state, 'live')))
    .orderBy(sql`${conditions.rank} collate "C"`, asc(conditions.id))
}

async function readCorners(db: Db, actor: Actor, book: BookId, layout: LayoutId): Promise<[CornerRow[], CardRow[]]> {
  const rows = await db
    .select({
      corner: {
        id: corners.id,
        number: corners.number,
        name: corners.name,
        direction: corners.direction,
        turnDegrees: corners.turnDegrees,
        leastRadius: corners.leastRadius,
        entry: corners.entry,
        apex: corners.apex,
        exit: corners.exit,
      },
      datumAlong: corners.datumAlong,
      datumWords: corners.datumWords,
      card: cardColumns,
    })
    .from(corners)
    .innerJoin(cards, and(eq(cards.teamId, corners.teamId), eq(cards.cornerId, corners.id), eq(cards.bookId, book)))
    .where(and(ownTeam(actor, corners.teamId), eq(corners.layoutId, layout), eq(corners.state, 'live')))
  return [
    rows.map(({ corner, datumAlong, datumWords }) => ({
      ...corner,
      leastRadius: metres(corner.leastRadius),
      datum: { along: along(datumAlong), words: datumWords },
    })),
    rows.map(({ card, corner }) => ({
      ...card,
      corner: corner.id,
      speedIn: speedOf(card.speedIn),
      leastSpeed: speedOf(card.leastSpeed),
    })),
  ]
}

const speedOf = (value: number | null) => (value === null ? null : metresPerSecond(value))

const cardColumns = {
  id: cards.id,
  gearIn: cards.gearIn,
  gearOut: cards.gearOut,
  speedIn: cards.speedIn,
  leastSpeed: cards.leastSpeed,
  flat: cards.flat,
  noReference: cards.noReference,
  line: cards.line,
  kerbs: cards.kerbs,
  surface: cards.surface,
  water: cards.water,
  car: cards.car,
  mistake: cards.mistake,
  traffic: cards.traffic,
  limits: cards.limits,
  backup: cards.backup,
  next: cards.next,
  setsUp: cards.setsUp,
  compromisedFor: cards.compromisedFor,
}

const onPlace = and(eq(places.teamId, marks.teamId), eq(places.markId, marks.id))
const onTie = and(eq(ties.teamId, places.teamId), eq(ties.markId, places.markId), eq(ties.ground, places.ground))

async function readMarks(db: Db, actor: Actor, book: BookId): Promise<MarkRow[]> {
  const rows = await db
    .select({
      mark: {
        id: marks.id,
        card: marks.cardId,
        kind: marks.kind,
        role: marks.role,
        manner: marks.manner,
        condition: marks.conditionId,
        forPerson: marks.forPerson,
        madeBy: marks.madeBy,
        gear: marks.gear,
        downshifts: marks.downshifts,
        speed: marks.speed,
      },
      place: placeColumns,
    })
    .from(marks)
    .leftJoin(places, onPlace)
    .leftJoin(ties, onTie)
    .where(and(ownTeam(actor, marks.teamId), eq(marks.bookId, book), eq(marks.state, 'live')))
  const found = new Map<string, MarkRow>()
  for (const { mark, place } of rows) {
    const known = found.get(mark.id) ?? { ...mark, speed: speedOf(mark.speed), sim: null, real: null }
    found.set(mark.id, known)
    const { ground, along, across } = place
    if (ground !== null && along !== null && across !== null) known[ground] = placeFrom({ ...place, along, across })
  }
  return [...found.values()]
}

async function readFindings(db: Db, actor: Actor, book: BookId): Promise<BookRows['findings']> {
  const rows = await db
    .select({
      mark: findings.markId,
      ground: findings.ground,
      person: findings.personId,
      by: findings.byId,
      condition: findings.conditionId,
      verdict: findings.verdict,
      proof: findings.proof,
      along: findings.along,
      across: findings.across,
      at: findings.foundAt,
    })
    .from(findings)
    .where(and(ownTeam(actor, findings.teamId), eq(findings.bookId, book)))
    .orderBy(asc(findings.foundAt), asc(findings.id))
  return rows.map((row) => ({ ...row, at: row.at.toISOString() }))
}

import { beforeAll, describe, expect, test } from 'vitest'
import type { Operation } from '~/book/operation'
import { applyBatch, applyOperation } from '~/db/apply.server'
import { importCircuit } from '~/db/circuits.server'
import { addFindings } from '~/db/journal.server'
import { readBook } from '~/db/read-book.server'
import { readBooks } from '~/db/read-books.server'
import { readChanges } from '~/db/read-changes.server'
import { CIRCUITS_A_PAGE, type CircuitsPage, readCircuit, readCircuits, readLayouts } from '~/db/read-circuits.server'
import { readCentreline, readGround } from '~/db/read-geometry.server'
import { readTeamPeople } from '~/db/read-team.server'
import {
  addsLandmark,
  addsMark,
  type Book,
  bookOf,
  circuit,
  db,
  expectKind,
  makeTeam,
  makeTeamBook,
  newId,
  newLandmark,
  newMark,
  operation,
  place,
  pool,
  tieTo,
} from './support'

/** How many statements a read sends. */
async function statementsOf(read: () => Promise<unknown>): Promise<number> {
  let sent = 0
  const client = await pool.connect()
  const prototype = Object.getPrototypeOf(client)
  client.release()
  const { query } = prototype
  prototype.query = function count(...given: unknown[]) {
    sent += 1
    return query.apply(this, given)
  }
  try {
    await read()
  } finally {
    prototype.query = query
  }
  return sent
}

/** Marks of both corners with ties, both grounds and a finding each. */
async function fill(book: Book, count: number) {
  const landmark = newLandmark()
  const ids = Array.from({ length: count }, newMark)
  const marks: Operation[] = ids.map((id, at) =>
    addsMark(book, id, {
      cardId: book.cards[at % 2]!,
      real: place(100 + at, 3, tieTo(landmark, at + 10)),
      sim: place(102 + at, 2.5),
    }),
  )
  const outcome = await applyBatch(db, book.team.coach, [addsLandmark(book, landmark, 90), ...marks])
  expect(outcome.kind).toBe('applied')
  const found = ids.map((mark, at) => ({
    id: newId(),
    mark,
    ground: 'real',
    person: book.team.driver.person,
    condition: book.dry,
    verdict: 'kept',
    proof: 'seen',
    method: 'gps',
    accuracy: 3.5,
    along: 100 + at,
    across: 3,
    foundAt: '2026-10-03T11:22:33.000Z',
    note: '',
  }))
  expect((await addFindings(db, book.team.driver, found)).kind).toBe('added')
}

describe('a book', () => {
  test('is read in as many statements with 500 marks as with 10, at most ten', async () => {
    const [small, large] = [await makeTeamBook(await makeTeam()), await makeTeamBook(await makeTeam())]
    await fill(small, 10)
    await fill(large, 500)
    const few = await statementsOf(() => readBook(db, small.team.driver, small.slug))
    const many = await statementsOf(() => readBook(db, large.team.driver, large.slug))
    expect(many).toBe(few)
    // Seven reads between begin and commit.
    expect(few).toBe(9)
    const view = await bookOf(large.team, large.slug)
    expect(view.corners.flatMap(({ marks }) => marks)).toHaveLength(500)
    expect(view.corners.map(({ marks }) => marks.length)).toEqual([250, 250])
  }, 60_000)

  describe('of another team', () => {
    let book: Book
    let stranger: Book
    beforeAll(async () => {
      book = await makeTeamBook(await makeTeam())
      stranger = await makeTeamBook(await makeTeam())
      await fill(book, 3)
    })

    test('is not there, even under a name that both have', async () => {
      expect(book.slug).toBe(stranger.slug)
      const theirs = await bookOf(stranger.team, book.slug)
      expect(theirs.book.id).toBe(stranger.id)
      expect(theirs.corners.flatMap(({ marks }) => marks)).toEqual([])
    })

    test('shows in no list, no log, no geometry', async () => {
      const { manager } = stranger.team
      expect((await readBooks(db, manager)).map(({ id }) => id)).toEqual([stranger.id])
      expect((await readCircuits(db, manager)).entries.map(({ layout }) => layout.id)).toEqual([stranger.layout])
      expect(await readChanges(db, manager, { book: book.view.book.id, limit: 50 })).toEqual([])
      const log = await readChanges(db, manager, { limit: 500 })
      expect(log.filter(({ book: id }) => id === book.view.book.id)).toEqual([])
      expect(await readCentreline(db, manager, book.view.layout.centreline)).toBeNull()
      expect(await readGround(db, manager, book.view.layout.centreline)).toBeNull()
      const people = (await readTeamPeople(db, manager)).map(({ id }) => id)
      expect(people).not.toContain(book.team.driver.person)
    })

    test('is not there for a stranger or for somebody of no team', async () => {
      expect(await readBook(db, { kind: 'stranger' }, book.slug)).toBeNull()
      const nobody = { ...book.team.driver, person: newId() as never }
      expect(await readBook(db, nobody, book.slug)).toBeNull()
      expect(await readBooks(db, nobody)).toEqual([])
      const posing = { ...stranger.team.manager, team: book.team.id }
      expect(await readBook(db, posing, book.slug)).toBeNull()
      expect(await readCircuit(db, posing, 'sandbar')).toBeNull()
    })
  })
})

describe('lists', () => {
  test('count what lives', async () => {
    const book = await makeTeamBook(await makeTeam())
    await fill(book, 4)
    expect(await readBooks(db, book.team.driver)).toMatchObject([
      { slug: 'sandbar', circuit: 'Sandbar', car: 'Car 41', corners: 2, marks: 4, archived: false },
    ])
    const { entries, goesOn } = await readCircuits(db, book.team.driver)
    expect(entries).toMatchObject([{ slug: 'sandbar', corners: 2, books: 1 }])
    expect(goesOn).toBe(false)
    const across = entries[0]!.outline.filter((_, i) => i % 2 === 0)
    expect(Math.max(...across) - Math.min(...across)).toBeCloseTo(400, -1)
  })

  test('circuits come in pages by name, each page in one statement; those to choose from come all at once', async () => {
    const { coach } = await makeTeam()
    const names = Array.from({ length: CIRCUITS_A_PAGE + 2 }, (_, i) => `Sandbar ${String.fromCharCode(65 + i)}`)
    for (const name of [...names].reverse()) {
      const drawn = circuit([])
      expect((await importCircuit(db, coach, { ...drawn, circuit: { ...drawn.circuit, name } })).kind).toBe('made')
    }
    const namesOf = ({ entries }: CircuitsPage) => entries.map(({ name }) => name)
    const [first, second] = [await readCircuits(db, coach), await readCircuits(db, coach, 2)]
    expect([...namesOf(first), ...namesOf(second)]).toEqual(names)
    expect([first.goesOn, second.goesOn]).toEqual([true, false])
    expect(await readCircuits(db, coach, 3)).toEqual({ entries: [], goesOn: false })
    expect((await readLayouts(db, coach)).map((layout) => layout.circuit)).toEqual(names)
    expect(await statementsOf(() => readCircuits(db, coach))).toBe(1)
  })

  test('a circuit for editing has its corners in road order, its landmarks and its centreline', async () => {
    const book = await makeTeamBook(await makeTeam())
    await fill(book, 1)
    const read = await readCircuit(db, book.team.coach, 'sandbar')
    expect(read?.corners.map(({ number, datum }) => [number, datum.along])).toEqual([
      ['1', 252],
      ['2', 702],
    ])
    expect(read?.landmarks).toMatchObject([{ name: 'White post', real: { along: 90, across: 7.4 } }])
    const centreline = await readCentreline(db, book.team.coach, read!.layout.centreline)
    expect(centreline?.length).toBeCloseTo(read!.layout.length, 6)
    expect(await readCentreline(db, book.team.coach, read!.layout.centreline)).toBe(centreline)
  })

  test('the log says whose thing was changed, also of a thing that is gone, and of nobody’s', async () => {
    const book = await makeTeamBook(await makeTeam())
    const { coach, driver, second } = book.team
    const [mark, landmark] = [newMark(), newLandmark()]
    const sent = [
      [driver, addsMark(book, mark)],
      [second, addsLandmark(book, landmark, 90)],
      [coach, operation(book.scope, 'mark', mark, { state: ['live', 'dropped'] })],
      [coach, operation(book.layoutScope, 'landmark', landmark, { name: ['White post', 'Old post'] })],
      [coach, operation(book.scope, 'card', book.cards[0], { line: ['', 'wide in'] })],
    ] as const
    for (const [person, change] of sent) expectKind(await applyOperation(db, person, change), 'applied')
    const log = await readChanges(db, coach, { limit: sent.length })
    const makers = [null, second.person, driver.person, second.person, driver.person]
    expect(log.map(({ madeBy }) => madeBy)).toEqual(makers)
  })

  test('the log comes in pages, latest first', async () => {
    const book = await makeTeamBook(await makeTeam())
    await fill(book, 5)
    const asked = { book: book.view.book.id, limit: 3 }
    const first = await readChanges(db, book.team.driver, asked)
    const next = await readChanges(db, book.team.driver, { ...asked, before: first.at(-1)!.at })
    expect([...first, ...next].map(({ rev }) => rev)).toEqual([9, 8, 7, 6, 5, 4])
  })
})

import { beforeAll, describe, expect, test } from 'vitest'
import type { BookId, CarId, LayoutId } from '~/book/ids'
import { makeBook } from '~/db/books.server'
import { addCar, changeCar, readCars } from '~/db/cars.server'
import { importCircuit, type NewCircuit } from '~/db/circuits.server'
import { DRAFTS_KEPT, dropImport, putImport, readImport, setImportOptions, sweepImports } from '~/db/imports.server'
import { readBooks } from '~/db/read-books.server'
import { readChanges } from '~/db/read-changes.server'
import { readCircuit, readCircuits } from '~/db/read-circuits.server'
import { freeSlug, slugOf } from '~/db/slugs'
import { type Book, bookOf, circuit, corner, db, makeTeam, makeTeamBook, newId, pool, type Team } from './support'

let team: Team
let book: Book
beforeAll(async () => {
  team = await makeTeam()
  book = await makeTeamBook(team)
})

describe('a circuit that is brought in', () => {
  test('stands with its layout, and its corners in the change log', async () => {
    const own = await makeTeam()
    const drawn = circuit([corner('1', 200), corner('2', 500), corner('3', 900)])
    const made = await importCircuit(db, own.coach, drawn)
    expect(made).toMatchObject({ kind: 'made', slug: 'sandbar' })
    const read = await readCircuit(db, own.driver, 'sandbar')
    expect(read?.layout.rev).toBe(3)
    expect(read?.corners.map(({ id }) => id)).toEqual(drawn.corners.map(({ id }) => id))
    const log = await readChanges(db, own.driver, { layout: drawn.layout.id, limit: 9 })
    expect(log.map(({ rev, by }) => [rev, by])).toEqual([3, 2, 1].map((rev) => [rev, own.coach.person]))
  })

  test('leaves nothing behind where one of its corners cannot be', async () => {
    const own = await makeTeam()
    const outcome = await importCircuit(db, own.coach, circuit([corner('1', 200), corner('1', 500)]))
    expect(outcome).toMatchObject({ kind: 'invalid', problems: [{ code: 'taken' }] })
    const bad = await importCircuit(db, own.coach, circuit([corner('1', 200), corner('Two', 500)]))
    expect(bad).toMatchObject({ kind: 'invalid', problems: [{ field: 'corners.Two.number' }] })
    expect(await readCircuits(db, own.coach)).toEqual({ entries: [], goesOn: false })
    const { rows } = await pool.query('select count(*)::int as rows from centrelines where team_id = $1', [own.id])
    expect(rows).toEqual([{ rows: 0 }])
  })

  test('is refused from a driver and from outside', async () => {
    expect(await importCircuit(db, team.driver, circuit())).toEqual({ kind: 'refused', reason: 'role' })
    expect(await importCircuit(db, { kind: 'stranger' }, circuit())).toEqual({
      kind: 'refused',
      reason: 'not-a-member',
    })
    const posing = { ...(await makeTeam()).manager, team: team.id }
    expect(await importCircuit(db, posing, circuit())).toEqual({ kind: 'refused', reason: 'not-a-member' })
  })

  test('sent again is there once', async () => {
    const own = await makeTeam()
    const drawn = circuit()
    const outcomes = await Promise.all([1, 2, 3].map(() => importCircuit(db, own.coach, drawn)))
    expect(new Set(outcomes.map((outcome) => JSON.stringify(outcome))).size).toBe(1)
    expect((await readCircuits(db, own.coach)).entries).toHaveLength(1)
  })

  test.each<[string, (drawn: NewCircuit) => NewCircuit]>([
    ['circuit.name', (drawn) => ({ ...drawn, circuit: { ...drawn.circuit, name: ' ' } })],
    ['circuit.timeZone', (drawn) => ({ ...drawn, circuit: { ...drawn.circuit, timeZone: 'Atlantic/Nowhere' } })],
    ['layout.roadWidth', (drawn) => ({ ...drawn, layout: { ...drawn.layout, roadWidth: Number.NaN } })],
    ['layout.startAlong', (drawn) => ({ ...drawn, layout: { ...drawn.layout, startAlong: 5000 } })],
    ['positions', (drawn) => ({ ...drawn, positions: drawn.positions.slice(0, 5) })],
  ])('needs a sensible %s', async (field, spoil) => {
    const outcome = await importCircuit(db, team.coach, spoil(circuit()))
    expect(outcome).toMatchObject({ kind: 'invalid', problems: [{ field }] })
  })

  test('drawn twice alike shares its centreline, and each has a name of its own in addresses', async () => {
    const own = await makeTeam()
    const drawn = circuit()
    const again = { ...circuit(), positions: drawn.positions }
    expect(await importCircuit(db, own.coach, drawn)).toMatchObject({ slug: 'sandbar' })
    expect(await importCircuit(db, own.coach, again)).toMatchObject({ slug: 'sandbar-2' })
    const reads = ['sandbar', 'sandbar-2'].map((slug) => readCircuit(db, own.coach, slug))
    const hashes = (await Promise.all(reads)).map((read) => read?.layout.centreline)
    expect(new Set(hashes).size).toBe(1)
  })
})

describe('a new book', () => {
  test('has dry and wet, an empty card for each corner, and the car’s length pinned', async () => {
    const view = await bookOf(team, book.slug)
    expect(view.conditions.map(({ kind, name }) => [kind, name])).toEqual([
      ['dry', 'Dry'],
      ['wet', 'Wet'],
    ])
    expect(view.corners.map(({ card }) => [card.line, card.flat, card.kerbs])).toEqual([
      ['', false, []],
      ['', false, []],
    ])
    const [car] = await readCars(db, team.coach)
    expect((await changeCar(db, team.coach, { ...car!, length: 4.9, name: 'Car 41 B' })).kind).toBe('changed')
    expect((await bookOf(team, book.slug)).car).toMatchObject({ length: 4.6, name: 'Car 41 B' })
  })

  test('has an address of its own', async () => {
    const [car] = await readCars(db, team.coach)
    const add = (name: string) =>
      makeBook(db, team.coach, { id: newId<BookId>(), name, layout: book.layout, car: car!.id })
    expect(await add('Sandbar')).toMatchObject({ kind: 'made', slug: 'sandbar-2' })
    expect(await add('  Sändbar, wet ')).toMatchObject({ kind: 'made', slug: 'sandbar-wet' })
    expect(await add('New')).toMatchObject({ kind: 'made', slug: 'new-2' })
    expect(await add('   ')).toEqual({ kind: 'invalid', problems: [{ field: 'name', code: 'required' }] })
    expect(await readBooks(db, team.driver)).toHaveLength(4)
  })

  test('sent again is there once; two of one name at one moment have two addresses', async () => {
    const own = await makeTeamBook(await makeTeam())
    const [car] = await readCars(db, own.team.coach)
    const ask = (id: BookId) => makeBook(db, own.team.coach, { id, name: 'Spring', layout: own.layout, car: car!.id })
    const [first, second] = [newId<BookId>(), newId<BookId>()]
    const made = await Promise.all([ask(first), ask(first), ask(second)])
    const slugs = made.map((outcome) => (outcome.kind === 'made' ? outcome.slug : outcome.kind))
    expect(slugs[0]).toBe(slugs[1])
    expect(new Set(slugs)).toEqual(new Set(['spring', 'spring-2']))
    expect(await readBooks(db, own.team.coach)).toHaveLength(3)
  })

  test('needs a layout and a car of the team, and the right', async () => {
    const other = await makeTeamBook(await makeTeam())
    const [car] = await readCars(db, team.coach)
    const [theirs] = await readCars(db, other.team.coach)
    const ask = (layout: LayoutId, id: CarId, by = team.coach) =>
      makeBook(db, by, { id: newId<BookId>(), name: 'Guest', layout, car: id })
    expect(await ask(other.layout, car!.id)).toMatchObject({ problems: [{ field: 'layout', code: 'not-found' }] })
    expect(await ask(book.layout, theirs!.id)).toMatchObject({ problems: [{ field: 'car', code: 'not-found' }] })
    expect(await ask(book.layout, car!.id, team.driver)).toEqual({ kind: 'refused', reason: 'role' })
  })
})

describe('cars', () => {
  test('are the team’s own', async () => {
    const other = await makeTeam()
    const car = { id: newId<CarId>(), name: 'Spare', length: 4.4, width: 1.9, eyeHeight: 1.1 }
    expect(await addCar(db, other.manager, car)).toEqual({ kind: 'made', car: car.id })
    expect((await readCars(db, team.coach)).map(({ id }) => id)).not.toContain(car.id)
    expect(await changeCar(db, team.coach, car)).toEqual({ kind: 'not-found' })
    expect(await addCar(db, team.driver, car)).toEqual({ kind: 'refused', reason: 'role' })
  })

  test('measure something', async () => {
    const car = { id: newId<CarId>(), name: 'Spare', length: 0, width: -1, eyeHeight: Number.POSITIVE_INFINITY }
    const problems = ['length', 'width', 'eyeHeight'].map((field) => ({ field, code: 'out-of-range' }))
    expect(await addCar(db, team.coach, car)).toEqual({ kind: 'invalid', problems })
  })
})

describe('a draft of an import', () => {
  const bytes = new Uint8Array([0, 255, 60, 103, 112, 120])
  const draft = () => ({ id: newId<string>(), fileName: 'lap 3.gpx', bytes, options: { reversed: false } })

  test('is one of the latest few of its person; nobody else’s go', async () => {
    const own = await makeTeam()
    const [mine, others] = [Array.from({ length: DRAFTS_KEPT + 2 }, draft), draft()]
    await putImport(db, own.manager, others)
    for (const one of mine) expect(await putImport(db, own.coach, one)).toEqual({ kind: 'kept' })
    const kept = await Promise.all(mine.map(({ id }) => readImport(db, own.coach, id)))
    expect(kept.map((one) => one !== null)).toEqual(mine.map((_, at) => at >= 2))
    expect((await readImport(db, own.manager, others.id))?.id).toBe(others.id)
  })

  test('keeps bytes and choices for its uploader alone', async () => {
    const own = draft()
    expect(await putImport(db, team.coach, own)).toEqual({ kind: 'kept' })
    expect(await setImportOptions(db, team.coach, own.id, { reversed: true, lap: 2 })).toBe(true)
    expect(await readImport(db, team.coach, own.id)).toEqual({ ...own, options: { reversed: true, lap: 2 } })
    expect(await readImport(db, team.manager, own.id)).toBeNull()
    expect(await setImportOptions(db, team.manager, own.id, {})).toBe(false)
    expect(await readImport(db, (await makeTeam()).coach, own.id)).toBeNull()
    await dropImport(db, team.manager, own.id)
    expect(await readImport(db, team.coach, own.id)).not.toBeNull()
    await dropImport(db, team.coach, own.id)
    expect(await readImport(db, team.coach, own.id)).toBeNull()
  })

  test('over 20 MB or from a driver is not taken', async () => {
    const large = { ...draft(), bytes: new Uint8Array(20 * 1024 * 1024 + 1) }
    expect(await putImport(db, team.coach, large)).toEqual({
      kind: 'invalid',
      problems: [{ field: 'file', code: 'too-large' }],
    })
    expect(await putImport(db, team.driver, draft())).toEqual({ kind: 'refused', reason: 'role' })
  })

  test('is swept a day after it came, not before', async () => {
    const own = draft()
    await putImport(db, team.coach, own)
    await sweepImports(db, new Date(Date.now() + 23 * 3_600_000))
    expect(await readImport(db, team.coach, own.id)).not.toBeNull()
    expect(await sweepImports(db, new Date(Date.now() + 25 * 3_600_000))).toBeGreaterThan(0)
    expect(await readImport(db, team.coach, own.id)).toBeNull()
  })
})

describe('a name in an address', () => {
  test.each([
    ['Marram Head', 'marram-head'],
    ['Åre: långa varvet', 'are-langa-varvet'],
    ['  --  ', 'untitled'],
    ['砂州', 'untitled'],
  ])('%s becomes %s', (name, slug) => {
    expect(slugOf(name)).toBe(slug)
  })

  test('takes the first free number', () => {
    expect(freeSlug('Marram Head', ['marram-head', 'marram-head-2'])).toBe('marram-head-3')
  })
})

import { beforeAll, describe, expect, test } from 'vitest'
import { applyOperation } from '~/db/apply.server'
import {
  addsMark,
  type Book,
  db,
  expectKind,
  makeTeam,
  makeTeamBook,
  markOf,
  newId,
  newMark,
  operation,
  place,
} from './support'

let book: Book
beforeAll(async () => {
  book = await makeTeamBook(await makeTeam())
})

/** A mark of the first driver. */
async function addMark(more = {}) {
  const id = newMark()
  expectKind(await applyOperation(db, book.team.driver, addsMark(book, id, more)), 'applied')
  return id
}

describe('one change', () => {
  test('a mark is added with its place and takes the next revision', async () => {
    const id = newMark()
    const before = (await markOf(book, id)) ?? null
    const { rev } = expectKind(await applyOperation(db, book.team.driver, addsMark(book, id, { gear: 4 })), 'applied')
    expect(before).toBeNull()
    expect(rev).toBe(book.view.book.rev + 1)
    const mark = await markOf(book, id)
    expect(mark).toMatchObject({ kind: 'brake', gear: 4, sim: null, madeBy: book.team.driver.person })
    expect(mark?.real?.station).toBeCloseTo(120, 3)
  })

  test('metres are rounded to the millimetre and speeds to a tenth of a kilometre per hour', async () => {
    const id = await addMark({ real: place(130.12345, 2.00049), speed: 41.0001 })
    const mark = await markOf(book, id)
    expect(mark?.real?.stored).toMatchObject({ along: 130.123, across: 2 })
    expect(mark?.speed).toBeCloseTo(1476 / 36, 9)
  })

  test('a place nudged back over the first drawn position lies at the end of the lap', async () => {
    const id = await addMark({ real: place(-3.25, 0.5) })
    const mark = await markOf(book, id)
    expect(mark?.real?.station).toBeCloseTo(book.view.layout.length - 3.25, 3)
  })

  test('a value that is so already is written by nobody, and sending it again stays done', async () => {
    const id = await addMark({ gear: 5 })
    const same = operation(book.scope, 'mark', id, { gear: [3, 5] })
    const { rev } = expectKind(await applyOperation(db, book.team.driver, same), 'nothing')
    expectKind(
      await applyOperation(db, book.team.driver, operation(book.scope, 'mark', id, { gear: [5, 6] })),
      'applied',
    )
    expect(await applyOperation(db, book.team.driver, same)).toEqual({ kind: 'already-applied', rev })
    expect((await markOf(book, id))?.gear).toBe(6)
  })

  test('the undo that comes back takes it back', async () => {
    const id = await addMark({ gear: 2 })
    const changed = await applyOperation(db, book.team.driver, operation(book.scope, 'mark', id, { gear: [2, 3] }))
    const { undo } = expectKind(changed, 'applied')
    expectKind(await applyOperation(db, book.team.driver, undo), 'applied')
    expect((await markOf(book, id))?.gear).toBe(2)
  })

  test('taking back the making of a mark drops it, taking that back brings it again', async () => {
    const id = newMark()
    const made = expectKind(await applyOperation(db, book.team.driver, addsMark(book, id)), 'applied')
    const dropped = expectKind(await applyOperation(db, book.team.driver, made.undo), 'applied')
    expect(await markOf(book, id)).toBeUndefined()
    expectKind(await applyOperation(db, book.team.driver, dropped.undo), 'applied')
    expect((await markOf(book, id))?.real?.offset).toBe(3.2)
  })
})

describe('the same id twice', () => {
  test('with the same body it is done once', async () => {
    const id = newMark()
    const sent = addsMark(book, id)
    const { rev } = expectKind(await applyOperation(db, book.team.driver, sent), 'applied')
    expect(await applyOperation(db, book.team.driver, structuredClone(sent))).toEqual({ kind: 'already-applied', rev })
  })

  test('with the same body at the same moment it is done once', async () => {
    const id = newMark()
    const sent = addsMark(book, id)
    const outcomes = await Promise.all([1, 2, 3, 4].map(() => applyOperation(db, book.team.driver, sent)))
    expect(outcomes.map(({ kind }) => kind).sort()).toEqual([
      'already-applied',
      'already-applied',
      'already-applied',
      'applied',
    ])
  })

  test('with another body it is refused', async () => {
    const id = await addMark({ gear: 4 })
    const first = operation(book.scope, 'mark', id, { gear: [4, 5] })
    expectKind(await applyOperation(db, book.team.driver, first), 'applied')
    const other = { ...operation(book.scope, 'mark', id, { gear: [5, 2] }), id: first.id }
    expect(await applyOperation(db, book.team.driver, other)).toEqual({ kind: 'refused', reason: 'id-in-use' })
    expect((await markOf(book, id))?.gear).toBe(5)
  })

  test('another person of the team cannot use it either', async () => {
    const id = await addMark({ gear: 4 })
    const first = operation(book.scope, 'mark', id, { gear: [4, 6] })
    expectKind(await applyOperation(db, book.team.driver, first), 'applied')
    expect(await applyOperation(db, book.team.coach, first)).toEqual({ kind: 'refused', reason: 'id-in-use' })
  })
})

describe('two people at once', () => {
  test('edits of different fields both stand', async () => {
    const id = await addMark({ gear: 3, manner: 'full' })
    const gear = operation(book.scope, 'mark', id, { gear: [3, 4] })
    const manner = operation(book.scope, 'mark', id, { manner: ['full', 'trail'] })
    const outcomes = await Promise.all([
      applyOperation(db, book.team.driver, gear),
      applyOperation(db, book.team.coach, manner),
    ])
    const revs = outcomes.map((outcome) => expectKind(outcome, 'applied').rev)
    expect(Math.abs(revs[0]! - revs[1]!)).toBe(1)
    expect(await markOf(book, id)).toMatchObject({ gear: 4, manner: 'trail' })
  })

  test('of two edits of one field the second is told what the first wrote, and nothing of it is written', async () => {
    const id = await addMark({ gear: 3, manner: 'full' })
    const mine = operation(book.scope, 'mark', id, { gear: [3, 4] })
    const theirs = operation(book.scope, 'mark', id, { gear: [3, 2], manner: ['full', 'brush'] })
    const outcomes = await Promise.all([
      applyOperation(db, book.team.driver, mine),
      applyOperation(db, book.team.coach, theirs),
    ])
    expect(outcomes.map(({ kind }) => kind).sort()).toEqual(['applied', 'conflict'])
    const lost = outcomes.find((outcome) => outcome.kind === 'conflict')!
    const mark = await markOf(book, id)
    expect(lost).toMatchObject({ theirs: { gear: mark?.gear } })
    expect([
      [4, 'full'],
      [2, 'brush'],
    ]).toContainEqual([mark?.gear, mark?.manner])
  })

  test('sim and real places of one mark are two fields', async () => {
    const id = await addMark()
    const sim = operation(book.scope, 'mark', id, { sim: [null, place(126, 3.1)] })
    const real = operation(book.scope, 'mark', id, { real: [place(120, 3.2), place(114, 3)] })
    const outcomes = await Promise.all([
      applyOperation(db, book.team.coach, sim),
      applyOperation(db, book.team.driver, real),
    ])
    expect(outcomes.map(({ kind }) => kind)).toEqual(['applied', 'applied'])
    const mark = await markOf(book, id)
    expect([mark?.sim?.stored.along, mark?.real?.stored.along]).toEqual([126, 114])
  })

  test('many at once each take a revision of their own', async () => {
    const outcomes = await Promise.all(
      Array.from({ length: 8 }, () => applyOperation(db, book.team.second, addsMark(book, newMark()))),
    )
    const revs = outcomes.map((outcome) => expectKind(outcome, 'applied').rev)
    expect(new Set(revs).size).toBe(8)
    expect(Math.max(...revs) - Math.min(...revs)).toBe(7)
  })
})

describe('what is no operation', () => {
  test.each([
    ['nothing', null],
    ['a text', 'operation'],
    ['no fields', {}],
  ])('%s is invalid', async (_, input) => {
    expect((await applyOperation(db, book.team.coach, input)).kind).toBe('invalid')
  })

  const deep = () => {
    let nested: unknown = 'bottom'
    for (let depth = 0; depth < 50_000; depth += 1) nested = [nested]
    return nested
  }

  test.each<[string, () => unknown]>([
    ['a NUL in a text', () => 'line\0break'],
    ['half a character', () => 'half \ud83d'],
    ['a place without end', deep],
  ])('%s cannot be kept and is invalid', async (_, value) => {
    const card = (to: unknown) => operation(book.scope, 'card', book.cards[0], { line: ['', to as string] })
    expect((await applyOperation(db, book.team.coach, card(value()))).kind).toBe('invalid')
    const reasoned = { ...addsMark(book, newMark()), reason: value() }
    expect((await applyOperation(db, book.team.coach, reasoned)).kind).toBe('invalid')
  })

  test('a newer version is refused as such', async () => {
    const sent = { ...addsMark(book, newMark()), v: 2 }
    expect(await applyOperation(db, book.team.coach, sent)).toEqual({ kind: 'refused', reason: 'newer-version' })
  })

  test('a target of the other kind of scope is refused', async () => {
    const sent = operation(book.scope, 'landmark', newId(), { state: [null, 'live'] })
    expect(await applyOperation(db, book.team.coach, sent)).toEqual({ kind: 'refused', reason: 'unknown-target' })
  })
})

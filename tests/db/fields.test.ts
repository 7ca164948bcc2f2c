import { beforeAll, describe, expect, test } from 'vitest'
import type { Json, Operation } from '~/book/operation'
import { applyBatch, applyOperation } from '~/db/apply.server'
import {
  addsLandmark,
  addsMark,
  type Book,
  bookOf,
  db,
  expectKind,
  makeTeam,
  makeTeamBook,
  markOf,
  newId,
  newLandmark,
  newMark,
  operation,
  place,
  tieTo,
} from './support'

let book: Book
let elsewhere: Book
let otherTeams: Book
beforeAll(async () => {
  const team = await makeTeam()
  book = await makeTeamBook(team)
  elsewhere = await makeTeamBook(team)
  otherTeams = await makeTeamBook(await makeTeam())
})

const apply = (sent: Operation) => applyOperation(db, book.team.coach, sent)
const problemsOf = async (sent: Operation) => expectKind(await apply(sent), 'invalid').problems

describe('a field', () => {
  test.each<[string, Record<string, Json>, { field: string; code: string }]>([
    ['of no mark is refused', { colour: 'red' }, { field: 'colour', code: 'unknown-field' }],
    ['with an absurd value is refused', { gear: 44 }, { field: 'gear', code: 'invalid' }],
    ['far off the lap is refused', { real: place(9000, 0) }, { field: 'real', code: 'invalid' }],
    ['that a new mark needs must be given', { conditionId: null }, { field: 'conditionId', code: 'required' }],
    ['role is for brake marks alone', { kind: 'apex', role: 'start' }, { field: 'role', code: 'brake-only' }],
    ['a mark has one place at least', { real: null }, { field: 'real', code: 'place-required' }],
    ['that names nothing is refused', { cardId: newId() }, { field: 'cardId', code: 'not-found' }],
  ])('%s', async (_, fields, problem) => {
    expect(await problemsOf(addsMark(book, newMark(), fields))).toEqual([problem])
  })

  test('that is fixed keeps its first value', async () => {
    const id = newMark()
    expectKind(await apply(addsMark(book, id)), 'applied')
    const kind = operation(book.scope, 'mark', id, { kind: ['brake', 'lift'] })
    expect(await problemsOf(kind)).toEqual([{ field: 'kind', code: 'fixed' }])
  })

  test('of a text: empty and nothing are the same', async () => {
    const card = book.cards[0]
    expectKind(await apply(operation(book.scope, 'card', card, { line: ['', 'Late, then straight'] })), 'applied')
    expectKind(await apply(operation(book.scope, 'card', card, { line: ['Late, then straight', null] })), 'applied')
    expectKind(await apply(operation(book.scope, 'card', card, { line: [null, 'Early'] })), 'applied')
    expect((await bookOf(book.team, book.slug)).corners[0]?.card.line).toBe('Early')
  })

  test('each problem is named, not only the first', async () => {
    const problems = await problemsOf(addsMark(book, newMark(), { gear: 0, speed: -3, manner: 'softly' }))
    expect(problems.map(({ field }) => field).sort()).toEqual(['gear', 'manner', 'speed'])
  })
})

describe('what belongs to someone else', () => {
  test.each<[string, () => Record<string, Json>, string]>([
    ['a card of another book', () => ({ cardId: elsewhere.cards[0] }), 'cardId'],
    ['a card of another team', () => ({ cardId: otherTeams.cards[0] }), 'cardId'],
    ['a condition of another book', () => ({ conditionId: elsewhere.dry }), 'conditionId'],
    ['a condition of another team', () => ({ conditionId: otherTeams.wet }), 'conditionId'],
    ['a person of another team', () => ({ forPerson: otherTeams.team.driver.person }), 'forPerson'],
  ])('%s is not found', async (_, fields, field) => {
    expect(await problemsOf(addsMark(book, newMark(), fields()))).toEqual([{ field, code: 'not-found' }])
  })

  test('a landmark of another layout or team is not found', async () => {
    for (const owner of [elsewhere, otherTeams]) {
      const landmark = newLandmark()
      const added = await applyOperation(db, owner.team.coach, addsLandmark(owner, landmark, 90))
      expectKind(added, 'applied')
      const tied = addsMark(book, newMark(), { real: place(93, 3, tieTo(landmark, 3)) })
      expect(await problemsOf(tied)).toEqual([{ field: 'real', code: 'not-found' }])
    }
  })

  test('a corner of another layout or team is not found', async () => {
    for (const owner of [elsewhere, otherTeams]) {
      const sent = operation(book.scope, 'card', book.cards[0], { setsUp: [null, owner.corners[1]!.id] })
      expect(await problemsOf(sent)).toEqual([{ field: 'setsUp', code: 'not-found' }])
    }
  })

  test('a book of another team is not found, nor a mark in it, whichever way it is asked for', async () => {
    const id = newMark()
    expectKind(await applyOperation(db, otherTeams.team.driver, addsMark(otherTeams, id)), 'applied')
    const inTheirs = operation(otherTeams.scope, 'mark', id, { gear: [null, 3] })
    const inOurs = operation(book.scope, 'mark', id, { gear: [null, 3] })
    expect(await apply(inTheirs)).toEqual({ kind: 'not-found' })
    expect(await apply(inOurs)).toEqual({ kind: 'not-found' })
    expect(await apply(operation(book.scope, 'mark', newId(), { gear: [null, 3] }))).toEqual({ kind: 'not-found' })
    expect((await markOf(otherTeams, id))?.gear).toBeNull()
  })

  test('an id of another team is free here: nobody learns that it is in use', async () => {
    const id = newMark()
    expectKind(await applyOperation(db, otherTeams.team.driver, addsMark(otherTeams, id)), 'applied')
    expectKind(await apply(addsMark(book, id, { gear: 6 })), 'applied')
    expect([(await markOf(otherTeams, id))?.gear, (await markOf(book, id))?.gear]).toEqual([null, 6])
  })

  test('a mark of another book of the team is not found in this one', async () => {
    const id = newMark()
    expectKind(await apply(addsMark(elsewhere, id)), 'applied')
    expect(await apply(operation(book.scope, 'mark', id, { gear: [null, 3] }))).toEqual({ kind: 'not-found' })
    expect(await apply(addsMark(book, id))).toEqual({ kind: 'not-found' })
  })
})

describe('corners', () => {
  test('two live ones cannot carry one number', async () => {
    const [, second] = book.corners
    const renumbered = operation(book.layoutScope, 'corner', second!.id, { number: ['2', '1'] })
    expect(await problemsOf(renumbered)).toEqual([{ field: 'number', code: 'taken' }])
    expect((await bookOf(book.team, book.slug)).corners.map(({ number }) => number)).toEqual(['1', '2'])
  })

  test('numbers change places in a batch', async () => {
    const [first, second] = elsewhere.corners
    const outcome = await applyBatch(db, elsewhere.team.coach, [
      operation(elsewhere.layoutScope, 'corner', first!.id, { number: ['1', '2'] }),
      operation(elsewhere.layoutScope, 'corner', second!.id, { number: ['2', '1'] }),
    ])
    expect(outcome.kind).toBe('applied')
    expect((await bookOf(elsewhere.team, elsewhere.slug)).corners.map(({ number }) => number)).toEqual(['2', '1'])
  })

  test('a new one gets a card in every book of its layout', async () => {
    const fields = {
      number: '3',
      name: 'New bend',
      direction: 'right',
      turnDegrees: 31,
      leastRadius: 77,
      entry: 900,
      apex: 930,
      exit: 955,
      datum: { along: 931, words: 'from the tightest point' },
    }
    const set = Object.fromEntries(
      Object.entries({ state: 'live', ...fields }).map(([field, to]) => [field, [null, to] as [Json, Json]]),
    )
    expectKind(await apply(operation(book.layoutScope, 'corner', newId(), set)), 'applied')
    const view = await bookOf(book.team, book.slug)
    expect(view.corners.map(({ number }) => number)).toEqual(['1', '2', '3'])
    expectKind(await apply(operation(book.scope, 'card', view.corners[2]!.card.id, { gearIn: [null, 4] })), 'applied')
  })

  test('one with marks on its card stays', async () => {
    expectKind(await apply(addsMark(book, newMark(), { cardId: book.cards[1] })), 'applied')
    const [, second] = book.corners
    const dropped = operation(book.layoutScope, 'corner', second!.id, { state: ['live', 'dropped'] })
    expect(await problemsOf(dropped)).toEqual([{ field: 'state', code: 'in-use' }])
  })
})

describe('measures', () => {
  test('a road has a width, a corner a radius', async () => {
    const width = operation(book.layoutScope, 'layout', book.layout, { roadWidth: [11, -2] })
    expect(await problemsOf(width)).toEqual([{ field: 'roadWidth', code: 'out-of-range' }])
    const radius = operation(book.layoutScope, 'corner', book.corners[0]!.id, { leastRadius: [42, 0] })
    expect(await problemsOf(radius)).toEqual([{ field: 'leastRadius', code: 'out-of-range' }])
  })

  test('a change is made at a time that a clock may show', async () => {
    const sent = { ...addsMark(book, newMark()), madeAt: '0000-01-01T00:00:00Z' }
    expect(await problemsOf(sent)).toEqual([{ field: 'madeAt', code: 'out-of-range' }])
  })
})

describe('conditions', () => {
  test('one with marks stays, and dry always', async () => {
    expectKind(await apply(addsMark(book, newMark(), { conditionId: book.wet })), 'applied')
    for (const id of [book.wet, book.dry]) {
      const dropped = operation(book.scope, 'condition', id, { state: ['live', 'dropped'] })
      expect(await problemsOf(dropped)).toEqual([{ field: 'state', code: 'in-use' }])
    }
  })

  test('there is one dry', async () => {
    const second = operation(book.scope, 'condition', newId(), {
      state: [null, 'live'],
      kind: [null, 'dry'],
      name: [null, 'Drier'],
      rank: [null, 'b'],
    })
    expect(await problemsOf(second)).toEqual([{ field: 'kind', code: 'taken' }])
  })

  test('an unused one goes and comes back', async () => {
    const drop = operation(elsewhere.scope, 'condition', elsewhere.wet, { state: ['live', 'dropped'] })
    const { undo } = expectKind(await apply(drop), 'applied')
    expect((await bookOf(elsewhere.team, elsewhere.slug)).conditions.map(({ kind }) => kind)).toEqual(['dry'])
    expectKind(await applyOperation(db, book.team.coach, undo), 'applied')
    const { conditions } = await bookOf(elsewhere.team, elsewhere.slug)
    expect(conditions.map(({ kind }) => kind)).toEqual(['dry', 'wet'])
  })
})

import { beforeAll, describe, expect, test } from 'vitest'
import { applyOperation } from '~/db/apply.server'
import { addFindings } from '~/db/journal.server'
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
} from './support'

let book: Book
let other: Book
beforeAll(async () => {
  book = await makeTeamBook(await makeTeam())
  other = await makeTeamBook(await makeTeam())
})

async function addMark(of: Book = book) {
  const id = newMark()
  expectKind(await applyOperation(db, of.team.coach, addsMark(of, id)), 'applied')
  return id
}

const finding = (mark: string, more = {}) => ({
  id: newId(),
  mark,
  ground: 'real',
  person: book.team.driver.person,
  condition: book.dry,
  verdict: 'kept',
  proof: 'seen',
  method: 'eye',
  accuracy: null,
  along: 120,
  across: 3.2,
  foundAt: '2026-10-09T16:15:00.000Z',
  note: 'left of the drain',
  ...more,
})

const proofOf = async (mark: string) => (await markOf(book, mark))?.real?.proof.map(({ proof, by }) => [proof, by])

describe('a finding', () => {
  test('proves a place for one person in one condition, and moves no mark', async () => {
    const mark = await addMark()
    const further = finding(mark, { along: 120.6, verdict: 'moved' })
    expect(await addFindings(db, book.team.coach, [further])).toEqual({ kind: 'added', added: 1 })
    expect(await proofOf(mark)).toEqual([['seen', book.team.coach.person]])
    expect((await markOf(book, mark))?.real?.stored.along).toBe(120)
  })

  test.each([
    ['driven', 'kept'],
    ['seen', 'moved'],
    ['told', 'gone'],
  ])(
    'of another, %s and %s, is the desk’s to add; from a driver nothing that came with it is kept',
    async (proof, verdict) => {
      const mark = await addMark()
      const own = finding(mark, { person: book.team.second.person, proof: 'driven' })
      const others = finding(mark, { proof, verdict })
      expect(await addFindings(db, book.team.second, [own, others])).toEqual({ kind: 'refused', reason: 'role' })
      expect(await proofOf(mark)).toEqual([])
      expect(await addFindings(db, book.team.second, [own])).toEqual({ kind: 'added', added: 1 })
      expect(await addFindings(db, book.team.manager, [others])).toEqual({ kind: 'added', added: 1 })
    },
  )

  test('that one driver tells another is told', async () => {
    const mark = await addMark()
    expect(await addFindings(db, book.team.second, [finding(mark, { proof: 'told' })])).toEqual({
      kind: 'added',
      added: 1,
    })
    expect(await proofOf(mark)).toEqual([['told', book.team.second.person]])
  })

  test('sent twice is kept once, also at the same moment', async () => {
    const mark = await addMark()
    const sent = [finding(mark), finding(mark, { proof: 'driven', foundAt: '2026-10-10T10:01:00+02:00' })]
    const outcomes = await Promise.all([1, 2, 3].map(() => addFindings(db, book.team.driver, sent)))
    expect(outcomes.map((outcome) => (outcome.kind === 'added' ? outcome.added : -1)).sort()).toEqual([0, 0, 2])
    expect(await proofOf(mark)).toEqual([['driven', book.team.driver.person]])
  })

  test('with an id that is in use for another is refused, and nothing that came with it is kept', async () => {
    const mark = await addMark()
    const first = finding(mark)
    await addFindings(db, book.team.driver, [first])
    const sent = [finding(mark, { proof: 'driven' }), { ...first, proof: 'driven' }]
    expect(await addFindings(db, book.team.driver, sent)).toEqual({ kind: 'refused', reason: 'id-in-use' })
    expect(await proofOf(mark)).toEqual([['seen', book.team.driver.person]])
  })

  test('of another team’s mark is not found', async () => {
    const theirs = await addMark(other)
    expect(await addFindings(db, book.team.driver, [finding(theirs)])).toEqual({ kind: 'not-found' })
    expect(await addFindings(db, book.team.driver, [finding(newId())])).toEqual({ kind: 'not-found' })
  })

  test('names people of the team and conditions of the book', async () => {
    const mark = await addMark()
    const sent = [finding(mark, { person: other.team.driver.person }), finding(mark, { condition: other.dry })]
    expect(await addFindings(db, book.team.coach, sent)).toEqual({
      kind: 'invalid',
      problems: [
        { field: '0.person', code: 'not-found' },
        { field: '1.condition', code: 'not-found' },
      ],
    })
  })

  test('in the future, without a place or with a word of its own is invalid', async () => {
    const mark = await addMark()
    for (const more of [{ foundAt: '2999-01-01T00:00:00Z' }, { along: null }, { proof: 'certain' }])
      expect((await addFindings(db, book.team.driver, [finding(mark, more)])).kind).toBe('invalid')
    expect(await proofOf(mark)).toEqual([])
  })

  test('is not taken for an archived book, nor from somebody outside the team', async () => {
    const team = await makeTeam()
    const own = await makeTeamBook(team)
    const mark = await addMark(own)
    const found = finding(mark, { person: team.driver.person, condition: own.dry })
    const outside = { ...other.team.driver, team: team.id }
    expect(await addFindings(db, outside, [found])).toEqual({ kind: 'refused', reason: 'not-a-member' })
    const archived = operation(own.scope, 'book', own.id, { state: ['live', 'archived'] })
    expectKind(await applyOperation(db, team.manager, archived), 'applied')
    expect(await addFindings(db, team.driver, [found])).toEqual({ kind: 'refused', reason: 'read-only' })
  })
})

import { beforeAll, describe, expect, test } from 'vitest'
import { applyBatch, applyOperation } from '~/db/apply.server'
import { undoBatch, undoOperation } from '~/db/undo.server'
import { addsMark, type Book, bookOf, db, expectKind, makeTeam, makeTeamBook, newMark, operation } from './support'

let book: Book
beforeAll(async () => {
  book = await makeTeamBook(await makeTeam())
})

async function addMark() {
  const id = newMark()
  expectKind(await applyOperation(db, book.team.coach, addsMark(book, id)), 'applied')
  return id
}

describe('a mark moved to another card', () => {
  const moves = (id: string, [from, to]: readonly [string, string]) =>
    operation(book.scope, 'mark', id, { cardId: [from, to] })
  const cardOf = async (id: string) => {
    const view = await bookOf(book.team, book.slug)
    return view.corners.find(({ marks }) => marks.some((mark) => mark.id === id))?.card.id
  }

  test('is read there, and back where it was once undone', async () => {
    const id = await addMark()
    const sent = moves(id, book.cards)
    expectKind(await applyOperation(db, book.team.coach, sent), 'applied')
    expect(await cardOf(id)).toBe(book.cards[1])
    expectKind(await undoOperation(db, book.team.coach, book.scope, sent.id), 'applied')
    expect(await cardOf(id)).toBe(book.cards[0])
  })

  test('must find a card of its own book', async () => {
    const other = await makeTeamBook(book.team)
    const id = await addMark()
    for (const card of [other.cards[0], newMark()])
      expect(await applyOperation(db, book.team.coach, moves(id, [book.cards[0], card]))).toEqual({
        kind: 'invalid',
        problems: [{ field: 'cardId', code: 'not-found' }],
      })
    expect(await cardOf(id)).toBe(book.cards[0])
  })

  test('by a driver who did not make it is a proposal', async () => {
    const id = await addMark()
    expect((await applyOperation(db, book.team.driver, moves(id, book.cards))).kind).toBe('proposed')
  })

  test('lets its corner be merged into the other, in one batch that is undone in one', async () => {
    const team = await makeTeam()
    const own = await makeTeamBook(team)
    const id = newMark()
    expectKind(await applyOperation(db, team.driver, addsMark(own, id, { gear: 3 })), 'applied')
    const [gone, kept] = own.corners
    const merge = operation(own.layoutScope, 'corner', gone!.id, {
      state: ['live', 'merged'],
      mergedInto: [null, kept!.id],
    })
    const move = operation(own.scope, 'mark', id, { cardId: [own.cards[0], own.cards[1]] })
    expect(await applyBatch(db, team.coach, [merge, move])).toMatchObject({
      kind: 'stopped',
      outcome: { kind: 'invalid', problems: [{ field: 'state', code: 'in-use' }] },
    })

    const merged = await applyBatch(db, team.coach, [move, merge])
    if (merged.kind !== 'applied') throw new Error(JSON.stringify(merged))
    const read = async () => {
      const { corners } = await bookOf(team, own.slug)
      return corners.map(({ number, marks }) => [number, marks.map((mark) => mark.id)])
    }
    expect(await read()).toEqual([['2', [id]]])
    expect(await undoBatch(db, team.coach, merged.batch)).toMatchObject({ kind: 'applied' })
    expect(await read()).toEqual([
      ['1', [id]],
      ['2', []],
    ])
  })
})

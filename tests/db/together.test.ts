import { sql } from 'drizzle-orm'
import { beforeAll, describe, expect, test } from 'vitest'
import { applyBatch, applyOperation } from '~/db/apply.server'
import { readChanges } from '~/db/read-changes.server'
import { undoBatch, undoOperation } from '~/db/undo.server'
import {
  addsLandmark,
  addsMark,
  type Book,
  bookOf,
  db,
  expectKind,
  inLine,
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
beforeAll(async () => {
  book = await makeTeamBook(await makeTeam())
})

async function addMark(more = {}) {
  const id = newMark()
  expectKind(await applyOperation(db, book.team.coach, addsMark(book, id, more)), 'applied')
  return id
}
const gear = (id: string, from: number | null, to: number) => operation(book.scope, 'mark', id, { gear: [from, to] })

describe('a batch', () => {
  test('is applied whole', async () => {
    const [first, second] = [newMark(), newMark()]
    const outcome = await applyBatch(db, book.team.coach, [
      addsMark(book, first, { gear: 3 }),
      addsMark(book, second, { gear: 4 }),
      gear(first, 3, 2),
    ])
    expect(outcome.kind).toBe('applied')
    expect([(await markOf(book, first))?.gear, (await markOf(book, second))?.gear]).toEqual([2, 4])
  })

  test('stops at the first that cannot be, and writes none: no revision, no line in the log', async () => {
    const theirs = await addMark({ gear: 5 })
    const before = await bookOf(book.team, book.slug)
    const id = newMark()
    const outcome = await applyBatch(db, book.team.coach, [addsMark(book, id), gear(theirs, 4, 3), gear(theirs, 5, 6)])
    expect(outcome).toMatchObject({ kind: 'stopped', at: 1, outcome: { kind: 'conflict', theirs: { gear: 5 } } })
    const after = await bookOf(book.team, book.slug)
    expect(after).toEqual(before)
    expect(await readChanges(db, book.team.coach, { book: before.book.id, limit: 1 })).toMatchObject([
      { rev: before.book.rev },
    ])
  })

  test('sent again is done once', async () => {
    const id = newMark()
    const batch = [addsMark(book, id, { gear: 3 }), gear(id, 3, 4)]
    expect((await applyBatch(db, book.team.coach, batch)).kind).toBe('applied')
    expectKind(await applyOperation(db, book.team.coach, gear(id, 4, 5)), 'applied')
    const again = await applyBatch(db, book.team.coach, batch)
    expect(again).toMatchObject({ outcomes: [{ kind: 'already-applied' }, { kind: 'already-applied' }] })
    expect((await markOf(book, id))?.gear).toBe(5)
  })

  test('is undone together, by itself or by one of its operations', async () => {
    const ids = [await addMark({ gear: 3 }), await addMark({ gear: 4 })] as const
    const raise = () => [gear(ids[0], 3, 5), gear(ids[1], 4, 6)]
    const gears = async () => [(await markOf(book, ids[0]))?.gear, (await markOf(book, ids[1]))?.gear]

    const first = await applyBatch(db, book.team.coach, raise())
    if (first.kind !== 'applied') throw new Error(first.kind)
    expect(await gears()).toEqual([5, 6])
    expect((await undoBatch(db, book.team.coach, first.batch)).kind).toBe('applied')
    expect(await gears()).toEqual([3, 4])

    const second = raise()
    await applyBatch(db, book.team.coach, second)
    expectKind(await undoOperation(db, book.team.coach, book.scope, second[1]!.id), 'applied')
    expect(await gears()).toEqual([3, 4])
  })

  test('is undone without what another sent under its name or under the name of one of its operations', async () => {
    const [mine, others] = [await addMark({ gear: 3 }), newMark()]
    const batch = newId<string>()
    const change = { ...gear(mine, 3, 4), batch }
    expectKind(await applyOperation(db, book.team.coach, change), 'applied')
    const adds = addsMark(book, others, { gear: 2 })
    expectKind(await applyOperation(db, book.team.driver, { ...adds, batch }), 'applied')
    const named = { ...operation(book.scope, 'mark', others, { manner: [null, 'trail'] }), batch: change.id as string }
    expectKind(await applyOperation(db, book.team.driver, named), 'applied')

    expectKind(await undoOperation(db, book.team.manager, book.scope, change.id), 'applied')
    expect((await markOf(book, mine))?.gear).toBe(3)
    expect(await markOf(book, others)).toMatchObject({ gear: 2, manner: 'trail' })
    expect((await undoBatch(db, book.team.driver, batch)).kind).toBe('applied')
    expect(await markOf(book, others)).toBeUndefined()
    expect(await undoBatch(db, book.team.manager, batch)).toMatchObject({ outcome: { kind: 'not-found' } })
  })

  test('over a layout and its book takes both locks and both revisions', async () => {
    const landmark = newLandmark()
    const id = newMark()
    const before = await bookOf(book.team, book.slug)
    const outcome = await applyBatch(db, book.team.coach, [
      addsLandmark(book, landmark, 300),
      addsMark(book, id, { real: place(303.5, 2.8, tieTo(landmark, 3.5)) }),
    ])
    expect(outcome.kind).toBe('applied')
    const after = await bookOf(book.team, book.slug)
    expect([after.book.rev - before.book.rev, after.layout.rev - before.layout.rev]).toEqual([1, 1])
  })
})

describe('undo', () => {
  test('writes the value from before and a line that says what it takes back', async () => {
    const id = await addMark({ gear: 3 })
    const change = gear(id, 3, 4)
    await applyOperation(db, book.team.coach, change)
    expectKind(await undoOperation(db, book.team.coach, book.scope, change.id), 'applied')
    expect((await markOf(book, id))?.gear).toBe(3)
    const [line] = await readChanges(db, book.team.coach, { book: book.view.book.id, limit: 1 })
    expect(line).toMatchObject({ undoes: change.id, set: { gear: { from: 4, to: 3 } } })
  })

  test('of something that was changed since is a conflict and writes nothing', async () => {
    const id = await addMark({ gear: 3 })
    const change = gear(id, 3, 4)
    await applyOperation(db, book.team.coach, change)
    await applyOperation(db, book.team.coach, gear(id, 4, 6))
    expect(await undoOperation(db, book.team.coach, book.scope, change.id)).toMatchObject({
      kind: 'conflict',
      theirs: { gear: 6 },
    })
  })

  test('takes back only what was really written', async () => {
    const id = await addMark({ gear: 3, manner: 'full' })
    const change = operation(book.scope, 'mark', id, { gear: [3, 4], manner: ['trail', 'full'] })
    expectKind(await applyOperation(db, book.team.coach, change), 'applied')
    expectKind(await undoOperation(db, book.team.coach, book.scope, change.id), 'applied')
    expect(await markOf(book, id)).toMatchObject({ gear: 3, manner: 'full' })
  })

  test('of another team’s operation, of another scope’s or of none is not found', async () => {
    const id = await addMark({ gear: 3 })
    const change = gear(id, 3, 4)
    await applyOperation(db, book.team.coach, change)
    const stranger = await makeTeam()
    expect(await undoOperation(db, stranger.manager, book.scope, change.id)).toEqual({ kind: 'not-found' })
    expect(await undoOperation(db, book.team.coach, book.layoutScope, change.id)).toEqual({ kind: 'not-found' })
    expect(await undoOperation(db, book.team.coach, book.scope, newMark() as never)).toEqual({ kind: 'not-found' })
  })

  test('asks for the same right as the change: a driver cannot take back a coach’s', async () => {
    const id = await addMark({ gear: 3 })
    const change = gear(id, 3, 4)
    await applyOperation(db, book.team.coach, change)
    expect((await undoOperation(db, book.team.driver, book.scope, change.id)).kind).toBe('proposed')
    expect((await markOf(book, id))?.gear).toBe(4)
  })
})

describe('a landmark', () => {
  const stored = (along: number) => ({
    along,
    until: null,
    across: 7.4,
    acrossTo: null,
    edgeLength: null,
    blockLength: null,
    width: null,
    words: null,
  })

  /** A post with a mark tied to it on both grounds. */
  async function tiedMark(at: number) {
    const landmark = newLandmark()
    const added = await applyOperation(db, book.team.coach, addsLandmark(book, landmark, at))
    expectKind(added, 'applied')
    const real = place(at + 5, 3, tieTo(landmark, 5))
    const id = await addMark({ real, sim: place(at + 9, 2.9, tieTo(landmark, 9)) })
    return { landmark, id, real }
  }

  test('that moves takes what is tied to it along, on its own ground', async () => {
    const { landmark, id } = await tiedMark(200)
    const moved = operation(book.layoutScope, 'landmark', landmark, { real: [stored(200), stored(206)] })
    expectKind(await applyOperation(db, book.team.coach, moved), 'applied')
    const mark = await markOf(book, id)
    expect([mark?.real?.station, mark?.sim?.station]).toEqual([211, 209])
  })

  test('that is dropped frees its ties where they stood, with their words; undone, all hangs again', async () => {
    const { landmark, id, real } = await tiedMark(400)
    const moved = operation(book.layoutScope, 'landmark', landmark, { real: [stored(400), stored(393)] })
    await applyOperation(db, book.team.coach, moved)
    const drop = operation(book.layoutScope, 'landmark', landmark, { state: ['live', 'dropped'] })
    const before = await bookOf(book.team, book.slug)
    expectKind(await applyOperation(db, book.team.coach, drop), 'applied')

    const freed = await markOf(book, id)
    expect([freed?.real?.station, freed?.sim?.station]).toEqual([398, 409])
    expect(freed?.real?.stored).toEqual(
      place(398, 3, { ...(real.tie as object), landmarkId: null, along: null } as never),
    )
    const after = await bookOf(book.team, book.slug)
    expect(after.landmarks.map((found) => found.id)).not.toContain(landmark)
    expect([after.layout.rev - before.layout.rev, after.book.rev - before.book.rev]).toEqual([1, 2])

    expectKind(await undoOperation(db, book.team.coach, book.layoutScope, drop.id), 'applied')
    const again = await markOf(book, id)
    expect(again?.real?.stored).toEqual(real)
    expect([again?.real?.station, again?.sim?.station]).toEqual([398, 409])
  })

  const bookRow = () => sql`select from books where id = ${book.id} for update`

  test('that is dropped cannot be tied to', async () => {
    const { landmark } = await tiedMark(500)
    const drop = operation(book.layoutScope, 'landmark', landmark, { state: ['live', 'dropped'] })
    const ties = addsMark(book, newMark(), { real: place(501, 3, tieTo(landmark, 1)) })
    const [dropped, tied] = await inLine(bookRow(), [
      () => applyOperation(db, book.team.coach, drop),
      () => applyOperation(db, book.team.driver, ties),
    ])
    expectKind(dropped!, 'applied')
    expect(tied).toEqual({ kind: 'invalid', problems: [{ field: 'real', code: 'not-found' }] })
  })

  test('that is dropped right after something was tied to it frees that too', async () => {
    const { landmark } = await tiedMark(600)
    const drop = operation(book.layoutScope, 'landmark', landmark, { state: ['live', 'dropped'] })
    const id = newMark()
    const outcomes = await inLine(bookRow(), [
      () => applyOperation(db, book.team.driver, addsMark(book, id, { real: place(601, 3, tieTo(landmark, 1)) })),
      () => applyOperation(db, book.team.coach, drop),
    ])
    expect(outcomes.map(({ kind }) => kind)).toEqual(['applied', 'applied'])
    expect((await markOf(book, id))?.real?.stored).toMatchObject({ along: 601, tie: { landmarkId: null } })
  })

  test('of one’s own that moves while another ties a mark to it waits, and is a proposal then', async () => {
    const landmark = newLandmark()
    expectKind(await applyOperation(db, book.team.driver, addsLandmark(book, landmark, 800)), 'applied')
    const moved = operation(book.layoutScope, 'landmark', landmark, { real: [stored(800), stored(790)] })
    const ties = addsMark(book, newMark(), { real: place(803, 3, tieTo(landmark, 3)) })
    const outcomes = await inLine(bookRow(), [
      () => applyOperation(db, book.team.second, ties),
      () => applyOperation(db, book.team.driver, moved),
    ])
    expect(outcomes.map(({ kind }) => kind)).toEqual(['applied', 'proposed'])
  })
})

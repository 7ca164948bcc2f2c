import { eq, sql } from 'drizzle-orm'
import { beforeAll, describe, expect, test } from 'vitest'
import type { Actor } from '~/book/actions'
import type { CardId, OperationId } from '~/book/ids'
import type { Operation } from '~/book/operation'
import { applyBatch, applyOperation } from '~/db/apply.server'
import { decideProposal, listProposals } from '~/db/proposals.server'
import { readChanges } from '~/db/read-changes.server'
import { memberships } from '~/db/schema'
import {
  addsLandmark,
  addsMark,
  type Book,
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
let other: Book
beforeAll(async () => {
  book = await makeTeamBook(await makeTeam())
  other = await makeTeamBook(await makeTeam())
})

/** A mark that the first driver made. */
async function driversMark(more = {}) {
  const id = newMark()
  expectKind(await applyOperation(db, book.team.driver, addsMark(book, id, more)), 'applied')
  return id
}
const gearChange = (id: string, from: number | null, to: number): Operation =>
  operation(book.scope, 'mark', id, { gear: [from, to] })

describe('who may', () => {
  test('a driver changes neither circuit nor conditions nor the book', async () => {
    const corner = operation(book.layoutScope, 'corner', book.corners[0]!.id, { name: ['Corner 1', 'Mine'] })
    const condition = operation(book.scope, 'condition', book.wet, { name: ['Wet', 'Soaked'] })
    const renamed = operation(book.scope, 'book', book.id, { name: ['Sandbar', 'Mine'] })
    const archived = operation(book.scope, 'book', book.id, { state: ['live', 'archived'] })
    for (const sent of [corner, condition, renamed, archived])
      expect(await applyOperation(db, book.team.driver, sent)).toEqual({ kind: 'refused', reason: 'role' })
  })

  test('a coach renames a book but does not archive it; a manager does, and then it is read only', async () => {
    const team = await makeTeam()
    const own = await makeTeamBook(team)
    const renamed = operation(own.scope, 'book', own.id, { name: ['Sandbar', 'Sandbar in spring'] })
    const archived = operation(own.scope, 'book', own.id, { state: ['live', 'archived'] })
    expectKind(await applyOperation(db, team.coach, renamed), 'applied')
    expect(await applyOperation(db, team.coach, archived)).toEqual({ kind: 'refused', reason: 'role' })
    const { undo } = expectKind(await applyOperation(db, team.manager, archived), 'applied')
    expect(await applyOperation(db, team.coach, addsMark(own, newMark()))).toEqual({
      kind: 'refused',
      reason: 'read-only',
    })
    expectKind(await applyOperation(db, team.manager, undo), 'applied')
    expectKind(await applyOperation(db, team.coach, addsMark(own, newMark())), 'applied')
  })

  test('a stranger is refused and another team finds nothing', async () => {
    const id = await driversMark()
    const stranger: Actor = { kind: 'stranger' }
    expect(await applyOperation(db, stranger, gearChange(id, null, 3))).toEqual({
      kind: 'refused',
      reason: 'not-a-member',
    })
    expect(await applyOperation(db, other.team.manager, gearChange(id, null, 3))).toEqual({ kind: 'not-found' })
  })

  test('somebody who left the team finds nothing, whatever his request still says', async () => {
    const team = await makeTeam()
    const own = await makeTeamBook(team)
    await db.update(memberships).set({ endedAt: new Date() }).where(eq(memberships.personId, team.driver.person))
    expect(await applyOperation(db, team.driver, addsMark(own, newMark()))).toEqual({ kind: 'not-found' })
  })
})

describe('what another made', () => {
  test('a driver changes his own mark at once, another’s becomes a proposal', async () => {
    const id = await driversMark({ gear: 3 })
    const proposal = gearChange(id, 3, 4)
    expect((await applyOperation(db, book.team.second, proposal)).kind).toBe('proposed')
    expect((await markOf(book, id))?.gear).toBe(3)
    expect((await applyOperation(db, book.team.second, proposal)).kind).toBe('proposed')
    const waiting = await listProposals(db, book.team.coach, book.scope)
    expect(waiting.filter((entry) => entry.id === proposal.id)).toMatchObject([
      { by: book.team.second.person, operation: { target: { id } } },
    ])
  })

  test('an accepted proposal stands under its maker’s name with the coach’s beside it', async () => {
    const id = await driversMark({ gear: 3 })
    const proposal = gearChange(id, 3, 5)
    await applyOperation(db, book.team.second, proposal)
    expectKind(await decideProposal(db, book.team.coach, proposal.id, 'accept'), 'applied')
    expect((await markOf(book, id))?.gear).toBe(5)
    const [line] = await readChanges(db, book.team.driver, { book: book.view.book.id, limit: 1 })
    expect(line).toMatchObject({
      operation: proposal.id,
      by: book.team.second.person,
      acceptedBy: book.team.coach.person,
      set: { gear: { from: 3, to: 5 } },
    })
    expect((await applyOperation(db, book.team.second, proposal)).kind).toBe('already-applied')
    expect(await decideProposal(db, book.team.coach, proposal.id, 'accept')).toEqual({ kind: 'not-found' })
  })

  test('a declined proposal changes nothing and is no longer listed', async () => {
    const id = await driversMark({ gear: 3 })
    const proposal = gearChange(id, 3, 6)
    await applyOperation(db, book.team.second, proposal)
    expectKind(await decideProposal(db, book.team.coach, proposal.id, 'decline'), 'nothing')
    expect((await markOf(book, id))?.gear).toBe(3)
    const waiting = await listProposals(db, book.team.coach, null)
    expect(waiting.map((entry) => entry.id)).not.toContain(proposal.id)
    expect(await applyOperation(db, book.team.second, proposal)).toEqual({ kind: 'refused', reason: 'another-persons' })
  })

  test('a proposal that no longer fits is a conflict and waits on', async () => {
    const id = await driversMark({ gear: 3 })
    const proposal = gearChange(id, 3, 4)
    await applyOperation(db, book.team.second, proposal)
    expectKind(await applyOperation(db, book.team.driver, gearChange(id, 3, 2)), 'applied')
    const outcome = await decideProposal(db, book.team.coach, proposal.id, 'accept')
    expect(outcome).toMatchObject({ kind: 'conflict', theirs: { gear: 2 } })
    const waiting = await listProposals(db, book.team.coach, null)
    expect(waiting.map((entry) => entry.id)).toContain(proposal.id)
  })

  test('two coaches deciding at once decide once', async () => {
    const id = await driversMark({ gear: 3 })
    const proposal = gearChange(id, 3, 4)
    await applyOperation(db, book.team.second, proposal)
    const outcomes = await Promise.all([
      decideProposal(db, book.team.coach, proposal.id, 'accept'),
      decideProposal(db, book.team.manager, proposal.id, 'accept'),
    ])
    expect(outcomes.map(({ kind }) => kind).sort()).toEqual(['applied', 'not-found'])
  })

  test('two coaches deciding on two proposals of one batch at once decide once', async () => {
    const theirs = await driversMark({ gear: 3, downshifts: 2 })
    const batch = [gearChange(theirs, 3, 4), operation(book.scope, 'mark', theirs, { downshifts: [2, 1] })]
    await applyBatch(db, book.team.second, batch)
    const [first, second] = batch.map(({ id }) => id)
    const held = sql`select from operations where id in (${first}, ${second}) for update`
    const outcomes = await inLine(held, [
      () => decideProposal(db, book.team.coach, second!, 'accept'),
      () => decideProposal(db, book.team.manager, first!, 'decline'),
    ])
    expect(outcomes.map(({ kind }) => kind)).toEqual(['applied', 'not-found'])
    expect(await markOf(book, theirs)).toMatchObject({ gear: 4, downshifts: 1 })
  })

  test('a driver decides no proposal, another team sees none', async () => {
    const id = await driversMark({ gear: 3 })
    const proposal = gearChange(id, 3, 4)
    await applyOperation(db, book.team.second, proposal)
    expect(await decideProposal(db, book.team.driver, proposal.id, 'accept')).toEqual({
      kind: 'refused',
      reason: 'role',
    })
    expect(await decideProposal(db, other.team.coach, proposal.id, 'accept')).toEqual({ kind: 'not-found' })
    expect(await listProposals(db, other.team.coach, null)).toEqual([])
    expect(await listProposals(db, other.team.coach, book.scope)).toEqual([])
  })

  test('a batch that touches another’s mark is proposed whole, and accepted whole', async () => {
    const theirs = await driversMark({ gear: 3 })
    const mine = newMark()
    const batch = [addsMark(book, mine, { gear: 2 }), gearChange(theirs, 3, 4)]
    const outcome = await applyBatch(db, book.team.second, batch)
    expect(outcome.kind).toBe('proposed')
    expect(await markOf(book, mine)).toBeUndefined()
    expectKind(await decideProposal(db, book.team.coach, batch[1]!.id, 'accept'), 'applied')
    expect((await markOf(book, mine))?.madeBy).toBe(book.team.second.person)
    expect((await markOf(book, theirs))?.gear).toBe(4)
  })

  test('a proposed batch is accepted in the order in which it was sent, whatever its ids', async () => {
    const theirs = await driversMark({ gear: 3 })
    const [low, high] = [newId<OperationId>(), newId<OperationId>()]
    const batch = [
      { ...gearChange(theirs, 3, 4), id: high },
      { ...gearChange(theirs, 4, 5), id: low },
    ]
    expect((await applyBatch(db, book.team.second, batch)).kind).toBe('proposed')
    const waiting = await listProposals(db, book.team.coach, book.scope)
    expect(waiting.map(({ id }) => id).filter((id) => id === low || id === high)).toEqual([high, low])
    expectKind(await decideProposal(db, book.team.coach, low, 'accept'), 'applied')
    expect((await markOf(book, theirs))?.gear).toBe(5)
  })

  test.each(['accept', 'decline'] as const)(
    'to %s a batch leaves alone what another proposed under its name',
    async (decision) => {
      const theirs = await driversMark({ gear: 3, manner: 'full' })
      const coachs = newMark()
      expectKind(await applyOperation(db, book.team.coach, addsMark(book, coachs, { gear: 2 })), 'applied')
      const batch = newId<string>()
      const asked = { ...gearChange(theirs, 3, 4), batch }
      const smuggled = { ...gearChange(coachs, 2, 6), batch }
      const named = { ...operation(book.scope, 'mark', coachs, { downshifts: [null, 3] }), batch: asked.id as string }
      expect((await applyOperation(db, book.team.second, asked)).kind).toBe('proposed')
      for (const sent of [smuggled, named])
        expect((await applyOperation(db, book.team.driver, sent)).kind).toBe('proposed')
      await decideProposal(db, book.team.coach, asked.id, decision)
      expect((await markOf(book, theirs))?.gear).toBe(decision === 'accept' ? 4 : 3)
      expect(await markOf(book, coachs)).toMatchObject({ gear: 2, downshifts: null })
      const waiting = (await listProposals(db, book.team.coach, book.scope)).map(({ id }) => id)
      expect(waiting).toEqual(expect.arrayContaining([smuggled.id, named.id]))
      expect(waiting).not.toContain(asked.id)
    },
  )

  test('what waits for one card is told: of its marks, dropped ones, new ones, and those moved to it', async () => {
    const own = await makeTeamBook(await makeTeam())
    const { coach, driver } = own.team
    const [live, dropped, elsewhere] = [newMark(), newMark(), newMark()]
    for (const [id, card] of [
      [live, own.cards[0]],
      [dropped, own.cards[0]],
      [elsewhere, own.cards[1]],
    ] as const)
      expectKind(await applyOperation(db, coach, addsMark(own, id, { cardId: card, gear: 3 })), 'applied')
    const drop = operation(own.scope, 'mark', dropped, { state: ['live', 'dropped'] })
    expectKind(await applyOperation(db, coach, drop), 'applied')
    const sent = [
      operation(own.scope, 'mark', live, { gear: [3, 4] }),
      operation(own.scope, 'mark', dropped, { state: ['dropped', 'live'] }),
      addsMark(own, newMark(), { gear: 5 }),
      operation(own.scope, 'mark', elsewhere, { gear: [3, 2] }),
      operation(own.scope, 'mark', elsewhere, { cardId: [own.cards[1], own.cards[0]] }),
      addsMark(own, newMark(), { cardId: own.cards[1], gear: 6 }),
    ]
    expect((await applyBatch(db, driver, sent)).kind).toBe('proposed')
    const about = async (card: string) => {
      const waiting = await listProposals(db, coach, own.scope, card as CardId)
      return waiting.map(({ id }) => sent.findIndex((one) => one.id === id))
    }
    expect(await about(own.cards[0])).toEqual([0, 1, 2, 4])
    expect(await about(own.cards[1])).toEqual([3, 4, 5])
    expect(await listProposals(db, other.team.coach, null, own.cards[0] as CardId)).toEqual([])
  })

  test('moving one’s own landmark to which another’s mark is tied is a proposal; renaming it is not', async () => {
    const landmark = newLandmark()
    const { driver, second } = book.team
    expectKind(await applyOperation(db, second, addsLandmark(book, landmark, 100)), 'applied')
    await driversMark({ real: place(104, 3, tieTo(landmark, 4)) })
    const stored = { along: 100, until: null, across: 7.4, acrossTo: null }
    const placement = { ...stored, edgeLength: null, blockLength: null, width: null, words: null }
    const moved = operation(book.layoutScope, 'landmark', landmark, { real: [placement, { ...placement, along: 103 }] })
    expect((await applyOperation(db, second, moved)).kind).toBe('proposed')
    const named = operation(book.layoutScope, 'landmark', landmark, { name: ['White post', 'Old post'] })
    expectKind(await applyOperation(db, second, named), 'applied')
    expect((await applyOperation(db, driver, { ...named, id: newMark() as never })).kind).toBe('proposed')
  })
})

import type { CornerCut } from '~/book/cuts'
import type { GivenPlace } from '~/book/edits'
import type { OperationId } from '~/book/ids'
import type { Ground } from '~/book/kinds'
import type { Operation } from '~/book/operation'
import type { MarkView } from '~/book/view'

/**
 * Moves of marks on the map, in order, until the server has answered each. A move that is still in the hand (`held`) is
 * replaced by the next of the same place; one that is being sent is not, the next waits behind it. Nothing is dropped but by
 * an answer.
 */
export interface PlaceMove {
  /** Also the operation's: what is sent again is done once. */
  id: OperationId
  mark: MarkView
  ground: Ground
  at: GivenPlace
  /** The corner it was moved in, which may not be the one that is open when it is sent. */
  cut: CornerCut
  /** `settled`: answered, and shown here until the page has read it. */
  state: 'held' | 'waiting' | 'sending' | 'unsent' | 'settled'
  /** Made when it is first sent, and sent again as it was. */
  operation: Operation | null
}

export type PlaceQueue = readonly PlaceMove[]

/** Names one place of one mark. */
export const placeKey = (move: { mark: { id: string }; ground: Ground }) => `${move.mark.id} ${move.ground}`

export function putMove(queue: PlaceQueue, move: PlaceMove): PlaceQueue {
  const key = placeKey(move)
  const replaced = (one: PlaceMove) => placeKey(one) === key && (one.state === 'held' || one.state === 'waiting')
  return [...queue.filter((one) => !replaced(one)), move]
}

/** The hand has let go: everything held waits to be sent. */
export const letGo = (queue: PlaceQueue): PlaceQueue =>
  queue.some((one) => one.state === 'held')
    ? queue.map((one) => (one.state === 'held' ? { ...one, state: 'waiting' } : one))
    : queue

/** The next to send: one at a time, and none past a move that could not be sent. */
export function nextMove(queue: PlaceQueue): PlaceMove | null {
  if (queue.some(({ state }) => state === 'sending' || state === 'unsent' || state === 'settled')) return null
  return queue.find((one) => one.state === 'waiting') ?? null
}

export const withState = (
  queue: PlaceQueue,
  id: OperationId,
  state: PlaceMove['state'],
  operation: Operation | null,
): PlaceQueue => queue.map((one) => (one.id === id ? { ...one, state, operation } : one))

export const answered = (queue: PlaceQueue, id: OperationId): PlaceQueue => queue.filter((one) => one.id !== id)

/** Whether something is in the hand or on its way, so that the page must not be left. */
export const isUnderWay = (queue: PlaceQueue) =>
  queue.some(({ state }) => state === 'held' || state === 'waiting' || state === 'sending')

/** What could not be sent waits again. */
export const sendAgain = (queue: PlaceQueue): PlaceQueue =>
  queue.map((one) => (one.state === 'unsent' ? { ...one, state: 'waiting' } : one))

import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { OperationId } from '~/book/ids'
import { offset, station } from '~/track/units'
import {
  answered,
  isUnderWay,
  letGo,
  nextMove,
  type PlaceMove,
  type PlaceQueue,
  putMove,
  sendAgain,
  withState,
} from './place-queue'

const move = (id: string, mark: string, at: number, state: PlaceMove['state'] = 'waiting') =>
  ({
    id: id as OperationId,
    mark: { id: mark },
    ground: 'real',
    at: { station: station(at), offset: offset(1) },
    cut: {},
    state,
    operation: null,
  }) as unknown as PlaceMove

describe('moves on the map, in order', () => {
  it('replaces what is still in the hand, never what is being sent', () => {
    const held = putMove([move('a', 'apex', 10, 'held')], move('b', 'apex', 11, 'held'))
    expect(held.map((one) => one.id)).toEqual(['b'])
    const sending = putMove([move('c', 'apex', 12, 'sending')], move('d', 'apex', 13))
    expect(sending.map((one) => one.id)).toEqual(['c', 'd'])
  })

  it('keeps moves of other marks', () => {
    const queue = putMove(putMove([move('a', 'apex', 10, 'sending')], move('b', 'turnin', 20)), move('c', 'brake', 30))
    expect(queue.map((one) => one.id)).toEqual(['a', 'b', 'c'])
  })

  it('sends one at a time, when the hand has let go', () => {
    expect(nextMove([move('a', 'apex', 10, 'held')])).toBeNull()
    const waiting = letGo([move('a', 'apex', 10, 'held'), move('b', 'turnin', 20, 'held')])
    expect(nextMove(waiting)?.id).toBe('a')
    expect(nextMove(withState(waiting, 'a' as OperationId, 'sending', null))).toBeNull()
  })

  it('holds the page while something is in the hand or on its way, not for what is answered or cannot be sent', () => {
    const under = (state: PlaceMove['state']) => isUnderWay([move('a', 'apex', 10, state)])
    expect((['held', 'waiting', 'sending'] as const).map(under)).toEqual([true, true, true])
    expect((['settled', 'unsent'] as const).map(under)).toEqual([false, false])
  })

  it('keeps what could not be sent until it is sent again', () => {
    const queue = [move('a', 'apex', 10, 'unsent'), move('b', 'turnin', 20)]
    expect(nextMove(queue)).toBeNull()
    expect(nextMove(sendAgain(queue))?.id).toBe('a')
  })

  it('ends with every mark at its last place, whatever is slow or fails', () => {
    const step = fc.record({ mark: fc.constantFrom('apex', 'turnin', 'brake'), fails: fc.boolean(), sends: fc.nat(2) })
    fc.assert(
      fc.property(fc.array(step, { maxLength: 30 }), (steps) => {
        const server = new Map<string, number>()
        let queue: PlaceQueue = []
        const send = (fails: boolean) => {
          const next = nextMove(queue)
          if (!next) return
          queue = withState(queue, next.id, fails ? 'unsent' : 'sending', null)
          if (fails) return
          server.set(next.mark.id, next.at.station)
          queue = answered(queue, next.id)
        }
        const last = new Map<string, number>()
        for (const [index, { mark, fails, sends }] of steps.entries()) {
          queue = letGo(putMove(queue, move(`op-${index}`, mark, index, 'held')))
          last.set(mark, index)
          for (let k = 0; k < sends; k++) send(fails)
          queue = sendAgain(queue)
        }
        for (let k = 0; k < steps.length; k++) send(false)
        expect(queue).toEqual([])
        expect(server).toEqual(last)
      }),
    )
  })
})

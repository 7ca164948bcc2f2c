import { afterEach, beforeEach, expect, test, vi } from 'vitest'
import { startSweeps } from './sweeps.server'

const MINUTE = 60_000

beforeEach(() => void vi.useFakeTimers())
afterEach(() => void vi.useRealTimers())

/** A sweep that counts how often it was made. */
function counted(name: string) {
  const sweep = {
    name,
    made: 0,
    run: async () => {
      sweep.made += 1
    },
  }
  return sweep
}
const unexpected = (_: string, error: unknown) => {
  throw error
}

test('every sweep is made within the first hour, then about once an hour', async () => {
  const [drafts, sessions] = [counted('drafts'), counted('sessions')]
  const stop = startSweeps([drafts, sessions], { onError: unexpected, chance: () => 0.5 })
  await vi.advanceTimersByTimeAsync(29 * MINUTE)
  expect([drafts.made, sessions.made]).toEqual([0, 0])
  await vi.advanceTimersByTimeAsync(2 * MINUTE)
  expect([drafts.made, sessions.made]).toEqual([1, 1])
  await vi.advanceTimersByTimeAsync(120 * MINUTE)
  expect([drafts.made, sessions.made]).toEqual([3, 3])
  await stop()
})

test('a sweep that fails is told of, hinders no other and is tried again', async () => {
  const failed: string[] = []
  const broken = { name: 'drafts', run: () => Promise.reject(new Error('no connection')) }
  const sessions = counted('sessions')
  const stop = startSweeps([broken, sessions], { onError: (name) => failed.push(name), chance: () => 0 })
  await vi.advanceTimersByTimeAsync(31 * MINUTE)
  expect(sessions.made).toBe(2)
  expect(failed).toEqual(['drafts', 'drafts'])
  await stop()
})

test('once stopped nothing more is swept; what is under way is waited for', async () => {
  let finish = () => {}
  const running = new Promise<void>((resolve) => {
    finish = resolve
  })
  const drafts = { name: 'drafts', run: () => running }
  const sessions = counted('sessions')
  const stop = startSweeps([drafts, sessions], { onError: unexpected, chance: () => 0 })
  await vi.advanceTimersByTimeAsync(MINUTE)
  let ended = false
  const stopping = stop().then(() => {
    ended = true
  })
  await vi.advanceTimersByTimeAsync(300 * MINUTE)
  expect(ended).toBe(false)
  finish()
  await stopping
  expect(sessions.made).toBe(0)
})

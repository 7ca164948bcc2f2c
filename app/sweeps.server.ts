/** What is removed by time, not by anyone's request. */
export interface Sweep {
  name: string
  run: () => Promise<unknown>
}

interface Options {
  /** Told of a sweep that failed; the others are made all the same, and it is tried again next time. */
  onError: (sweep: string, error: unknown) => void
  /** A number from 0 to 1 by chance. */
  chance?: () => number
}

const HOUR_MS = 3_600_000

/**
 * Makes every sweep about once an hour, first within the first hour, at moments by chance so that processes side by side do not
 * sweep together. Where they do nothing is lost: what one has removed another does not find. Keeps no process alive.
 * @returns ends it; resolves when the sweep under way is done
 */
export function startSweeps(sweeps: readonly Sweep[], { onError, chance = Math.random }: Options): () => Promise<void> {
  let stopped = false
  let timer: NodeJS.Timeout
  let underWay = Promise.resolve()
  const sweepAll = async () => {
    for (const { name, run } of sweeps) {
      if (stopped) return
      await run().catch((error: unknown) => onError(name, error))
    }
    if (!stopped) wait(HOUR_MS * (0.5 + chance()))
  }
  const wait = (time: number) => {
    timer = setTimeout(() => {
      underWay = sweepAll()
    }, time)
    timer.unref()
  }
  wait(HOUR_MS * chance())
  return () => {
    stopped = true
    clearTimeout(timer)
    return underWay
  }
}

/** What stops a command, told in one line. */
export class Stop extends Error {
  constructor(message, details = '') {
    super(message)
    this.details = details
  }
}

const known = [
  [/no space left on device|ENOSPC/i, 'The disk is full.'],
  [
    /EAI_AGAIN|ENOTFOUND|ETIMEDOUT|ECONNREFUSED.*registry|Temporary failure resolving/i,
    'The network cannot be reached.',
  ],
  [/EROFS|read-only file system/i, 'The disk is read-only.'],
]

/** Why a command failed, where its output says so in a way that is known. */
export const knownReason = (output) => known.find(([pattern]) => pattern.test(output))?.[1]

const width = 60

/**
 * Does one step and prints one line for it: what was done and how long it took.
 *
 * @param {string} label what is done
 * @param {() => Promise<string | void> | string | void} work may return a word that follows the label
 */
export async function step(label, work) {
  const from = performance.now()
  const word = await work()
  const line = word ? `${label}: ${word}` : label
  console.log(`${line.padEnd(width)} ${((performance.now() - from) / 1000).toFixed(1).padStart(6)} s`)
}

/** Prints why a command stopped. */
export function explain(error) {
  if (!(error instanceof Stop)) {
    const reason = knownReason(String(error?.message ?? error))
    console.error(reason ?? (error?.stack || String(error)))
    return
  }
  console.error(error.message)
  if (error.details) console.error(error.details)
}

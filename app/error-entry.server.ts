/** What the log keeps of an error. */
export type ErrorEntry = {
  error: string
  message?: string
  code?: string
  constraint?: string
  stack?: string
}

const text = (value: unknown) => (typeof value === 'string' ? value : undefined)

/** Where an error came from: its stack without its message, which stands at the head of it. */
function framesOf({ stack = '', message }: Error): string {
  const after = stack.indexOf(message) + message.length
  return stack
    .slice(after)
    .split('\n')
    .filter((line) => /^\s+at /.test(line))
    .join('\n')
}

/** The errors that led to an error, itself first. */
function chainOf(error: Error): Error[] {
  const chain: Error[] = []
  for (let at: unknown = error; at instanceof Error && !chain.includes(at); at = at.cause) chain.push(at)
  return chain
}

/**
 * What may be logged of an error: its name, its message, where it came from. Of an error of the database, or of a statement
 * that did not reach it, only the code and the constraint: its messages repeat the values of the statement.
 */
export function errorEntry(error: unknown): ErrorEntry {
  if (!(error instanceof Error)) return { error: typeof error }
  const stack = framesOf(error)
  const chain = chainOf(error)
  const ofStatement = chain.some((link) => 'severity' in link || ('query' in link && 'params' in link))
  if (!ofStatement) return { error: error.name, message: error.message, stack }
  const facts = chain.at(-1) as Error & { code?: unknown; constraint?: unknown }
  return { error: 'DatabaseError', code: text(facts.code), constraint: text(facts.constraint), stack }
}

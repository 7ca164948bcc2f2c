/** What the log keeps of an error. */
export type ErrorEntry = { error: string; code?: string; constraint?: string; message?: string; stack?: string }

const text = (value: unknown) => (typeof value === 'string' ? value : undefined)

/**
 * What may be logged of an error: its name, its stack, and its message. Of a database error only the code and the
 * constraint, since its messages repeat the values of the statement.
 */
export function errorEntry(error: unknown): ErrorEntry {
  if (!(error instanceof Error)) return { error: typeof error }
  const frames = error.stack?.split('\n').filter((line) => /^\s+at /.test(line))
  const stack = frames?.join('\n')
  const database = databaseError(error)
  if (database) return { error: database.name, ...database.facts, stack }
  return { error: error.name, message: error.message, stack }
}

function databaseError(error: Error) {
  for (let at: unknown = error; at instanceof Error; at = at.cause) {
    const { code, severity, constraint } = at as Error & Record<'code' | 'severity' | 'constraint', unknown>
    if (text(severity)) return { name: 'DatabaseError', facts: { code: text(code), constraint: text(constraint) } }
    if ('query' in at && !(at.cause instanceof Error)) return { name: 'DatabaseError', facts: {} }
  }
  return undefined
}

/** Containers within containers that anything sent may have; an operation has six. */
const DEPTH = 16

/** A character that PostgreSQL cannot keep: NUL, or half of a surrogate pair. */
const UNKEEPABLE = /\0|\p{Surrogate}/u

/**
 * Whether plain data can be kept as it came: no deeper than anything is meant to be, every number finite, every text of
 * characters that the database holds. Walks without recursion, so that no depth can exhaust the stack.
 */
export function isStorable(value: unknown): boolean {
  const open: { value: unknown; depth: number }[] = [{ value, depth: 0 }]
  for (let next = open.pop(); next; next = open.pop()) {
    const { value: current, depth } = next
    if (typeof current === 'string' && UNKEEPABLE.test(current)) return false
    if (typeof current === 'number' && !Number.isFinite(current)) return false
    if (current === null || typeof current !== 'object') continue
    if (depth >= DEPTH) return false
    for (const [name, part] of Object.entries(current)) {
      if (UNKEEPABLE.test(name)) return false
      open.push({ value: part, depth: depth + 1 })
    }
  }
  return true
}

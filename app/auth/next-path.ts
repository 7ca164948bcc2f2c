const ORIGIN = 'https://here.invalid'

/**
 * The path to go to after signing in, from a `next` that anyone may have written: a path of this site, else `otherwise`.
 * Whatever a browser would take to another site (`//x`, `/\x`, a scheme, control characters in between) is refused.
 */
export function nextPath(next: FormDataEntryValue | null, otherwise: string): string {
  if (typeof next !== 'string' || !next.startsWith('/') || !URL.canParse(next, ORIGIN)) return otherwise
  const url = new URL(next, ORIGIN)
  if (url.origin !== ORIGIN || url.pathname.startsWith('//')) return otherwise
  return url.pathname + url.search + url.hash
}

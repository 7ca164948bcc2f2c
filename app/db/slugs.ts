/** Words that stand for pages at the same place in an address. */
const RESERVED = new Set(['new', 'import', 'edit'])
const SLUG_LENGTH = 60

/** A name as it stands in an address: lower-case ASCII letters and digits with hyphens between. */
export function slugOf(name: string): string {
  const plain = name
    .normalize('NFKD')
    .replace(/\p{M}+/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, SLUG_LENGTH)
    .replace(/^-+|-+$/g, '')
  return plain === '' ? 'untitled' : plain
}

/** The name's own slug, or the first numbered one that is not among the taken ones. */
export function freeSlug(name: string, taken: readonly string[]): string {
  const wanted = slugOf(name)
  const isFree = (slug: string) => !RESERVED.has(slug) && !taken.includes(slug)
  if (isFree(wanted)) return wanted
  let number = 2
  while (!isFree(`${wanted}-${number}`)) number += 1
  return `${wanted}-${number}`
}

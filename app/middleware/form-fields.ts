/** Fields that a form may have: the pieces of a drawn line are the most that a page sends. */
export const MOST_FIELDS = 2_500
/** Places that all lists of a form may have together. */
export const MOST_PLACES = 500
const MOST_LEVELS = 4
const MOST_LETTERS = 100

/** `name`, `corners[3].name`: words joined by points, with places in lists. A word begins with a letter. */
const NAME = /^[a-z][\w-]*(?:\.[a-z][\w-]*|\[\d{1,3}\])*$/i
const CONTROLS = /(?![\t\n\r])\p{Cc}/gu

/**
 * A form's fields, fit to be taken apart by their names: values without control characters, tabs and line ends excepted. What
 * a list takes up grows with the places that its names count, not with what was sent; hence the limits. Null where a name is
 * of no such form, goes deeper than the pages' own or means what every object has, or where fields or places are too many.
 */
export function formFields(sent: FormData | URLSearchParams): FormData | null {
  const fields = new FormData()
  const lists = new Map<string, number>()
  let count = 0
  for (const [name, value] of sent) {
    count += 1
    if (count > MOST_FIELDS || !isName(name)) return null
    for (const place of name.matchAll(/\[(\d+)\]/g)) {
      const list = name.slice(0, place.index)
      lists.set(list, Math.max(lists.get(list) ?? 0, Number(place[1]) + 1))
    }
    fields.append(name, typeof value === 'string' ? value.replace(CONTROLS, '') : value)
  }
  const places = [...lists.values()].reduce((sum, length) => sum + length, 0)
  return places > MOST_PLACES ? null : fields
}

function isName(name: string): boolean {
  if (name.length > MOST_LETTERS || !NAME.test(name)) return false
  const parts = name.split(/[.[]/)
  return parts.length <= MOST_LEVELS && !parts.some((part, level) => part in (level === 0 ? {} : []))
}

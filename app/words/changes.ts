import type { Deed, ToldChange } from '~/book/changes'
import type { Ground, Manner } from '~/book/kinds'
import type { Json } from '~/book/operation'
import { type Metres, metresPerSecond } from '~/track/units'
import { mannerWord, markKind } from './kinds'
import { count, formatGear, formatMetres, formatNumber, formatSpeed } from './measures'

/** A change in words, without its corner and without who made it: "build to moved 9 m sooner". Only the simulator is named. */
export function changeWords(told: ToldChange): string {
  const { thing, what, reason, count: number, alike } = told
  const why = reason ? `: ${reason}` : ''
  if (number > 1 && alike) return `${count(number, ...KINDS[thing.kind])} ${deedsWords(what)}${why}`
  const more = number > 1 ? `, and ${formatNumber(number - 1)} more` : ''
  return `${thingWords(told)} ${deedWords(what)}${why}${more}`
}

const KINDS: Record<ToldChange['thing']['kind'], [one: string, many?: string]> = {
  mark: ['mark'],
  landmark: ['landmark'],
  stretch: ['stretch', 'stretches'],
  condition: ['condition'],
  card: ['card'],
  corner: ['corner'],
  book: ['book'],
  layout: ['layout'],
}

const THINGS = { card: 'card', corner: 'corner', book: 'book', layout: 'layout' } as const

function thingWords({ thing }: ToldChange): string {
  if (thing.kind === 'mark') return markKind(thing.mark, thing.role, thing.gear).toLowerCase()
  return 'name' in thing ? thing.name : THINGS[thing.kind]
}

/** What was done to several things: a distance, a value would be one thing's only. */
const deedsWords = (what: Deed): string =>
  what.deed === 'moved' ? `moved ${WHERE[what.ground]}` : what.deed === 'set' ? 'rewritten' : deedWords(what)

const WHERE: Record<Ground, string> = { sim: 'in the simulator', real: 'on the real track' }

function deedWords(what: Deed): string {
  switch (what.deed) {
    case 'added':
      return 'added'
    case 'dropped':
      return 'taken off'
    case 'restored':
      return 'put back'
    case 'archived':
      return 'archived'
    case 'merged':
      return 'made one with another'
    case 'undone':
      return 'put back as it was'
    case 'renamed':
      return 'renamed'
    case 'placed':
      return `placed ${WHERE[what.ground]}`
    case 'cleared':
      return `has no place ${WHERE[what.ground]} any more`
    case 'tied':
      return `tied again ${WHERE[what.ground]}`
    case 'moved':
      return `moved ${movedBy(what.ahead, what.left)}${what.ground === 'sim' ? ` ${WHERE.sim}` : ''}`
    case 'set':
      return setWords(what.set)
  }
}

/** "9 m sooner", "1 m left"; of both the greater, and under half a metre with its tenths. */
function movedBy(ahead: Metres, left: Metres): string {
  const along = Math.abs(ahead) >= Math.abs(left)
  const by = along ? ahead : left
  const word = along ? (by < 0 ? 'sooner' : 'later') : by > 0 ? 'left' : 'right'
  return `${formatMetres(by, Math.abs(by) < 0.95 ? 1 : 0)} ${word}`
}

/** Fields whose value is too long to say; and what the others are called where a value alone would not say it. */
const FIELDS: Record<string, string> = {
  line: 'line',
  kerbs: 'kerbs',
  surface: 'surface',
  water: 'standing water',
  car: 'what the car does',
  mistake: 'usual mistake',
  traffic: 'passing and traffic',
  limits: 'track limits',
  backup: 'backup reference',
  next: 'what comes next',
  setsUp: 'what it sets up',
  compromisedFor: 'what it is compromised for',
  startAlong: 'start line',
  reversed: 'direction of travel',
  roadWidth: 'width of the road',
  datum: 'datum',
  forPerson: 'whose it is',
  role: 'role',
  conditionId: 'condition',
  cardId: 'corner',
}

const NUMBERS: Record<string, (value: number) => string> = {
  gear: formatGear,
  gearIn: (value) => `${formatGear(value)} in`,
  gearOut: (value) => `${formatGear(value)} out`,
  speed: (value) => formatSpeed(metresPerSecond(value)),
  speedIn: (value) => `${formatSpeed(metresPerSecond(value))} in`,
  leastSpeed: (value) => `${formatSpeed(metresPerSecond(value))} at the slowest`,
  downshifts: (value) => `down ${formatNumber(value)}`,
}

/** A value short enough to say, or null. */
function valueWords(field: string, value: Json): string | null {
  if (typeof value === 'number') return NUMBERS[field]?.(value) ?? null
  if (field === 'manner' && value !== null) return mannerWord(value as Manner)
  if (field === 'flat') return value ? 'flat' : 'not flat'
  if (field === 'noReference') return value ? 'without a reference so far' : 'with a reference'
  return null
}

/** "now 3rd, trail"; "rewritten: line, kerbs". */
function setWords(set: Record<string, Json>): string {
  const fields = Object.keys(set)
  const said = fields.flatMap((field) => valueWords(field, set[field] ?? null) ?? [])
  const others = fields.filter((field) => valueWords(field, set[field] ?? null) === null)
  return [
    ...(said.length > 0 ? [`now ${said.join(', ')}`] : []),
    ...(others.length > 0 ? [`rewritten: ${others.map((field) => FIELDS[field] ?? field).join(', ')}`] : []),
  ].join('; ')
}

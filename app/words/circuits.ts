import { type Metres, metres } from '~/track/units'
import { formatKilometres, formatMetres, NBSP } from './measures'

/** A team's circuits, and the page of one layout. */
export const circuitWords = {
  title: 'Circuits',
  lead: 'The roads your books are drawn on.',
  bringIn: 'Bring a circuit in',
  none: 'No circuit yet.',
  noneQuestion: 'Have you a lap of it, or its centreline, as a file?',
  pages: 'Pages of circuits',
  pageBefore: 'Circuits before these',
  pageAfter: 'More circuits',
  outline: (name: string) => `Outline of ${name}`,
  facts: {
    length: 'Length',
    direction: 'Direction',
    corners: 'Corners',
    heights: 'Heights',
    roadWidth: 'Road width',
    timeZone: 'Time zone',
    books: 'Books',
  },
  noHeights: 'none in the file',
  heightRange: (lowest: string, highest: string) => `${lowest} to ${highest}${NBSP}m`,
  lengthLine: (length: Metres) => formatKilometres(length),
  makeBook: 'Make a book for it',
  corners: 'Corners',
  cornersCaption: 'Corners in driving order, with number and name to change',
  columns: {
    number: 'number',
    name: 'name',
    turn: 'turn',
    radius: 'radius',
    apex: 'tightest at',
    keep: 'keep',
  },
  numberOf: (name: string) => `Number of ${name}`,
  nameOf: (number: string) => `Name of corner ${number}`,
  keepOf: (number: string) => `Keep corner ${number}`,
  save: 'Keep names and numbers',
  numberWrong: 'A number, with a letter where needed: 7 or 7A.',
  nameMissing: 'What do drivers call it?',
  numberTwice: (number: string) => `${number} is there twice.`,
  keptCorners: (changed: number) => (changed === 1 ? '1 change kept.' : `${changed} changes kept.`),
  nothing: 'Nothing to change: it stands as you typed it.',
  undone: 'Taken back.',
  undo: 'Undo',
  start: 'Start line and direction',
  reverse: 'Drive it the other way',
  move: 'Move the start line',
  moveMetres: 'Metres',
  moveWay: 'Which way',
  moveFrom: 'From',
  ahead: 'after',
  back: 'before',
  fromNow: 'the start line now',
  fromCorner: (number: string, name: string) => `the entry of ${number} ${name}`.trim(),
  metresMissing: 'How many metres?',
  metresWrong: 'A number of metres, such as 250.',
  metresOutside: (length: Metres) => `The lap is ${formatKilometres(length)} long.`,
  booksCount: 'Every station of the books on it counts from the start line. Marks stay where they are.',
  conflict: 'Two people changed this. Keep one.',
  conflictIn: (number: string, name: string) => `Two people changed corner ${number} ${name}. Keep one.`,
  startLine: 'start line',
  startAt: (along: string) => `${along} along the drawn line`,
  undoConflict: 'It has been changed again since, so it stays as it is.',
  yours: 'yours',
  theirs: 'theirs',
  keepYours: 'Keep yours',
  keepTheirs: 'Keep theirs',
  changes: 'Changed lately',
} as const

export type LayoutChangeKind = 'corner' | 'direction' | 'start'

/** A change of a layout in words: "2 is Groyne, was Turn 2", "start line moved". */
export function layoutChangeWords(
  kind: LayoutChangeKind,
  number: string | null,
  set: Record<string, { from: unknown; to: unknown }>,
): string {
  if (kind === 'direction') return 'Driven the other way'
  if (kind === 'start') return 'Start line moved'
  const told = [set.number, set.name].flatMap((change) => (change ? [`${change.to}, was ${change.from}`] : []))
  return `Corner ${number ?? ''}: ${told.join('; ')}`
}

/** What the map of a layout says of itself and its parts. */
export const circuitMapWords = (title: string) => ({
  label: `Map of ${title}`,
  closer: 'Closer',
  further: 'Further off',
  whole: 'Whole lap',
  metres: (value: number) => formatMetres(metres(value)),
  start: 'Start line. Drag it along the road, or type its metres beside.',
})

import { CORNER_STATES, type CornerState } from '~/book/cuts'
import type { TurnDirection } from '~/book/kinds'
import type { Gap } from '~/book/missing'
import type { HeightNote } from '~/draw/height-notes'
import type { HeightWords } from '~/draw/lap-heights'
import { type Metres, type MetresPerSecond, metres } from '~/track/units'
import { count, formatGear, formatKilometres, formatKmhFigure, formatMetres } from './measures'

/** What the overview of a book says. */

const STATES: Record<CornerState, string> = {
  empty: 'No marks yet',
  inherited: 'As in the dry',
  draft: 'Draft',
  seen: 'Seen on foot',
  driven: 'Driven',
}
export const stateWord = (state: CornerState): string => STATES[state]

const COUNTED: Record<CornerState, string> = {
  empty: 'without marks',
  inherited: 'as in the dry',
  draft: 'draft',
  seen: 'seen on foot',
  driven: 'driven',
}

/** How many corners stand at what, the furthest first: "3 driven, 5 seen on foot, 2 draft". */
export function statesInSum(states: readonly CornerState[]): string {
  return [...CORNER_STATES]
    .reverse()
    .map((state) => [state, states.filter((one) => one === state).length] as const)
    .filter(([, number]) => number > 0)
    .map(([state, number]) => `${number} ${COUNTED[state]}`)
    .join(', ')
}

const TURNS: Record<TurnDirection, { letter: string; word: string }> = {
  left: { letter: 'L', word: 'left' },
  right: { letter: 'R', word: 'right' },
}
/** "L", and "left" for who hears it. */
export const turnLetter = (direction: TurnDirection) => TURNS[direction]

export const gearFigure = (gear: number | null): string => (gear === null ? '' : formatGear(gear))

/** Least speed of a corner in km/h; a flat corner says so. */
export function leastSpeedFigure(corner: { flat: boolean; leastSpeed: MetresPerSecond | null }): string {
  if (corner.flat) return 'flat'
  return corner.leastSpeed === null ? '' : formatKmhFigure(corner.leastSpeed)
}

const GAP_WORDS: Record<Gap, (number: number) => string> = {
  'no-marks': (number) => `${count(number, 'corner')} without a mark:`,
  'no-brake': (number) => `${count(number, 'corner')} without a brake mark:`,
  'no-reference': (number) => `No reference found yet in ${count(number, 'corner')}:`,
  'sim-only': (number) => `Brake mark from the simulator only in ${count(number, 'corner')}:`,
}
/** The lead of a line that goes on with the corners' names. */
export const gapWords = (gap: Gap, number: number): string => GAP_WORDS[gap](number)

/** The lap turned round as often as its turning number says, left positive; a figure of eight has no one direction. */
export const lapDirection = (turns: number): string =>
  turns === 0 ? 'crosses itself' : turns < 0 ? 'clockwise' : 'anticlockwise'

export const mapLabel = (circuit: string): string => `Map of ${circuit}`

/** The map in a sentence, for those who do not see it. */
export const mapDescription = (line: string): string => `North up, ${line}. Each number leads to its corner.`

/** "contours 5 m" */
export const contourNote = (step: Metres): string => `contours ${formatMetres(step)}`

/** "4.12 km, 13 corners, clockwise" */
export const circuitLine = (length: Metres, corners: number, direction: string): string =>
  `${formatKilometres(length)}, ${count(corners, 'corner')}, ${direction}`

/** What a screen reader says of a corner's plate: "3 Lookout, right, draft". */
export const plateLabel = (corner: { number: string; name: string; direction: TurnDirection; state: CornerState }) =>
  `${corner.number} ${corner.name}, ${TURNS[corner.direction].word}, ${STATES[corner.state].toLowerCase()}`

export const heightsLabel = 'Heights along the lap, from start line to start line'

function heightNote(note: HeightNote): string {
  const height = formatMetres(note.height)
  switch (note.code) {
    case 'crest':
      return note.corner === null ? `highest ${height}` : `${note.corner} crest ${height}`
    case 'lowest':
      return `lowest ${height}`
    case 'up':
      return `up ${formatMetres(note.metres)}`
    case 'down':
      return `down ${formatMetres(note.metres)} to ${note.corner}`
  }
}

/** What the drawing of a lap's heights says. */
export const heightWords: HeightWords = {
  metres: (value) => formatMetres(metres(value)),
  lap: 'one lap, start line to start line',
  note: heightNote,
}

/** The same where there is no room for more. */
export const shortHeightWords: HeightWords = { ...heightWords, lap: 'one lap' }

export const overviewWords = {
  corners: 'Corners',
  cornersCaption: 'Corners in driving order',
  number: 'number',
  name: 'name',
  direction: 'direction',
  gear: 'gear',
  speed: `km/h`,
  state: 'state',
  numbered: (number: string) => `${number}, `,
  conditions: 'Condition',
  missing: 'Still missing',
  changed: 'Changed lately',
  noHeights: 'No heights: the circuit’s file has none.',
  emptyLead: 'No marks in this book yet.',
  emptyQuestion: 'One brake mark in each corner makes a first book. Where do you brake for the first one?',
  emptyReader: 'Its drivers and coach have not begun.',
  begin: (number: string, name: string) => `Start with ${number} ${name}`.trim(),
} as const

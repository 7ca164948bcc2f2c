import type { Ground } from '~/book/kinds'
import type { RefusalCode } from '~/book/operation'
import { type Metres, metres, type Offset } from '~/track/units'
import { formatMetres, formatToDatum, NBSP } from './measures'

/** The sentences of the corner page. */

/**
 * Where across the road a car's centre stands, as drivers say it, from the edge its wheels are nearest to.
 * @param side metres left (+) or right (−) of the middle
 */
export function acrossWords(side: Offset, roadWidth: Metres, carWidth: Metres): string {
  const hand = side > 0 ? 'left' : 'right'
  const gap = roadWidth / 2 - Math.abs(side) - carWidth / 2
  if (Math.abs(side) < 0.75) return 'middle of the road'
  if (gap < -carWidth) return `beyond the ${hand} edge`
  if (gap < -0.2) return `${hand} wheels over the ${hand} edge`
  if (gap < 0.4) return `${hand} wheels on the line`
  if (gap < 1) return `half a car off ${hand} edge`
  if (gap < 2.6) return `car’s width off ${hand} edge`
  return `${hand} of the middle`
}

const where: Record<Ground, string> = { sim: 'in the simulator', real: 'on the real track' }

export const corner = {
  added: (mark: string, toDatum: Metres, ground: Ground) =>
    `${mark} added, ${formatToDatum(toDatum)} ${where[ground]}.`,
  moved: (mark: string, toDatum: Metres, across: string, ground: Ground) =>
    `${mark}: now ${formatToDatum(toDatum)}, ${across}, ${where[ground]}.`,
  changed: (mark: string) => `${mark} changed.`,
  dropped: (mark: string) => `${mark} taken off the book.`,
  cleared: (mark: string, ground: Ground) => `${mark} has no place ${where[ground]} any more.`,
  save: 'Save',
  givePlace: (ground: Ground) => `Give it a place ${where[ground]}`,
  clear: 'Take this place away',
  drop: 'Take off the book',
  sendAgain: 'Send again',
  undone: 'Taken back.',
  undoProposed: 'It is another’s. Taking it back waits for the coach as a proposal.',
  unsent: 'Not sent: no connection, or you are signed out. It stays on this page.',
  nothing: 'Nothing to change: it stands as you typed it.',
  proposed: (mark: string) => `${mark} is another’s. Your change waits for the coach as a proposal.`,
  accepted: 'Proposal accepted.',
  declined: 'Proposal declined.',
  invalid: 'Something in it does not fit this book. Load the page again.',
  mark: 'This mark',
  none: 'none',
  takenOff: 'taken off the book',
  gone: 'This mark is not in the book any more.',
  conflict: (mark: string) => `Two people changed ${mark}. Keep one.`,
  undoConflict: 'It has been changed again since, so it stays as it is.',
  refused: (reason: RefusalCode) => REFUSALS[reason],
  zero: (words: string) => `0 is ${words.replace(/^from /, '')}`,
  empty: 'No marks in this corner yet.',
  emptyLead: 'Start with the brake mark: what on the ground tells you where?',
  emptyGround: (ground: Ground) => `No mark of this corner has a place ${where[ground]} yet.`,
  emptyGroundLead: 'Open a mark in the table and give it one, or tap the map.',
  basis:
    'Metres and seconds to the next mark run along the line through the marks; seconds from the speeds at the marks.',
  caution:
    'Simulator marks are not proven on the real surface. Seen on foot is not a proven braking distance. Officials, flags and the drivers’ briefing come first.',
  mapLabel: (name: string) => `Map of ${name}`,
  mapDescription: 'The road with its landmarks and marks. The table below tells the same in road order.',
  mapHint: 'Tap the map to add a mark; drag one to move it.',
  mapKeys: `Or focus it: up and down are 1${NBSP}m along the road, left and right 1${NBSP}m across, 10${NBSP}m with Shift.`,
  form: {
    kind: 'Choose what happens here.',
    metres: 'Metres to the datum, as a number from 0.',
    metresFar: `More than 5${NBSP}000${NBSP}m is not in this corner.`,
    across: 'Metres from the middle of the road, as a number from 0.',
    acrossFar: `More than 60${NBSP}m is not on this road.`,
    speed: 'Speed in km/h, as a number.',
    speedFar: (issue: { input?: unknown }) => `Over 500. Did you mean ${Math.round(Number(issue.input) / 10)}?`,
    gear: 'A gear from 1 to 10.',
    stale: 'The page is from before a change. Load it again.',
  },
}

/** Words of the corner's map. */
export const cornerMapWords = (name: string) => ({
  metres: (value: number) => formatMetres(metres(value)),
  label: `Map of ${name}`,
  closer: 'Closer',
  further: 'Further off',
  whole: 'Whole corner',
})

const REFUSALS: Record<RefusalCode, string> = {
  'not-a-member': 'You are not in this team any more.',
  role: 'Your role cannot change this.',
  'another-persons': 'This is another’s mark.',
  'read-only': 'This book is archived: it can be read, not changed.',
  'id-in-use': 'This was sent before with other content. Load the page again.',
  'newer-version': 'This comes from a newer Turnstone. Load the page again.',
  'unknown-target': 'It is not in the book any more.',
}

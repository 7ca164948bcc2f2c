import { mostPositions } from '~/track/read/points'
import { count, type Problem, problem, several } from '~/track/read/problems'

/** "1 waypoint of the file is left out.", "3 areas of the file are left out." */
export const leftOut = (number: number, one: string): string =>
  `${several(number, `${one} of the file is`, `${one}s of the file are`)} left out.`

export const heightsLeftOut = (number: number): Problem =>
  problem(
    'heights-left-out',
    `${several(number, 'height that is no number is', 'heights that are no numbers are')} left out.`,
  )

export const decimalCommas = (): Problem =>
  problem('decimal-comma', 'Numbers are written with a decimal comma. They are read with a point.')

export const extraValues = (number: number): Problem =>
  problem(
    'extra-coordinate',
    `${several(number, 'position has', 'positions have')} more than three values. Those past the height are left out.`,
  )

export const tooManyPositions = (where: string): Problem =>
  problem(
    'too-many-positions',
    `The file holds more than ${count(mostPositions)} positions. Save one lap and bring that.`,
    where,
  )

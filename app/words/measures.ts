import type { Limits } from '~/book/limits'
import type { Degrees, Metres, MetresPerSecond, Seconds } from '~/track/units'
import { toKmh } from '~/track/units'

/**
 * Figures as they are read on screen and paper: decimal point, thousands set apart by a narrow no-break space, the unit after
 * a no-break space. No figure carries a minus sign: a direction is a word.
 */

/** U+00A0, between a figure and the word or unit that belongs to it. */
export const NBSP = '\u00a0'
/** U+202F, between groups of three digits. */
export const THIN = '\u202f'

/**
 * A number without its sign, rounded half away from zero.
 * @param value any finite number; its sign is dropped
 * @param decimals digits after the point, 0 to 6
 */
export function formatNumber(value: number, decimals = 0): string {
  const scale = 10 ** decimals
  const rounded = Math.round((Math.abs(value) + Number.EPSILON * Math.abs(value)) * scale) / scale
  const [whole = '', fraction] = rounded.toFixed(decimals).split('.')
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, THIN)
  return fraction === undefined ? grouped : `${grouped}.${fraction}`
}

/** A number as `formatNumber` gives it, with its unit. */
function withUnit(value: number, unit: string, decimals: number): string {
  return `${formatNumber(value, decimals)}${NBSP}${unit}`
}

/** The least and the most that something measures: "0.4 to 2.5 m". */
export const formatLimits = ([least, most]: Limits): string => `${least} to ${most}${NBSP}m`

/** "113 m", "1 240 m". Whole metres unless told otherwise. */
export const formatMetres = (value: Metres, decimals = 0): string => withUnit(value, 'm', decimals)

/** A lap or a long stretch: "4.12 km". */
export const formatKilometres = (value: Metres): string => withUnit(value / 1000, 'km', 2)

/**
 * Signed metres along the road to a card's datum, negative before it, as "113 before", "14 after" or "at the datum 0".
 * The figure decides the word: what rounds to 0 stands at the datum.
 */
export function formatToDatum(toDatum: Metres, decimals = 0): string {
  const figure = formatNumber(toDatum, decimals)
  if (Number(figure.replaceAll(THIN, '')) === 0) return `at the datum${NBSP}0`
  return `${figure}${NBSP}${toDatum < 0 ? 'before' : 'after'}`
}

/**
 * A real place against its simulator place: "9 m sooner here", "6 m later here", "as in the simulator" below half a metre.
 * @param realMinusSim station of the real place minus station of the simulator place, the short way round the lap
 */
export function againstSimulator(realMinusSim: Metres): string {
  if (isAsInSimulator(realMinusSim)) return 'as in the simulator'
  return `${formatMetres(realMinusSim)} ${realMinusSim < 0 ? 'sooner' : 'later'} here`
}

/** Whether the two places round to no difference at all. */
export const isAsInSimulator = (realMinusSim: Metres): boolean => formatNumber(realMinusSim) === '0'

/**
 * A distance in car lengths: "1 car length", "1.7 car lengths", from ten on whole: "24 car lengths".
 * @param carLength length of the book's car, above 0
 */
export function formatCarLengths(distance: Metres, carLength: Metres): string {
  const lengths = Math.abs(distance) / carLength
  const figure = formatNumber(lengths, lengths < 9.95 ? 1 : 0)
  return figure === '1.0' ? `1${NBSP}car length` : `${figure}${NBSP}car lengths`
}

/** "0.57 s". Hundredths unless told otherwise. */
export const formatSeconds = (value: Seconds, decimals = 2): string => withUnit(value, 's', decimals)

/** "104 km/h". */
export const formatSpeed = (value: MetresPerSecond): string => withUnit(toKmh(value), 'km/h', 0)

/** "104", for a column that names its unit in the head. */
export const formatKmhFigure = (value: MetresPerSecond): string => formatNumber(toKmh(value))

/** "87°". */
export const formatDegrees = (value: Degrees): string => `${formatNumber(value)}°`

/** A radius read off a drawn line carries two significant figures: "56 m", "120 m", "8.4 m". */
export function formatRadius(value: Metres): string {
  const size = Math.abs(value)
  if (size === 0) return formatMetres(value)
  const step = 10 ** (Math.floor(Math.log10(size)) - 1)
  return withUnit(Math.round(size / step) * step, 'm', step < 1 ? 1 : 0)
}

/**
 * A gradient: "8 % up", "6 % down", "level" below half a per cent.
 * @param gradient rise over run along the direction of travel, 0.08 for eight per cent up
 */
export function formatGradient(gradient: number): string {
  const figure = formatNumber(gradient * 100)
  return figure === '0' ? 'level' : `${figure}${NBSP}% ${gradient > 0 ? 'up' : 'down'}`
}

/** A gear as drivers say it: "1st", "2nd", "3rd", "4th". */
export function formatGear(gear: number): string {
  const ending = { 1: 'st', 2: 'nd', 3: 'rd' }[gear] ?? 'th'
  return `${gear}${ending}`
}

/** A count with its noun: "1 corner", "13 corners". */
export function count(value: number, one: string, many = `${one}s`): string {
  return `${formatNumber(value)}${NBSP}${value === 1 ? one : many}`
}

import type { Limits } from '~/book/limits'
import { isTimeZone } from '~/book/time-zone'
import { isStorable } from './storable'

/** Checks of what commands are given; what people type is checked in the form too, with words for it. */

export interface Problem {
  field: string
  code: 'required' | 'too-long' | 'out-of-range' | 'invalid'
}

const NAME_LENGTH = 80

/** What is wrong with a name; blanks around it do not count. */
export function nameProblems(field: string, name: string): Problem[] {
  const length = name.trim().length
  if (length === 0) return [{ field, code: 'required' }]
  if (length > NAME_LENGTH) return [{ field, code: 'too-long' }]
  return isStorable(name) ? [] : [{ field, code: 'invalid' }]
}

const FIRST_INSTANT = Date.parse('2000-01-01T00:00:00Z')
const LAST_INSTANT = Date.parse('2100-01-01T00:00:00Z')

/** Whether an instant is one that a clock may show; a device that lost its time still counts from 1970 and is told so. */
export const isSensibleInstant = (text: string): boolean => {
  const at = Date.parse(text)
  return at >= FIRST_INSTANT && at < LAST_INSTANT
}

/** What is wrong with a number that must lie between two others, both included. */
export const rangeProblems = (field: string, value: number, [least, most]: Limits): Problem[] =>
  value >= least && value <= most ? [] : [{ field, code: 'out-of-range' }]

/** What is wrong with an IANA time zone. */
export const zoneProblems = (field: string, zone: string): Problem[] =>
  isTimeZone(zone) ? [] : [{ field, code: 'invalid' }]

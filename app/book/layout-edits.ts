import { type Along, toMillimetre } from '~/track/units'
import type { LayoutId, OperationId } from './ids'
import { type FieldChange, OPERATION_VERSION, type Operation } from './operation'

/** What a person does on the page of a layout, turned into operations. Ids and the instant come from whoever does it. */

/** A corner as it was typed, beside what the page showed. */
export interface TypedCorner {
  id: string
  number: string
  name: string
  seenNumber: string
  seenName: string
}

interface Making {
  layout: LayoutId
  /** Instant, ISO 8601. */
  madeAt: string
  newId: () => OperationId
}

const operation = (making: Making, target: Operation['target'], set: Record<string, FieldChange>): Operation => ({
  id: making.newId(),
  v: OPERATION_VERSION,
  scope: { kind: 'layout', id: making.layout },
  target,
  set,
  madeAt: making.madeAt,
})

/** One operation for each corner whose number or name was typed anew; a field left as it was shown is no part of it. */
export function renameCorners(making: Making, corners: readonly TypedCorner[]): Operation[] {
  return corners.flatMap(({ id, number, name, seenNumber, seenName }) => {
    const set: Record<string, FieldChange> = {}
    if (number !== seenNumber) set.number = { from: seenNumber, to: number }
    if (name !== seenName) set.name = { from: seenName, to: name }
    return Object.keys(set).length === 0 ? [] : [operation(making, { kind: 'corner', id }, set)]
  })
}

/** The lap driven the other way. */
export const reverseLayout = (making: Making, seenReversed: boolean): Operation =>
  operation(making, { kind: 'layout', id: making.layout }, { reversed: { from: seenReversed, to: !seenReversed } })

/** The start line put elsewhere on the drawn line. */
export const moveStart = (making: Making, seenStart: Along, to: Along): Operation =>
  operation(
    making,
    { kind: 'layout', id: making.layout },
    { startAlong: { from: toMillimetre(seenStart), to: toMillimetre(to) } },
  )

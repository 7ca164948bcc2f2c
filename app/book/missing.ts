import type { ConditionId } from './ids'
import type { BookView, CornerView } from './view'

/**
 * What a corner lacks before it can be driven by the book: no mark at all; no brake or lift mark; none, and the card says that
 * no reference was found yet; a brake or lift mark that stands in the simulator only.
 */
export const GAPS = ['no-marks', 'no-brake', 'no-reference', 'sim-only'] as const
export type Gap = (typeof GAPS)[number]

export interface Missing {
  gap: Gap
  /** In driving order. */
  corners: { number: string; name: string }[]
}

/**
 * What the book lacks in a condition, one entry for each kind of gap that some corner has; each corner stands in one entry at
 * most. A corner taken flat needs no brake mark, and dry marks count where the condition has none of its own.
 */
export function missingOf(view: BookView, condition: ConditionId): Missing[] {
  const dry = view.conditions.find((one) => one.kind === 'dry')?.id
  const gaps = view.corners.map((corner) => ({ corner, gap: gapOf(corner, condition, dry) }))
  return GAPS.flatMap((gap) => {
    const corners = gaps
      .filter((one) => one.gap === gap)
      .map(({ corner }) => ({ number: corner.number, name: corner.name }))
    return corners.length > 0 ? [{ gap, corners }] : []
  })
}

function gapOf(corner: CornerView, condition: ConditionId, dry: ConditionId | undefined): Gap | null {
  const { card } = corner
  const marks = corner.marks.filter((mark) => mark.condition === condition || mark.condition === dry)
  const brakes = marks.filter((mark) => mark.kind === 'brake' || mark.kind === 'lift')
  if (brakes.length > 0) return brakes.some((mark) => mark.real) ? null : 'sim-only'
  if (card.noReference) return 'no-reference'
  if (marks.length === 0) return 'no-marks'
  return card.flat ? null : 'no-brake'
}

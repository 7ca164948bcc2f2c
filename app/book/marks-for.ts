import { inRoadOrder } from './assemble'
import type { ConditionId, PersonId } from './ids'
import type { ConditionView, MarkView } from './view'

/** A mark as one reader sees it in one condition. */
export interface ReadMark {
  mark: MarkView
  /** It is a dry mark, shown because the condition has none of its own. Its proof is not the condition's. */
  inherited: boolean
}

/**
 * The marks of a card that one reader sees in one condition, in road order. Of each kind (and role) a driver sees his own where
 * he has one, else everyone's; a reader without a name sees everyone's. A condition shows dry marks of the kinds it has none of.
 */
export function marksFor(
  marks: readonly MarkView[],
  reader: PersonId | null,
  condition: ConditionId,
  conditions: readonly ConditionView[],
): ReadMark[] {
  const dry = conditions.find((one) => one.kind === 'dry')?.id
  const own = ofReader(
    marks.filter((mark) => mark.condition === condition),
    reader,
  )
  if (dry === undefined || dry === condition) return own.sort(inRoadOrder).map((mark) => ({ mark, inherited: false }))
  const taken = new Set(own.map(kindKey))
  const inherited = ofReader(
    marks.filter((mark) => mark.condition === dry),
    reader,
  ).filter((mark) => !taken.has(kindKey(mark)))
  return [
    ...own.map((mark) => ({ mark, inherited: false })),
    ...inherited.map((mark) => ({ mark, inherited: true })),
  ].sort((a, b) => inRoadOrder(a.mark, b.mark))
}

const kindKey = (mark: MarkView) => `${mark.kind} ${mark.role ?? ''}`

function ofReader(marks: readonly MarkView[], reader: PersonId | null): MarkView[] {
  const mine = marks.filter((mark) => mark.forPerson !== null && mark.forPerson === reader)
  const kinds = new Set(mine.map(kindKey))
  return [...mine, ...marks.filter((mark) => mark.forPerson === null && !kinds.has(kindKey(mark)))]
}

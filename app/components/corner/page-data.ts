import type { Actor } from '~/book/actions'
import type { CornerCut } from '~/book/cuts'
import { type MarkLine, markLines } from '~/book/distances'
import { drivenDistance } from '~/book/driven-line'
import type { ConditionId, MarkId, OperationId, PersonId } from '~/book/ids'
import { marksFor } from '~/book/marks-for'
import { may } from '~/book/may'
import type { GroundChoice } from '~/book/view'
import type { LayoutFrame } from '~/track/layout-frame'

/** What the corner page is given: the cut of the book, how it is looked at, and what this person may do. */
export interface CornerPageData {
  team: string
  cut: CornerCut
  lines: LineData[]
  show: GroundChoice
  condition: ConditionId
  me: PersonId
  names: Record<string, string>
  may: { add: boolean; changeOthers: boolean; decide: boolean }
  changes: ChangeData[]
  proposals: ProposalData[]
  /** Fresh ids for the page's forms: what is sent twice is done once. */
  ids: { operation: string; mark: string }
}

/** A line of the table; its mark stands in the cut. */
export type LineData = Omit<MarkLine, 'mark' | 'place' | 'other'> & { mark: MarkId }

/** A change of this corner's marks, for the list that takes it back. */
export interface ChangeData {
  operation: OperationId
  by: PersonId | null
  words: string
  mayUndo: boolean
}

export interface ProposalData {
  id: string
  by: PersonId
  words: string
  reason: string | null
}

interface Sources
  extends Pick<CornerPageData, 'team' | 'cut' | 'names' | 'ids' | 'show' | 'condition' | 'changes' | 'proposals'> {
  actor: Extract<Actor, { kind: 'person' }>
  frame: LayoutFrame
}

/** The page of one person looking at one corner in one way. */
export function cornerPageData({ actor, frame, ...rest }: Sources): CornerPageData {
  const { cut, show, condition } = rest
  const facts = { archived: cut.book.archived }
  const read = marksFor(cut.corner.marks, actor.person, condition, cut.conditions)
  const lines = markLines(read, show, drivenDistance(frame), cut.car.length)
  return {
    ...rest,
    lines: lines.map(({ mark, place: _place, other: _other, ...line }) => ({ ...line, mark: mark.id })),
    me: actor.person,
    may: {
      add: may(actor, 'mark.add', facts).ok,
      changeOthers: may(actor, 'mark.change', { ...facts, madeBy: null }).ok,
      decide: may(actor, 'proposal.decide', facts).ok,
    },
  }
}

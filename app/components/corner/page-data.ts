import type { Actor } from '~/book/actions'
import { type LoggedChange, tellChanges } from '~/book/changes'
import type { CornerCut } from '~/book/cuts'
import { type MarkLine, markLines } from '~/book/distances'
import { drivenDistance } from '~/book/driven-line'
import type { ConditionId, MarkId, OperationId, PersonId } from '~/book/ids'
import { marksFor } from '~/book/marks-for'
import { may } from '~/book/may'
import type { Operation } from '~/book/operation'
import type { BookView, GroundChoice } from '~/book/view'
import type { LayoutFrame } from '~/track/layout-frame'
import { changeWords } from '~/words/changes'

/** What the corner page is given: the cut of the book, how it is looked at, and what this person may do. */
export interface CornerPageData {
  team: string
  cut: CornerCut
  lines: LineData[]
  show: GroundChoice
  condition: ConditionId
  me: PersonId
  names: Record<string, string>
  may: { add: boolean; decide: boolean }
  changes: ChangeData[]
  proposals: ProposalData[]
  /** Fresh ids for the page's forms: what is sent twice is done once. */
  ids: { operation: string; mark: string }
  /** Width in px that the server draws the map for; the browser draws again for its own. */
  sheet: number
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
  id: OperationId
  by: PersonId | null
  words: string
}

type PersonActor = Extract<Actor, { kind: 'person' }>

type Logged = LoggedChange & { madeBy: PersonId | null }

/** Lines of the change log as this person may take them back. */
export function changeData(actor: PersonActor, view: BookView, logged: readonly Logged[]): ChangeData[] {
  const lines = new Map(logged.map((change) => [change.operation, change]))
  return tellChanges(logged, view).map((told) => {
    const line = lines.get(told.operation)
    const action = line?.target.kind === 'card' ? 'card.change' : 'mark.change'
    const facts = { archived: view.book.archived, madeBy: line?.madeBy ?? null }
    // What was made together is taken back together, and may reach beyond this corner: not from here.
    const mayUndo = !line?.batch && may(actor, action, facts).ok
    return { operation: told.operation, by: told.by, words: changeWords(told), mayUndo }
  })
}

interface Waiting {
  id: OperationId
  by: PersonId | null
  operation: Operation
}

/** What waits for the coach in this corner. */
export function proposalData(view: BookView, waiting: readonly Waiting[]): ProposalData[] {
  const logged = waiting.map(({ id, by, operation }) => ({
    operation: id,
    target: operation.target,
    set: operation.set,
    reason: operation.reason ?? null,
    undoes: operation.undoes ?? null,
    batch: null,
    by,
  }))
  return tellChanges(logged, view).map((told) => ({ id: told.operation, by: told.by, words: changeWords(told) }))
}

interface Sources
  extends Pick<
    CornerPageData,
    'team' | 'cut' | 'names' | 'ids' | 'sheet' | 'show' | 'condition' | 'changes' | 'proposals'
  > {
  actor: PersonActor
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
      decide: may(actor, 'proposal.decide', facts).ok,
    },
  }
}

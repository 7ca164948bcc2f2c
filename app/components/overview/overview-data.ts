import type { Overview } from '~/book/cuts'
import type { ConditionId } from '~/book/ids'
import type { Missing } from '~/book/missing'
import type { ConditionView } from '~/book/view'
import type { ChangeLine } from './change-list'

/** What the overview of a book is given. */
export interface OverviewData {
  /** The team's slug. */
  team: string
  overview: Overview
  conditions: ConditionView[]
  condition: ConditionId
  /** Query of the address that keeps the condition on the way into a corner; empty in the dry. */
  search: string
  missing: Missing[]
  changes: ChangeLine[]
  may: { addMarks: boolean }
  /** Width in px that the server draws for; the browser draws again for its own. */
  sheet: number
}

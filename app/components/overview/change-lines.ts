import { type LoggedChange, type ToldChange, tellChanges } from '~/book/changes'
import type { PersonId } from '~/book/ids'
import type { BookView } from '~/book/view'
import { changeWords } from '~/words/changes'
import type { ChangeLine } from './change-list'

/** A line of a log; `at` is the order of writing. */
type LogLine = LoggedChange & { at: number }

/** A log's latest lines, and whether it goes on before them. */
export interface LogPage {
  changes: readonly LogLine[]
  goesOn: boolean
}

/** The latest changes of several logs as the overview's list shows them, latest first. */
export function changeLines(
  logs: readonly LogPage[],
  view: BookView,
  names: ReadonlyMap<PersonId, string>,
  most: number,
): ChangeLine[] {
  const order = new Map(logs.flatMap(({ changes }) => changes.map(({ operation, at }) => [operation, at] as const)))
  const writtenAt = ({ operation }: ToldChange) => order.get(operation) ?? 0
  const told = logs.flatMap(({ changes, goesOn }) => tellChanges(goesOn ? withoutCutOff(changes) : changes, view))
  return told
    .sort((a, b) => writtenAt(b) - writtenAt(a))
    .slice(0, most)
    .map((change) => ({
      id: change.operation,
      corner: change.corner,
      mark: markOf(change),
      words: changeWords(change),
      who: change.by && firstName(names.get(change.by)),
    }))
}

/** Without the changes made together of which the log's page shows a part only. */
const withoutCutOff = (changes: readonly LogLine[]) => {
  const batch = changes.at(-1)?.batch ?? null
  return batch === null ? changes : changes.filter((change) => change.batch !== batch)
}

/** The mark to show beside the words: of several, none. */
function markOf({ thing, count }: ToldChange): ChangeLine['mark'] {
  return thing.kind === 'mark' && count === 1 ? { kind: thing.mark, role: thing.role, gear: thing.gear } : null
}

const firstName = (name: string | undefined) => name?.split(' ')[0] ?? null

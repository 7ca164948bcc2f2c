import { type LoggedChange, tellChanges } from '~/book/changes'
import type { PersonId } from '~/book/ids'
import type { BookView } from '~/book/view'
import { changeWords } from '~/words/changes'
import type { ChangeLine } from './change-list'

/** Changes as the overview's list shows them, in the order given. */
export function changeLines(
  changes: readonly LoggedChange[],
  view: BookView,
  names: ReadonlyMap<PersonId, string>,
): ChangeLine[] {
  return tellChanges(changes, view).map((told) => ({
    id: told.operation,
    corner: told.corner,
    mark: told.thing.kind === 'mark' ? { kind: told.thing.mark, role: told.thing.role, gear: told.thing.gear } : null,
    words: changeWords(told),
    who: told.by && firstName(names.get(told.by)),
  }))
}

const firstName = (name: string | undefined) => name?.split(' ')[0] ?? null

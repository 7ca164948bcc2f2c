import { describe, expect, it } from 'vitest'
import { assembleBookView } from '~/book/assemble'
import type { LoggedChange } from '~/book/changes'
import type { OperationId, PersonId } from '~/book/ids'
import { bookRows, ids, mark, place } from '../../../tests/support/book-rows'
import { changeLines } from './change-lines'

const view = assembleBookView(
  bookRows({
    marks: [
      mark({ id: 'm-brake', kind: 'brake', role: 'target', real: place(360, 4) }),
      mark({ id: 'm-apex', kind: 'apex', real: place(505, 3) }),
    ],
  }),
)
const names = new Map<PersonId, string>([[ids.driver, 'Ilse Brandt']])

const dropped = (at: number, id: string, batch: string | null = null): LoggedChange & { at: number } => ({
  at,
  operation: `operation-${at}` as OperationId,
  target: { kind: 'mark', id },
  set: { state: { from: 'live', to: 'dropped' } },
  reason: null,
  undoes: null,
  batch,
  by: ids.driver,
})

const told = (logs: Parameters<typeof changeLines>[0], most = 9) =>
  changeLines(logs, view, names, most).map(({ id }) => id)

describe('lines of change', () => {
  it('come from several logs in the order of writing, as many as asked for', () => {
    const logs = [
      { changes: [dropped(9, 'm-brake'), dropped(4, 'm-apex')], goesOn: false },
      { changes: [dropped(6, 'm-apex')], goesOn: false },
    ]
    expect(told(logs)).toEqual(['operation-9', 'operation-6', 'operation-4'])
    expect(told(logs, 2)).toEqual(['operation-9', 'operation-6'])
  })

  it('leave out changes made together of which only a part was read', () => {
    const changes = [dropped(9, 'm-brake'), dropped(8, 'm-apex', 'b'), dropped(7, 'm-brake', 'b')]
    expect(told([{ changes, goesOn: true }])).toEqual(['operation-9'])
    expect(told([{ changes, goesOn: false }])).toEqual(['operation-9', 'operation-8'])
  })

  it('name who did it by the first name, and show the mark of a single one', () => {
    const [line] = changeLines([{ changes: [dropped(9, 'm-brake')], goesOn: false }], view, names, 9)
    expect(line).toMatchObject({
      who: 'Ilse',
      corner: { number: '1' },
      mark: { kind: 'brake', role: 'target' },
      words: 'build to taken off',
    })
  })
})

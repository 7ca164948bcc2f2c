import { expect, test } from 'vitest'
import { along } from '~/track/units'
import type { LayoutId, OperationId } from './ids'
import { moveStart, renameCorners, reverseLayout } from './layout-edits'

let made = 0
const making = {
  layout: 'layout' as LayoutId,
  madeAt: '2026-10-09T08:00:00Z',
  newId: () => `operation-${++made}` as OperationId,
}

test('only what was typed anew is part of an operation, and it starts from what was shown', () => {
  const operations = renameCorners(making, [
    { id: 'a', number: '1', name: 'Saltmarsh', seenNumber: '1', seenName: 'Saltmarsh' },
    { id: 'b', number: '2A', name: 'Groyne', seenNumber: '2', seenName: 'Groyne' },
    { id: 'c', number: '3', name: 'Lookout', seenNumber: '3', seenName: 'Turn 3' },
  ])
  expect(operations.map(({ target, set }) => ({ id: target.id, set }))).toEqual([
    { id: 'b', set: { number: { from: '2', to: '2A' } } },
    { id: 'c', set: { name: { from: 'Turn 3', to: 'Lookout' } } },
  ])
  expect(new Set(operations.map(({ id }) => id)).size).toBe(2)
})
test('driving the other way starts from the direction shown', () => {
  expect(reverseLayout(making, true).set).toEqual({ reversed: { from: true, to: false } })
})
test('a start line moved starts from where it was shown, both to the millimetre', () => {
  const operation = moveStart(making, along(40.12345), along(65.00049))
  expect(operation.target).toEqual({ kind: 'layout', id: 'layout' })
  expect(operation.set).toEqual({ startAlong: { from: 40.123, to: 65 } })
})

import { expect, test } from 'vitest'
import type { LayoutId, OperationId } from '~/book/ids'
import { makeCentreline } from '~/track/centreline'
import { makeFrame } from '~/track/layout-frame'
import { along, degrees, metres, type Position, station } from '~/track/units'
import { layoutAsk } from './layout-ask'

const ring: Position[] = [
  [-31.2, 42.6],
  [-31.195, 42.6005],
  [-31.1945, 42.604],
  [-31.2005, 42.6035],
]
const line = makeCentreline(ring)
const id = '01990000-0000-7000-8000-000000000001' as LayoutId
const corner = {
  id: '01990000-0000-7000-8000-00000000000a',
  number: '4',
  name: 'Kelp',
  direction: 'left' as const,
  turnDegrees: degrees(80),
  leastRadius: metres(33),
  entry: station(300),
  apex: station(340),
}
const shown = (startAlong: number, reversed: boolean) => ({
  layout: { id, startAlong, reversed },
  frame: makeFrame(line, { startAlong: along(startAlong), reversed }),
  corners: [corner],
})
const clock = { madeAt: '2026-10-09T08:00:00Z', newId: () => 'operation' as OperationId }

const form = (fields: Record<string, string>) => {
  const data = new FormData()
  for (const [name, value] of Object.entries(fields)) data.set(name, value)
  return data
}
const startOf = (ask: ReturnType<typeof layoutAsk>) =>
  ask.kind === 'change' ? ask.operations[0]?.set.startAlong : undefined

test('metres before the start line go back in the direction driven', () => {
  const fields = { intent: 'start', seenStart: '40', startMetres: '25', startWay: 'back', startFrom: '' }
  expect(startOf(layoutAsk(form({ ...fields, seenReversed: 'false' }), shown(40, false), clock))?.to).toBe(15)
  expect(startOf(layoutAsk(form({ ...fields, seenReversed: 'true' }), shown(40, true), clock))?.to).toBe(65)
})
test('metres after a corner count from its entry', () => {
  const fields = { intent: 'start', seenStart: '40', seenReversed: 'false', startMetres: '12,5', startWay: 'ahead' }
  const ask = layoutAsk(form({ ...fields, startFrom: corner.id }), shown(40, false), clock)
  expect(startOf(ask)).toEqual({ from: 40, to: 352.5 })
})
test('the start line is moved from where the page showed it, whatever another made of it meanwhile', () => {
  const fields = { intent: 'start', seenStart: '40', seenReversed: 'false', startMetres: '100', startWay: 'ahead' }
  expect(startOf(layoutAsk(form({ ...fields, startFrom: '' }), shown(90, false), clock))).toEqual({ from: 40, to: 140 })
})
test('a start line further off than a lap is told so at its field', () => {
  const fields = { intent: 'start', seenStart: '40', seenReversed: 'false', startMetres: '9999', startWay: 'back' }
  const ask = layoutAsk(form(fields), shown(40, false), clock)
  expect(ask.kind).toBe('wrong')
  expect(ask.kind === 'wrong' && ask.submission.reply().error?.startMetres?.[0]).toMatch(/^The lap is /)
})
test('the corner whose change by another stands is left out', () => {
  const row = { id: corner.id, number: '4', name: 'Kelp bank', seenNumber: '4', seenName: 'Kelp' }
  const fields = Object.fromEntries(Object.entries(row).map(([name, value]) => [`corners[0].${name}`, value]))
  const kept = layoutAsk(form(fields), shown(40, false), clock)
  expect(kept.kind === 'change' && kept.operations).toHaveLength(1)
  const skipped = layoutAsk(form({ ...fields, skip: corner.id }), shown(40, false), clock)
  expect(skipped.kind === 'change' && skipped.operations).toHaveLength(0)
})

import { describe, expect, it } from 'vitest'
import type { ConditionId } from './ids'
import { conditionParam, lookAt } from './look'
import type { ConditionView } from './view'

const condition = (id: string, kind: ConditionView['kind']): ConditionView => ({
  id: id as ConditionId,
  kind,
  name: id,
})
const night = condition('c-night', 'night')
const dry = condition('c-dry', 'dry')
const wet = condition('c-wet', 'wet')
const rain = condition('c-rain', 'other')
const dusk = condition('c-dusk', 'other')
const all = [night, dry, wet, rain, dusk]
const chosen = (asked: string | null) => lookAt(all, { condition: asked, show: null }).condition

describe('how a book is looked at', () => {
  it('a condition is named by its kind, or by its id where several are of one kind', () => {
    expect(all.map((one) => conditionParam(all, one))).toEqual(['night', 'dry', 'wet', 'c-rain', 'c-dusk'])
  })

  it('what names a condition finds it', () => {
    for (const one of all) expect(chosen(conditionParam(all, one))).toBe(one.id)
    expect(chosen('c-wet')).toBe('c-wet')
  })

  it('nothing asked, or an unknown word, is the dry one with both places', () => {
    expect(lookAt(all, { condition: null, show: null })).toEqual({ condition: 'c-dry', show: 'both' })
    expect(lookAt(all, { condition: 'snow', show: 'sky' })).toEqual({ condition: 'c-dry', show: 'both' })
    expect(lookAt([night, wet], { condition: null, show: 'sim' })).toEqual({ condition: 'c-night', show: 'sim' })
  })
})

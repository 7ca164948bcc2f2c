import { describe, expect, it } from 'vitest'
import { conditionFrom, conditionParam } from './conditions'
import type { ConditionId } from './ids'
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

describe('the condition in an address', () => {
  it('is named by its kind, or by its id where several are of one kind', () => {
    expect(all.map((one) => conditionParam(all, one))).toEqual(['night', 'dry', 'wet', 'c-rain', 'c-dusk'])
  })

  it('is found by what names it', () => {
    for (const one of all) expect(conditionFrom(all, conditionParam(all, one))).toBe(one)
    expect(conditionFrom(all, 'c-wet')).toBe(wet)
  })

  it('is the dry one where none or an unknown one is named, the first where none is dry', () => {
    expect(conditionFrom(all, null)).toBe(dry)
    expect(conditionFrom(all, 'other')).toBe(dry)
    expect(conditionFrom([night, wet], 'snow')).toBe(night)
    expect(conditionFrom([], null)).toBeNull()
  })
})

import { describe, expect, it } from 'vitest'
import { knownHeights, resolutionOf, withoutSpikes } from '~/track/height-cleaning'

const ringOf = (heights: readonly number[], step: number) =>
  Float64Array.from({ length: heights.length + 1 }, (_, i) => i * step)
const slope = Array.from({ length: 60 }, (_, i) => 40 + 6 * Math.sin((2 * Math.PI * i) / 60))

describe('heights that are missing', () => {
  it('are those not given, voids, and 0 among others', () => {
    expect([...knownHeights([12.5, undefined, 0, -32768, -9999, -3.5, Number.NaN, 65535])]).toEqual([
      12.5,
      Number.NaN,
      Number.NaN,
      Number.NaN,
      Number.NaN,
      -3.5,
      Number.NaN,
      Number.NaN,
    ])
  })

  it('are all of them where every height is 0', () => {
    expect(knownHeights([0, 0, 0]).every(Number.isNaN)).toBe(true)
  })
})

describe('a spike', () => {
  it('is left out alone: its neighbours stay', () => {
    const spiked = Float64Array.from(slope)
    spiked[20]! += 35
    spiked[44]! -= 18
    const cleaned = withoutSpikes(ringOf(slope, 10), spiked)
    expect(Array.from(cleaned.keys()).filter((i) => Number.isNaN(cleaned[i]!))).toEqual([20, 44])
  })

  it('is found at the first and at the last position too', () => {
    const spiked = Float64Array.from(slope)
    spiked[0]! += 25
    spiked[59]! -= 30
    const cleaned = withoutSpikes(ringOf(slope, 10), spiked)
    expect([cleaned[0], cleaned[59]]).toEqual([Number.NaN, Number.NaN])
  })

  it('is not what a crest or a whole-metre step looks like', () => {
    const crest = Float64Array.from({ length: 40 }, (_, i) => 50 - Math.abs(i - 20) * 1.8)
    expect([...withoutSpikes(ringOf([...crest], 15), crest)]).toEqual([...crest])
    const steps = Float64Array.from(slope, Math.round)
    expect([...withoutSpikes(ringOf(slope, 2), steps)]).toEqual([...steps])
  })
})

describe('the resolution', () => {
  it('is the step in which the heights come', () => {
    expect(resolutionOf(Float64Array.of(12, 13, 15, 12, 18))).toBe(1)
    expect(resolutionOf(Float64Array.of(12.5, 13, 15, 12, 18))).toBe(0.5)
    expect(resolutionOf(Float64Array.of(7.83, 7.35, 6.73))).toBe(0.01)
    expect(resolutionOf(Float64Array.of(1.23456, 7.3511, 6.73))).toBe(0.001)
    expect(resolutionOf(Float64Array.of(110, 130, 120, 160))).toBe(10)
  })

  it('is seen through an even shift, as from one height datum to another, and past missing heights', () => {
    expect(resolutionOf(Float64Array.of(58.937, 59.937, Number.NaN, 61.937))).toBe(1)
  })

  it('of a flat road is that of its height', () => {
    expect(resolutionOf(Float64Array.of(12.3, 12.3, 12.3))).toBe(0.1)
  })
})

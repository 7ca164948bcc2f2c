import { describe, expect, it } from 'vitest'
import { metres, offset } from '~/track/units'
import { acrossWords } from './corner'

const across = (side: number) => acrossWords(offset(side), metres(12), metres(2))

describe('where across the road', () => {
  it('is told from the edge that the wheels are nearest to, on a road of 12 m with a car of 2 m', () => {
    expect(across(4.9)).toBe('left wheels on the line')
    expect(across(-4.5)).toBe('half a car off right edge')
    expect(across(3.8)).toBe('car’s width off left edge')
    expect(across(-2)).toBe('right of the middle')
    expect(across(0.4)).toBe('middle of the road')
    expect(across(-5.6)).toBe('right wheels over the right edge')
    expect(across(7.5)).toBe('beyond the left edge')
  })

  it('never names a side the car is not on', () => {
    for (let side = 0.8; side < 9; side += 0.1) {
      expect(across(side)).not.toContain('right')
      expect(across(-side)).not.toContain('left')
    }
  })
})

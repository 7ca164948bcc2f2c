import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { eachShape, type RectShape } from '~/draw/display-list'
import type { HeightNote } from '~/draw/height-notes'
import { lapHeights } from '~/draw/lap-heights'
import { overlap } from '~/draw/lines'
import { spread } from '~/draw/spread'
import { textWidth } from '~/draw/text-styles'
import { drawnCorners, drawnRoad } from '../../tests/support/drawings'

const said: HeightNote[] = []
const words = {
  metres: (value: number) => `${Math.round(value)} m`,
  lap: 'one lap',
  note: (note: HeightNote) => {
    said.push(note)
    return `${note.code} ${Math.round(note.height)} m`
  },
}
const road = drawnRoad()
const corners = drawnCorners(road)
const draw = (width: number, height: number) => lapHeights({ road, corners, width, height, words })!
const plates = (width: number) =>
  [...eachShape(draw(width, 190).shapes)].filter((shape): shape is RectShape => shape.style === 'plate')

describe('the heights of a lap', () => {
  it('are not drawn where the layout has none', () => {
    expect(lapHeights({ road: drawnRoad({ heights: false }), corners, width: 956, height: 191, words })).toBeNull()
  })

  it.each([956, 640, 390, 340])('show every corner on the axis, no plate on another (%s px)', (width) => {
    const boxes = plates(width)
    expect(boxes).toHaveLength(corners.length)
    boxes.forEach((box, i) => {
      for (const other of boxes.slice(i + 1)) expect(overlap(box, other)).toBe(false)
    })
  })

  it('set no note on another', () => {
    const notes = [...eachShape(draw(956, 191).shapes)].flatMap((shape) =>
      shape.type === 'text' && /^(crest|profile)-note$/.test(shape.style) ? [shape] : [],
    )
    expect(notes.length).toBeGreaterThan(1)
    const boxes = notes.map(({ x, y, words: text, style, size }) => ({
      x,
      y: y - size * 0.85,
      width: textWidth(text, style, size),
      height: size,
    }))
    boxes.forEach((box, i) => {
      for (const other of boxes.slice(i + 1)) expect(overlap(box, other)).toBe(false)
    })
  })

  it('tell the highest and the lowest height as they are', () => {
    draw(956, 191)
    const heightOf = (code: HeightNote['code']) => said.find((note) => note.code === code)!.height
    // 31 m and 17 m above and below it, smoothed over 80 m.
    expect(heightOf('crest')).toBeGreaterThan(47.5)
    expect(heightOf('crest')).toBeLessThanOrEqual(48.01)
    expect(heightOf('lowest')).toBeGreaterThanOrEqual(13.99)
    expect(heightOf('lowest')).toBeLessThan(14.5)
  })

  it('end at the height they began with', () => {
    const profile = [...eachShape(draw(956, 191).shapes)].find(({ style }) => style === 'profile-line')!
    if (profile.type !== 'path') throw new Error('a profile is a path')
    const heights = [...profile.d.matchAll(/[ML]\S+ ([-\d.]+)/g)].map(([, y]) => Number(y))
    expect(heights.at(-1)).toBe(heights[0])
  })
})

describe('boxes spread along a line', () => {
  const boxes = fc.array(fc.tuple(fc.double({ min: 0, max: 500, noNaN: true }), fc.integer({ min: 5, max: 30 })), {
    minLength: 1,
    maxLength: 15,
  })

  it('never overlap, keep their order and stay in a room that holds them', () => {
    fc.assert(
      fc.property(boxes, (some) => {
        const sorted = [...some].sort((a, b) => a[0] - b[0])
        const widths = sorted.map(([, width]) => width)
        const middles = spread(
          sorted.map(([wanted]) => wanted),
          widths,
          0,
          500,
        )
        for (const [i, middle] of middles.entries()) {
          expect(middle - widths[i]! / 2).toBeGreaterThanOrEqual(-1e-9)
          expect(middle + widths[i]! / 2).toBeLessThanOrEqual(500 + 1e-9)
          if (i > 0) expect(middle - middles[i - 1]!).toBeGreaterThanOrEqual((widths[i]! + widths[i - 1]!) / 2 - 1e-9)
        }
      }),
    )
  })

  it('stay where they want to be while there is room', () => {
    expect(spread([20, 61, 140], [22, 30, 22], 0, 200)).toEqual([20, 61, 140])
  })
})

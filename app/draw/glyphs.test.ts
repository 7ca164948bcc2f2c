import { describe, expect, it } from 'vitest'
import { GLYPH_BOX, GLYPH_FORMS, GLYPH_KINDS, GLYPH_LEAST, GLYPH_SIZES, glyphKind, glyphParts } from '~/draw/glyphs'

/** Corners of an outline: the ends of its commands, near enough for its size. */
function extent(outline: string): { width: number; height: number } {
  const xs: number[] = []
  const ys: number[] = []
  let [x, y] = [0, 0]
  for (const [, command, rest] of outline.matchAll(/([MLHVAQZ])([^MLHVAQZ]*)/g)) {
    const numbers = (rest!.match(/-?\d*\.?\d+/g) ?? []).map(Number)
    if (command === 'H') x = numbers.at(-1)!
    else if (command === 'V') y = numbers.at(-1)!
    else if (numbers.length > 1) {
      if (command === 'A') ys.push(y - numbers[1]!, y)
      if (command === 'Q') ys.push((y + numbers[1]!) / 2)
      for (let i = 0; command !== 'A' && i + 1 < numbers.length - 2; i += 2) xs.push(numbers[i]!)
      ;[x, y] = numbers.slice(-2) as [number, number]
    }
    xs.push(x)
    ys.push(y)
  }
  return { width: Math.max(...xs) - Math.min(...xs), height: Math.max(...ys) - Math.min(...ys) }
}

const all = GLYPH_KINDS.flatMap((kind) => GLYPH_FORMS.map((form) => ({ kind, form, parts: glyphParts(kind, form) })))

describe('a mark’s glyph', () => {
  it('is drawn no smaller than 13 px anywhere', () => {
    for (const { real, sim } of Object.values(GLYPH_SIZES)) {
      expect(Math.min(real, sim)).toBeGreaterThanOrEqual(GLYPH_LEAST)
      expect(sim).toBeLessThanOrEqual(real)
    }
  })

  it.each(GLYPH_KINDS)('fills its box from side to side (%s)', (kind) => {
    const { width, height } = extent(glyphParts(kind, 'told').outline)
    expect(Math.max(width, height)).toBeGreaterThan(0.6 * GLYPH_BOX)
    expect(width).toBeLessThanOrEqual(GLYPH_BOX)
    expect(height).toBeLessThanOrEqual(GLYPH_BOX)
  })

  it('has an outline of its own for every kind', () => {
    expect(new Set(all.map(({ parts }) => parts.outline)).size).toBe(GLYPH_KINDS.length)
  })

  it('tells its form by filling, dash and bar, each pair apart', () => {
    for (const kind of GLYPH_KINDS) {
      const signs = GLYPH_FORMS.map((form) => {
        const { filled, dashed, bar } = glyphParts(kind, form)
        return `${filled} ${dashed} ${bar}`
      })
      expect(signs).toEqual(['false false false', 'true false false', 'true false true', 'false true false'])
    }
  })

  it('turns where it shows the way of travel, and only there', () => {
    const turning = GLYPH_KINDS.filter((kind) => glyphParts(kind, 'seen').turns)
    expect(turning).toEqual(['brakestart', 'brake', 'turnin', 'release', 'throttle', 'full'])
  })

  it('has a shape of its own for the brake of the first laps', () => {
    expect(glyphKind('brake', 'start')).toBe('brakestart')
    expect(glyphKind('brake', 'target')).toBe('brake')
    expect(glyphKind('brake', null)).toBe('brake')
    expect(glyphKind('full', null)).toBe('full')
  })
})

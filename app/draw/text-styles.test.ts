import { describe, expect, it } from 'vitest'
import { TEXT_FACES, type TextStyle, textSize, textWidth } from '~/draw/text-styles'

/** Widths in px as Chromium sets Encode Sans Variable 5.3.0 with tabular figures. */
const measured: [TextStyle, string, number][] = [
  ['corner-name', 'Breakwater Out', 103.7],
  ['corner-name', 'Limpet', 45.6],
  ['plate-number', '13', 15.9],
  ['sheet-title', 'Marram Head Circuit', 238],
  ['sheet-text', '4.12 km, 13 corners, clockwise', 180.2],
  ['mark-figure', '133 before', 59.8],
  ['name-brake', 'Brake first', 64.6],
  ['water-name', 'Marram Bay', 125.3],
  ['scale-figure', '200 m', 31.6],
  ['thing-name', 'Light panel 4', 62.7],
  ['profile-note', 'down 27 m to Slipway', 116.2],
  ['board-text', '100', 21.1],
  ['warning-text', 'gap 38 m', 53.8],
]

describe('the width of set words', () => {
  it.each(measured)('is reckoned within 4 %% and not under 99 %% of what is set (%s, %s)', (style, words, width) => {
    const reckoned = textWidth(words, style)
    expect(reckoned).toBeGreaterThan(0.99 * width)
    expect(reckoned).toBeLessThan(1.04 * width)
  })

  it('counts a blank of any kind as a space, and a strange letter as a wide one', () => {
    expect(textWidth('9 m', 'mark-figure')).toBe(textWidth('9\u00a0m', 'mark-figure'))
    expect(textWidth('Ø', 'mark-figure')).toBeGreaterThan(textWidth('n', 'mark-figure'))
  })
})

describe('the size of words', () => {
  it('is never under 12 px, on a phone never under 14', () => {
    for (const style of Object.keys(TEXT_FACES) as TextStyle[]) {
      expect(textSize(style, 'desk')).toBeGreaterThanOrEqual(12)
      expect(textSize(style, 'phone')).toBeGreaterThanOrEqual(14)
    }
  })
})

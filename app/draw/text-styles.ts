import { MARK_KINDS, type MarkKind } from '~/book/kinds'

/** Size in px at desk size, weight, width in percent of the normal face, tracking in em. */
export interface TextFace {
  size: number
  weight: number
  stretch: number
  tracking?: number
}

const FACES = {
  'plate-number': { size: 13.5, weight: 720, stretch: 82 },
  'plate-open-number': { size: 13.5, weight: 720, stretch: 82 },
  'corner-name': { size: 14, weight: 600, stretch: 100 },
  'place-name': { size: 12.5, weight: 520, stretch: 82 },
  'water-name': { size: 17, weight: 480, stretch: 125, tracking: 0.12 },
  'sheet-title': { size: 22, weight: 740, stretch: 120, tracking: -0.01 },
  'sheet-text': { size: 13, weight: 480, stretch: 100 },
  'sheet-note': { size: 12, weight: 430, stretch: 82 },
  'scale-figure': { size: 12, weight: 430, stretch: 82 },
  'axis-figure': { size: 12, weight: 430, stretch: 82 },
  'axis-zero': { size: 12, weight: 700, stretch: 82 },
  'profile-note': { size: 12.5, weight: 560, stretch: 82 },
  'crest-note': { size: 12.5, weight: 620, stretch: 82 },
  'mark-figure': { size: 13, weight: 560, stretch: 82 },
  'board-text': { size: 12, weight: 700, stretch: 82 },
  'thing-name': { size: 12, weight: 430, stretch: 82 },
  'warning-text': { size: 13, weight: 620, stretch: 90 },
  'gear-digit': { size: 13.5, weight: 760, stretch: 82 },
} as const satisfies Record<string, TextFace>

const MARK_NAME: TextFace = { size: 13, weight: 680, stretch: 100 }

export type TextStyle = keyof typeof FACES | `name-${MarkKind}`

/** Every text style with its face. `name-brake` and its like are a mark's name in the colour of its kind. */
export const TEXT_FACES = {
  ...FACES,
  ...Object.fromEntries(MARK_KINDS.map((kind) => [`name-${kind}`, MARK_NAME])),
} as Record<TextStyle, TextFace>

/** Who reads: nothing is set under 14 px on a phone. */
export type Reader = 'desk' | 'phone'
const PHONE_LEAST = 14

/** Size in px for a reader. */
export function textSize(style: TextStyle, reader: Reader): number {
  const { size } = TEXT_FACES[style]
  return reader === 'phone' ? Math.max(size, PHONE_LEAST) : size
}

/**
 * Advance widths of the printable ASCII characters from the space on, in hundredths of an em, of the house face at weight
 * 600 and normal width. Figures are tabular.
 */
const ADVANCES = [
  25, 28, 31, 61, 61, 61, 78, 31, 35, 35, 49, 61, 31, 44, 31, 61, 61, 61, 61, 61, 61, 61, 61, 61, 61, 61, 31, 31, 61,
  61, 61, 48, 101, 70, 65, 59, 73, 61, 59, 70, 75, 28, 28, 65, 56, 92, 76, 76, 64, 76, 68, 56, 64, 73, 70, 111, 67, 62,
  60, 35, 36, 35, 61, 61, 55, 54, 59, 46, 60, 54, 35, 60, 60, 26, 26, 56, 26, 88, 60, 59, 60, 60, 39, 48, 37, 59, 56,
  88, 54, 56, 49, 37, 61, 37, 61,
]
const WIDEST_LETTER = 76

/** How much wider than weight 600 at normal width a face sets, from the same measurement. */
function faceFactor({ weight, stretch }: TextFace): number {
  const byWeight = 1 + (weight - 600) * 0.0003
  const byStretch = stretch < 100 ? 1 - (100 - stretch) * 0.0049 : 1 + (stretch - 100) * 0.0052
  return byWeight * byStretch
}

/**
 * Width of set words in px, within 5 % and on the wide side. Characters outside ASCII count as a wide letter, blanks of
 * every kind as a space.
 */
export function textWidth(words: string, style: TextStyle, size = TEXT_FACES[style].size): number {
  const face = TEXT_FACES[style]
  let hundredths = 0
  for (const letter of words) {
    const code = letter.codePointAt(0)!
    hundredths += ADVANCES[code - 32] ?? (/\s/.test(letter) ? ADVANCES[0]! : WIDEST_LETTER)
  }
  const tracking = Math.max(face.tracking ?? 0, 0) * [...words].length
  return size * ((hundredths / 100) * faceFactor(face) * 1.02 + tracking)
}

import type { BrakeRole, MarkKind } from '~/book/kinds'

/**
 * Mark glyphs as outlines in a 24 box, drawn for travel up the picture and a corner to the right. `brakestart` is the
 * brake mark of the first laps, `brake` the one to build to.
 */
export const GLYPH_KINDS = [
  'look',
  'brakestart',
  'brake',
  'lift',
  'gear',
  'turnin',
  'release',
  'apex',
  'throttle',
  'full',
  'trackout',
] as const
export type GlyphKind = (typeof GLYPH_KINDS)[number]

/** Hollow with a solid line, filled, filled over a bar, hollow and dashed. */
export const GLYPH_FORMS = ['told', 'seen', 'driven', 'sim'] as const
export type GlyphForm = (typeof GLYPH_FORMS)[number]

export const GLYPH_BOX = 24
/** Nothing is drawn smaller. */
export const GLYPH_LEAST = 13
/** Side of the box in px; a simulator's mark is a little smaller. */
export const GLYPH_SIZES = {
  map: { real: 15, sim: 13 },
  table: { real: 18, sim: 15 },
  strip: { real: 19, sim: 17 },
  sheet: { real: 19, sim: 16 },
  phone: { real: 22, sim: 19 },
  button: { real: 30, sim: 30 },
} as const

const OUTLINES: Record<GlyphKind, string> = {
  brakestart: 'M1.5 4.5H22.5V10H15.8V22H8.2V10H1.5Z',
  brake: 'M1.5 2.5H22.5V7.6H15.8V10.8H22.5V15.9H15.8V22.5H8.2V15.9H1.5V10.8H8.2V7.6H1.5Z',
  release: 'M1.2 9.2H9.2V14.8H1.2ZM14.8 9.2H22.8V14.8H14.8ZM9.7 2H14.3V6.8H9.7ZM9.7 17.2H14.3V22H9.7Z',
  lift: 'M3 17A9 10.5 0 0 1 21 17Z',
  gear: 'M7.4 3.6H16.6L21.6 12L16.6 20.4H7.4L2.4 12Z',
  turnin: 'M4.5 21V13.5A9 9 0 0 1 13.5 4.5H20.5V11.5H14A2.5 2.5 0 0 0 11.5 14V21Z',
  apex: 'M12 4A8 8 0 1 1 12 20A8 8 0 1 1 12 4Z',
  throttle: 'M12 2.5L21 20.5L12 15.8L3 20.5Z',
  full: 'M12 .8L21.6 12.4L12 8.4L2.4 12.4ZM12 11.2L21.6 22.8L12 18.8L2.4 22.8Z',
  trackout: 'M12 2.2L21.8 12L12 21.8L2.2 12Z',
  look: 'M1 12Q12 -0.2 23 12Q12 24.2 1 12Z',
}

/** Radius of the point in the middle: a hole where the glyph is filled, a dot where it is hollow. */
const POINTS: Partial<Record<GlyphKind, { hole: number; dot: number }>> = {
  apex: { hole: 2.4, dot: 2.2 },
  look: { hole: 3.6, dot: 2.8 },
}

const TURNING: ReadonlySet<GlyphKind> = new Set(['brakestart', 'brake', 'release', 'turnin', 'throttle', 'full'])

/** Where the bar of a driven mark lies in the box; it never turns. */
export const DRIVEN_BAR = { x: 1, y: 25.4, width: 22, height: 2.8 } as const
/** Baseline and middle of the gear's digit in the box, 13.5 high. */
export const GEAR_DIGIT = { x: 12, y: 16.6 } as const

/** Everything a renderer needs of one glyph, in its 24 box. */
export interface GlyphParts {
  outline: string
  /** Filled in the kind's colour, or in the paper's with a line in the kind's colour. */
  filled: boolean
  dashed: boolean
  /** Thinner where the parts are small. */
  lineWidth: number
  /** Middle 12, 12. A hole takes the paper's colour, a dot the kind's. */
  point: { r: number; hole: boolean } | null
  bar: boolean
  /** Whether it turns with travel. */
  turns: boolean
}

export function glyphParts(kind: GlyphKind, form: GlyphForm): GlyphParts {
  const filled = form === 'seen' || form === 'driven'
  const point = POINTS[kind]
  return {
    outline: OUTLINES[kind],
    filled,
    dashed: form === 'sim',
    lineWidth: kind === 'release' ? 1.7 : 2.1,
    point: point ? { r: filled ? point.hole : point.dot, hole: filled } : null,
    bar: form === 'driven',
    turns: TURNING.has(kind),
  }
}

/** The glyph of a mark. A brake mark without a role is the one to build to. */
export const glyphKind = (kind: MarkKind, role: BrakeRole | null): GlyphKind =>
  kind === 'brake' && role === 'start' ? 'brakestart' : kind

/** State and tool icons: lines in a 20 box, 1.6 wide, round ends. */
export const STATE_ICONS = {
  check: ['M4 10.5l4 4 8-9'],
  question: ['M6.5 7a3.5 3.5 0 1 1 5.2 3c-1.2.7-1.7 1.3-1.7 2.7', 'M10 15.6v.9'],
  foot: [
    'M6.2 3.2c2-.6 3.6.6 3.7 3 .1 2-.6 3-.5 4.6H5.8c0-1.4-1.2-2.4-1.3-4.2-.1-1.6.5-2.9 1.7-3.4z',
    'M5.9 12.6h3.5c.1 2.4-.3 4-1.7 4s-1.9-1.6-1.8-4z',
  ],
  pencil: ['M4 16l.8-3.4L13.4 4l2.6 2.6-8.6 8.6z'],
} as const
export type StateIcon = keyof typeof STATE_ICONS

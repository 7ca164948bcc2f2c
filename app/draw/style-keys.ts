import { MARK_KINDS, type MarkKind } from '~/book/kinds'

/**
 * What a shape is, never how it looks: every renderer maps these keys to its own colours and line widths. The sign before
 * a family stays the same everywhere: `mk-` a glyph, `tether-` the line between its two places.
 */
const GROUND = [
  'paper',
  'tint',
  'contour',
  'contour-heavy',
  'sea',
  'water-line-1',
  'water-line-2',
  'water-line-3',
  'water-line-4',
  'water-line-5',
  'coast',
  'marsh-water',
  'marsh-tuft',
  'groyne',
  'stone-casing',
  'stone',
  'gravel',
  'gravel-dots',
  'paddock',
  'stall',
  'lane-casing',
  'lane',
  'pit-lane-casing',
  'pit-lane',
  'grandstand',
  'grandstand-step',
  'building',
  'mast',
  'mast-foot',
] as const

const ROAD = [
  'road-casing',
  'road',
  'asphalt-edge',
  'asphalt',
  'patch',
  'seam',
  'kerb',
  'kerb-block',
  'kerb-edge',
  'start-casing',
  'start-line',
  'travel-arrow',
  'road-line',
] as const

const SHEET = [
  'sheet-frame',
  'sheet-line',
  'scale-dark',
  'scale-light',
  'needle-ring',
  'needle-dark',
  'needle-light',
  'plate',
  'plate-open',
  'target',
] as const

const PROFILE = ['grid', 'axis', 'profile-ground', 'profile-line', 'profile-stem', 'profile-missing'] as const

const LANDMARKS = [
  'board',
  'board-stem',
  'panel',
  'panel-light',
  'post',
  'thing-sim',
  'wall',
  'wall-hatch',
  'tyres-edge',
  'tyres',
  'bump',
  'standing-water',
  'standing-water-line',
  'drain',
  'gantry-casing',
  'gantry',
] as const

const READING = ['driven-line', 'aim', 'datum', 'selected', 'leader', 'bend', 'bend-end', 'way', 'warning'] as const

export type GlyphStyle = `mk-${MarkKind}`
export type TetherStyle = `tether-${MarkKind}`
type PlainStyle =
  | (typeof GROUND)[number]
  | (typeof ROAD)[number]
  | (typeof SHEET)[number]
  | (typeof PROFILE)[number]
  | (typeof LANDMARKS)[number]
  | (typeof READING)[number]
export type StyleKey = PlainStyle | GlyphStyle | TetherStyle

/** Every key a display list may use; a renderer must know them all. */
export const STYLE_KEYS: readonly StyleKey[] = [
  ...GROUND,
  ...ROAD,
  ...SHEET,
  ...PROFILE,
  ...LANDMARKS,
  ...READING,
  ...MARK_KINDS.map((kind): StyleKey => `mk-${kind}`),
  ...MARK_KINDS.map((kind): StyleKey => `tether-${kind}`),
]

/** The ground under words: their halo is painted in it. */
export const HALO_KEYS = ['paper', 'sand', 'asphalt', 'gravel', 'sea'] as const
export type HaloKey = (typeof HALO_KEYS)[number]

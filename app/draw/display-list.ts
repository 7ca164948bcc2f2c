import type { GlyphForm, GlyphKind } from '~/draw/glyphs'
import type { HaloKey, StyleKey } from '~/draw/style-keys'
import { type Reader, type TextStyle, textSize } from '~/draw/text-styles'

/**
 * A drawing as plain data: pixels from the upper left corner, x to the right, y down, in the order of paint. No colours,
 * no patterns, no clips: any renderer that fills, strokes and sets text draws the same picture. Numbers are rounded to
 * 0.1 px (turns to 0.1°), so that the same drawing is the same bytes everywhere.
 */
export interface DisplayList {
  width: number
  height: number
  shapes: Shape[]
}

export type Shape = PathShape | LineShape | AreaShape | CircleShape | RectShape | TextShape | GlyphShape | GroupShape

/** SVG path data, absolute commands. `width` is the stroke's where it follows the scale of the ground. */
export interface PathShape {
  type: 'path'
  style: StyleKey
  d: string
  width?: number
}

/** An open line through x, y, x, y, … */
export interface LineShape {
  type: 'polyline'
  style: StyleKey
  points: number[]
  width?: number
}

/** A closed ring through x, y, x, y, … */
export interface AreaShape {
  type: 'polygon'
  style: StyleKey
  points: number[]
}

export interface CircleShape {
  type: 'circle'
  style: StyleKey
  x: number
  y: number
  r: number
}

export interface RectShape {
  type: 'rect'
  style: StyleKey
  x: number
  y: number
  width: number
  height: number
  /** Corner radius. */
  r?: number
}

/** One line of words; y is the baseline, `size` px. The style names weight, width and colour. */
export interface TextShape {
  type: 'text'
  style: TextStyle
  x: number
  y: number
  words: string
  anchor: 'start' | 'middle' | 'end'
  size: number
  halo?: HaloKey
}

/** A mark. `turn` is degrees clockwise from travel straight up the picture; `size` the side of its 24 box in px. */
export interface GlyphShape {
  type: 'glyph'
  style: StyleKey
  kind: GlyphKind
  form: GlyphForm
  x: number
  y: number
  size: number
  turn: number
  /** For a left corner. */
  mirror: boolean
  /** The gear a gear mark arrives in. */
  gear: number | null
}

/** Shapes that belong together: one link, or one thing to point at. `label` is what a screen reader says of it. */
export interface GroupShape {
  type: 'group'
  id?: string
  href?: string
  label?: string
  shapes: Shape[]
}

/** Rounds to 0.1 px; never −0. */
export const px = (value: number) => Math.round(value * 10) / 10 + 0

export type Point = readonly [x: number, y: number]
export interface Box {
  x: number
  y: number
  width: number
  height: number
}

export const polyline = (style: StyleKey, points: readonly Point[], width?: number): LineShape =>
  width === undefined
    ? { type: 'polyline', style, points: flat(points) }
    : { type: 'polyline', style, points: flat(points), width: px(width) }

export const polygon = (style: StyleKey, points: readonly Point[]): AreaShape => ({
  type: 'polygon',
  style,
  points: flat(points),
})

export const path = (style: StyleKey, d: string, width?: number): PathShape =>
  width === undefined ? { type: 'path', style, d } : { type: 'path', style, d, width: px(width) }

export const circle = (style: StyleKey, [x, y]: Point, r: number): CircleShape => ({
  type: 'circle',
  style,
  x: px(x),
  y: px(y),
  r: px(r),
})

export const rect = (style: StyleKey, box: Box, r?: number): RectShape => ({
  type: 'rect',
  style,
  x: px(box.x),
  y: px(box.y),
  width: px(box.width),
  height: px(box.height),
  ...(r === undefined ? {} : { r }),
})

/** One line of words in the size its reader needs. */
export function text(
  style: TextStyle,
  [x, y]: Point,
  words: string,
  options: { anchor?: TextShape['anchor']; halo?: HaloKey; reader?: Reader } = {},
): TextShape {
  const { anchor = 'start', halo, reader = 'desk' } = options
  const size = textSize(style, reader)
  return { type: 'text', style, x: px(x), y: px(y), words, anchor, size, ...(halo ? { halo } : {}) }
}

const flat = (points: readonly Point[]) => points.flatMap(([x, y]) => [px(x), px(y)])
const at = ([x, y]: Point) => `${px(x)} ${px(y)}`

/** Path data straight from point to point; empty for fewer than two points. */
export function linePath(points: readonly Point[], closed = false): string {
  if (points.length < 2) return ''
  return `M${points.map(at).join('L')}${closed ? 'Z' : ''}`
}

const middleOf = ([x1, y1]: Point, [x2, y2]: Point): Point => [(x1 + x2) / 2, (y1 + y2) / 2]

/**
 * Path data that rounds every corner of a line: a quadratic arc with the corner as control point, from middle to middle of
 * the sides. The ends are kept.
 */
export function smoothLine(points: readonly Point[]): string {
  if (points.length < 3) return linePath(points)
  const inner = points.slice(1, -1)
  const arcs = inner.map((point, i) => {
    const end = i === inner.length - 1 ? points.at(-1)! : middleOf(point, inner[i + 1]!)
    return `Q${at(point)} ${at(end)}`
  })
  return `M${at(points[0]!)}${arcs.join('')}`
}

/**
 * The same for a ring, but for the corners that are to stay: a picture's edge, a sharp tip.
 * @param stays asked of each corner with the one before and the one after
 */
export function smoothRing(
  ring: readonly Point[],
  stays: (corner: Point, before: Point, after: Point) => boolean = () => false,
): string {
  if (ring.length < 3) return linePath(ring, true)
  const arcs = ring.map((point, i) => {
    const after = ring[(i + 1) % ring.length]!
    const end = at(middleOf(point, after))
    return stays(point, ring.at(i - 1)!, after) ? `L${at(point)}L${end}` : `Q${at(point)} ${end}`
  })
  return `M${at(middleOf(ring.at(-1)!, ring[0]!))}${arcs.join('')}Z`
}

/** Whether a ring turns by more than 50° at a corner: a tip to keep. */
export function isTip([x, y]: Point, [bx, by]: Point, [ax, ay]: Point): boolean {
  const [ux, uy, vx, vy] = [x - bx, y - by, ax - x, ay - y]
  return ux * vx + uy * vy < 0.64 * Math.hypot(ux, uy) * Math.hypot(vx, vy)
}

/** Every shape of a list, groups opened, in the order of paint. */
export function* eachShape(shapes: readonly Shape[]): Generator<Exclude<Shape, GroupShape>> {
  for (const shape of shapes) {
    if (shape.type === 'group') yield* eachShape(shape.shapes)
    else yield shape
  }
}

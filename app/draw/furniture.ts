import { type Box, circle, type Point, path, polygon, px, rect, type Shape, text } from '~/draw/display-list'
import type { Projection } from '~/draw/projection'
import { type Reader, textSize, textWidth } from '~/draw/text-styles'

/** What a scale bar may be long: 1, 2 or 5 times a power of ten, in metres. */
function barLength(pxPerMetre: number, longest: number): number {
  const most = longest / pxPerMetre
  const power = 10 ** Math.floor(Math.log10(most))
  return [5, 2, 1].map((digit) => digit * power).find((length) => length <= most) ?? power
}

export interface ScaleBar {
  shapes: Shape[]
  /** Length of the bar in metres and in px. */
  metres: number
  length: number
  /** Right end of the words at its end. */
  right: number
}

/**
 * A bar of four dark and light fields with 0, the middle and the end under it; `at` is its upper left corner.
 * @param metres words of a length: "200 m"
 */
export function scaleBar(
  [x, y]: Point,
  pxPerMetre: number,
  longest: number,
  words: { metres: (value: number) => string; reader: Reader },
): ScaleBar {
  const metres = barLength(pxPerMetre, longest)
  const length = metres * pxPerMetre
  const field = length / 4
  const { reader } = words
  const size = textSize('scale-figure', reader)
  const end = words.metres(metres)
  const baseline = y + 9 + size
  const middle = Number.isInteger(metres / 2) && length > 84 ? [`${metres / 2}`] : []
  return {
    metres,
    length,
    right: x + length + textWidth(end, 'scale-figure', size) / 2,
    shapes: [
      ...[0, 1, 2, 3].map((i) =>
        rect(i % 2 === 0 ? 'scale-dark' : 'scale-light', { x: x + i * field, y, width: field, height: 6 }),
      ),
      text('scale-figure', [x, baseline], '0', { reader }),
      ...middle.map((figure) => text('scale-figure', [x + length / 2, baseline], figure, { anchor: 'middle', reader })),
      text('scale-figure', [x + length, baseline], end, { anchor: 'middle', reader }),
    ],
  }
}

/** A short bar of two fields with its length beside it, for a map in which the road is big. */
export function smallScaleBar(
  [x, y]: Point,
  pxPerMetre: number,
  longest: number,
  words: { metres: (value: number) => string; reader: Reader },
): ScaleBar {
  const metres = barLength(pxPerMetre, longest)
  const length = metres * pxPerMetre
  const { reader } = words
  const size = textSize('scale-figure', reader)
  const end = words.metres(metres)
  const half = length / 2
  return {
    metres,
    length,
    right: x + length + 6 + textWidth(end, 'scale-figure', size),
    shapes: [
      rect('scale-dark', { x, y, width: half, height: 5 }),
      rect('scale-light', { x: x + half, y, width: half, height: 5 }),
      text('scale-figure', [x + length + 6, y + 3 + size * 0.36], end, { halo: 'sand', reader }),
    ],
  }
}

/** A north needle in a ring. `turn` is the direction of north, degrees clockwise from straight up. */
export function needle([x, y]: Point, r: number, turn = 0): Shape[] {
  const cos = Math.cos((turn * Math.PI) / 180)
  const sin = Math.sin((turn * Math.PI) / 180)
  const at = (dx: number, dy: number): Point => [x + dx * cos - dy * sin, y + dx * sin + dy * cos]
  const words = (points: Point[]) => points.map(([u, v]) => `${px(u)} ${px(v)}`)
  const tip = at(0, 1.5 - r)
  const left = words([tip, at(-r / 5, 2), at(0, 0.5)])
  const stem = words([at(0, 0.5), at(0, r - 2)])
  return [
    circle('needle-ring', [x, y], r),
    polygon('needle-dark', [tip, at(r / 5, 2), at(0, 0.5)]),
    path('needle-light', `M${left.join('L')}ZM${stem.join('L')}`),
  ]
}

/** What stays in a corner of a map, and the boxes it takes. */
export interface Furniture {
  shapes: Shape[]
  boxes: Box[]
}

/** What a map to move on needs in its upper right corner for its buttons, px; a still picture keeps it free as well. */
const BUTTONS = { desk: { width: 124, height: 50 }, phone: { width: 162, height: 64 } } as const

/** Scale bar at the lower left, needle at the lower right; the boxes also keep the upper right corner free. */
export function mapFurniture(
  { width, height, pxPerMetre }: Projection,
  words: { metres: (value: number) => string },
  reader: Reader,
): Furniture {
  const r = reader === 'phone' ? 14 : 13
  const bar = smallScaleBar([14, height - 18], pxPerMetre, Math.min(110, width / 3), { metres: words.metres, reader })
  const at: Point = [width - r - 9, height - r - 11]
  return {
    shapes: [...bar.shapes, ...needle(at, r)],
    boxes: [
      { x: 10, y: height - 28, width: bar.right - 6, height: 24 },
      { x: at[0] - r - 2, y: at[1] - r - 2, width: 2 * r + 4, height: 2 * r + 4 },
      { x: width - BUTTONS[reader].width, y: 0, ...BUTTONS[reader] },
    ],
  }
}

/** Words of the sheet's cartouche; the drawing knows no language. */
export interface CartoucheWords {
  title: string
  /** "4.12 km, 13 corners, clockwise" */
  line: string
  /** "contours 5 m"; null where none are drawn. */
  contours: string | null
  /** "200 m" */
  metres: (value: number) => string
}

const PADDING = 18
const NEEDLE = 16

/** Size of the cartouche for its words; place its upper left corner and draw. */
export function cartouche(words: CartoucheWords, pxPerMetre: number, reader: Reader, most: number) {
  const small = reader === 'phone'
  const padding = small ? 12 : PADDING
  const titleSize = small ? 17 : textSize('sheet-title', reader)
  const longest = Math.min(small ? 130 : 160, most - 2 * padding - 2 * NEEDLE - 30)
  const bar = scaleBar([0, 0], pxPerMetre, longest, { metres: words.metres, reader })
  const noteWidth = words.contours === null ? 0 : 12 + textWidth(words.contours, 'sheet-note')
  const lineWidth = textWidth(words.line, 'sheet-text', textSize('sheet-text', reader)) + 2 * NEEDLE + 12
  const inner = Math.max(
    textWidth(words.title, 'sheet-title', titleSize),
    lineWidth,
    bar.right + (small ? 0 : noteWidth),
    bar.right + 12 + 2 * NEEDLE,
  )
  const width = Math.min(Math.ceil(inner + 2 * padding), most)
  const height = small ? 84 : 108
  return { width, height, shapes: (at: Point) => cartoucheShapes(at, { width, height, titleSize, padding }) }

  function cartoucheShapes([x, y]: Point, box: { width: number; height: number; titleSize: number; padding: number }) {
    const left = x + box.padding
    const lines = small ? { title: 25, line: 44, bar: 54 } : { title: 35, line: 56, bar: 72 }
    const placed = scaleBar([left, y + lines.bar], pxPerMetre, longest, { metres: words.metres, reader })
    const needleAt: Point = [x + box.width - 14 - NEEDLE, y + (small ? box.height - 12 - NEEDLE : 66)]
    return [
      ...frame({ x, y, width: box.width, height: box.height }),
      { ...text('sheet-title', [left, y + lines.title], words.title), size: box.titleSize },
      text('sheet-text', [left, y + lines.line], words.line, { reader }),
      ...placed.shapes,
      ...(words.contours === null || small
        ? []
        : [text('sheet-note', [placed.right + 8, y + lines.bar + 21], words.contours)]),
      ...needle(needleAt, NEEDLE),
    ]
  }
}

const frame = (box: Box): Shape[] => [
  rect('sheet-frame', box),
  rect('sheet-line', { x: box.x + 3.5, y: box.y + 3.5, width: box.width - 7, height: box.height - 7 }),
]

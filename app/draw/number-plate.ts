import { type GroupShape, type Point, rect, type Shape, text } from '~/draw/display-list'
import { textWidth } from '~/draw/text-styles'

/** What a plate stands for. */
export interface PlateCorner {
  id: string
  number: string
  name: string
  /** Orange: an open question, or the corner looked at. */
  open?: boolean
  href?: string
  /** What a screen reader says of the link. */
  label?: string
}

export const PLATE_HEIGHT = 19

/** Width of a corner's plate, px. */
export const numberWidth = (number: string) => Math.max(PLATE_HEIGHT, 8 + textWidth(number, 'plate-number'))

/** The dark or orange field with a corner's number; `at` is its upper left corner. */
export function plateField({ number, open }: PlateCorner, [x, y]: Point): Shape[] {
  const width = numberWidth(number)
  return [
    rect(open ? 'plate-open' : 'plate', { x, y, width, height: PLATE_HEIGHT }, 2),
    text(open ? 'plate-open-number' : 'plate-number', [x + width / 2, y + 14.5], number, { anchor: 'middle' }),
  ]
}

/** One link or group around a plate. */
export const plateGroup = (corner: PlateCorner, shapes: Shape[]): GroupShape => ({
  type: 'group',
  id: corner.id,
  ...(corner.href === undefined ? {} : { href: corner.href }),
  label: corner.label ?? `${corner.number} ${corner.name}`,
  shapes,
})

/** A plate with the room around it that a finger needs. */
export function numberPlate(corner: PlateCorner, [x, y]: Point): GroupShape {
  const width = numberWidth(corner.number)
  const target = rect('target', { x: x - 1, y: y - 8, width: width + 2, height: PLATE_HEIGHT + 16 })
  return plateGroup(corner, [target, ...plateField(corner, [x, y])])
}

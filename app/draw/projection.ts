import type { Box, Point } from '~/draw/display-list'
import type { PlanePoint } from '~/track/plane'

/** From plane metres (x east, y north) to px (x right, y down), north up, one scale both ways. */
export interface Projection {
  readonly pxPerMetre: number
  readonly width: number
  readonly height: number
  /** The road as light asphalt with things on it, instead of a dark band. */
  readonly detail: boolean
  /** What is in the middle of the picture. */
  readonly middle: PlanePoint
  toPx(point: PlanePoint): Point
  toPlane(point: Point): PlanePoint
}

/** From this scale on a picture shows detail, unless it is told otherwise. */
export const DETAIL_FROM = 1

/** The projection that shows `middle` in the middle of a picture. */
export function makeProjection(view: {
  middle: PlanePoint
  pxPerMetre: number
  width: number
  height: number
  detail?: boolean
}): Projection {
  const { middle, pxPerMetre, width, height, detail = pxPerMetre >= DETAIL_FROM } = view
  return {
    middle,
    pxPerMetre,
    width,
    height,
    detail,
    toPx: ({ x, y }) => [width / 2 + (x - middle.x) * pxPerMetre, height / 2 - (y - middle.y) * pxPerMetre],
    toPlane: ([x, y]) => ({
      x: middle.x + (x - width / 2) / pxPerMetre,
      y: middle.y - (y - height / 2) / pxPerMetre,
    }),
  }
}

/**
 * The largest scale at which all points keep `margin` px from the edges of a picture; `bottom` px more are kept free below.
 * A single point is shown at `most` px per metre, which no picture exceeds.
 */
export function fitProjection(
  points: readonly PlanePoint[],
  sheet: { width: number; height: number; margin: number; bottom?: number; most?: number; detail?: boolean },
): Projection {
  const { width, height, margin, bottom = 0, most = 20, detail } = sheet
  const west = Math.min(...points.map((point) => point.x))
  const east = Math.max(...points.map((point) => point.x))
  const south = Math.min(...points.map((point) => point.y))
  const north = Math.max(...points.map((point) => point.y))
  const room = { x: Math.max(width - 2 * margin, 1), y: Math.max(height - 2 * margin - bottom, 1) }
  const pxPerMetre = Math.min(room.x / (east - west), room.y / (north - south), most)
  const middle = { x: (west + east) / 2, y: (south + north) / 2 - bottom / 2 / pxPerMetre }
  return makeProjection({ middle, pxPerMetre, width, height, ...(detail === undefined ? {} : { detail }) })
}

/** The picture with a border of `by` px on every side. */
export const sheetBox = ({ width, height }: { width: number; height: number }, by = 0): Box => ({
  x: -by,
  y: -by,
  width: width + 2 * by,
  height: height + 2 * by,
})

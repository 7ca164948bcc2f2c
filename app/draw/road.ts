import type { LayoutFrame } from '~/track/layout-frame'
import type { PlanePoint } from '~/track/plane'
import { along, type Offset, type Station, station } from '~/track/units'

/** The road of a layout in its plane, as drawings need it. Stations and offsets are the driving frame's. */
export interface Road {
  readonly frame: LayoutFrame
  readonly width: number
  at(at: Station, offset?: number): PlanePoint
  /** Direction of travel in the plane, degrees clockwise from the y axis. */
  headingAt(at: Station): number
  /** The road, or a line beside it, from one station forward to another: the ends and every vertex between. */
  stretch(from: Station, to: Station, offset?: number): PlanePoint[]
  /** The whole lap from the start line on, first point repeated at the end. */
  lap(offset?: number): readonly PlanePoint[]
}

/** @param width of the road in metres, the same all the way round */
export function roadOf(frame: LayoutFrame, width: number): Road {
  const { centreline } = frame
  const at = (value: Station, offset = 0) => frame.planePointAt(value, offset as Offset)
  const vertices = Array.from(centreline.stations.subarray(0, centreline.count), (value) =>
    frame.toStation(along(value)),
  ).sort((a, b) => a - b)
  const through = (from: Station, length: number, offset: number) => {
    const ahead = (value: Station) => frame.ahead(from, value)
    const start = vertices.findIndex((vertex) => vertex > from)
    const first = start === -1 ? 0 : start
    const points = [at(from, offset)]
    for (let k = 0; k < vertices.length; k++) {
      const vertex = vertices[(first + k) % vertices.length]!
      const distance = ahead(vertex)
      if (distance >= length - 0.01) break
      if (distance > 0.01) points.push(at(vertex, offset))
    }
    return points
  }
  let middle: PlanePoint[] | null = null
  const lap = (offset: number) => [...through(station(0), frame.length, offset), at(station(0), offset)]
  return {
    frame,
    width,
    at,
    headingAt: (value) => headingIn(at, value),
    stretch: (from, to, offset = 0) => [...through(from, frame.ahead(from, to), offset), at(to, offset)],
    lap: (offset = 0) => {
      if (offset !== 0) return lap(offset)
      middle ??= lap(0)
      return middle
    },
  }
}

/** From half a metre behind to half a metre ahead, so that a vertex has one direction. */
function headingIn(at: (value: Station, offset?: number) => PlanePoint, value: Station): number {
  const behind = at(station(value - 0.5))
  const before = at(station(value + 0.5))
  return (Math.atan2(before.x - behind.x, before.y - behind.y) * 180) / Math.PI
}

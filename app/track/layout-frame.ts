import {
  type Centreline,
  headingAt as drawnHeadingAt,
  heightAt as drawnHeightAt,
  locate as drawnLocate,
  planePointAt as drawnPlanePointAt,
  pointAt as drawnPointAt,
  sliceOf as drawnSliceOf,
  type Location,
} from '~/track/centreline'
import { type LapFrame, makeLapFrame, wrap } from '~/track/lap-frame'
import type { PlanePoint } from '~/track/plane'
import {
  type Along,
  across,
  along,
  type Degrees,
  degrees,
  type LngLat,
  type Metres,
  type Offset,
  type Position,
  type Station,
  station,
} from '~/track/units'

/**
 * A centreline as a layout drives it: stations from its start line, in its direction, offsets left of the travel.
 * Everything here counts in that frame; `toAlong` and `toAcross` lead back to what rows hold.
 */
export interface LayoutFrame extends LapFrame {
  readonly centreline: Centreline
  /** Station and offset of a position; the hint picks the branch as in `locate` of `centreline.ts`. */
  locate(lngLat: LngLat | Position, hint?: Station): Location
  pointAt(station: Station, offset?: Offset | 0): LngLat
  /** The same point in the centreline's plane, metres east and north. */
  planePointAt(station: Station, offset?: Offset | 0): PlanePoint
  /** Direction of travel, degrees clockwise from true north. */
  headingAt(station: Station): Degrees
  heightAt(station: Station): Metres | null
  /** Metres forward along the road, 0 ≤ result < length. */
  roadDistance(from: Station, to: Station): Metres
  /** The stretch from one station forward to another in driving order; the same station twice means the whole lap. */
  sliceOf(from: Station, to: Station): Position[]
}

/** The frame of a layout: its start line as a place along the drawn line, and whether it is driven against the drawing. */
export function makeFrame(centreline: Centreline, lap: { startAlong: Along; reversed: boolean }): LayoutFrame {
  const frame = makeLapFrame({ length: centreline.length, ...lap })
  // The centreline's own stations are metres along as drawn.
  const drawn = (value: Station) => station(frame.toAlong(value))
  const drawnSide = (value: Offset | 0) => (lap.reversed ? (-value as Offset) : value)
  return {
    ...frame,
    centreline,
    locate: (lngLat, hint) => {
      const found = drawnLocate(centreline, lngLat, hint === undefined ? undefined : drawn(hint))
      return { station: frame.toStation(along(found.station)), offset: frame.toOffset(across(found.offset)) }
    },
    pointAt: (value, offset = 0) => drawnPointAt(centreline, drawn(value), drawnSide(offset)),
    planePointAt: (value, offset = 0) => drawnPlanePointAt(centreline, drawn(value), drawnSide(offset)),
    headingAt: (value) => degrees(wrap(drawnHeadingAt(centreline, drawn(value)) + (lap.reversed ? 180 : 0), 360)),
    heightAt: (value) => drawnHeightAt(centreline, drawn(value)),
    roadDistance: frame.ahead,
    sliceOf: (from, to) =>
      lap.reversed
        ? drawnSliceOf(centreline, drawn(to), drawn(from)).reverse()
        : drawnSliceOf(centreline, drawn(from), drawn(to)),
  }
}

/** The line as it was drawn: start line at the first position, driven in drawing order. */
export const frameAsDrawn = (centreline: Centreline): LayoutFrame =>
  makeFrame(centreline, { startAlong: along(0), reversed: false })

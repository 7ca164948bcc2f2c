import {
  type Across,
  type Along,
  across,
  along,
  type Metres,
  metres,
  type Offset,
  offset,
  type Station,
  station,
} from './units'

/** The lap as it is driven, over a line as it was drawn. Needs no positions: only the line's length. */
export interface LapFrame {
  length: Metres
  startAlong: Along
  reversed: boolean
  toStation(value: Along): Station
  toAlong(value: Station): Along
  /** A point's side: left of the drawn line is right of the travel when the lap is driven backwards. */
  toOffset(value: Across): Offset
  toAcross(value: Offset): Across
  /** Metres forward along the road from one station to another, 0 ≤ result < length. */
  ahead(from: Station, to: Station): Metres
  /** Signed metres from one station to another by the shorter way round, −length/2 < result ≤ length/2; positive: `to` lies ahead. */
  gap(from: Station, to: Station): Metres
}

/** `value` modulo `length`, 0 ≤ result < length, also for negative values and values that round up to the length. */
export function wrap(value: number, length: number): number {
  const rest = value % length
  const positive = rest < 0 ? rest + length : rest
  return positive >= length ? 0 : positive + 0
}

/**
 * The frame of a lap: where the start line lies on the drawn line, and whether it is driven against the drawing.
 * @param length lap length in metres, > 0
 * @param startAlong metres of the drawn line at which the start line lies
 */
export function makeLapFrame(lap: { length: Metres; startAlong: Along; reversed: boolean }): LapFrame {
  const { length, startAlong, reversed } = lap
  const sign = reversed ? -1 : 1
  const ahead = (from: Station, to: Station) => metres(wrap(to - from, length))
  return {
    length,
    startAlong,
    reversed,
    toStation: (value) => station(wrap(sign * (value - startAlong), length)),
    toAlong: (value) => along(wrap(startAlong + sign * value, length)),
    toOffset: (value) => offset(sign * value + 0),
    toAcross: (value) => across(sign * value + 0),
    ahead,
    gap: (from, to) => {
      const forward = ahead(from, to)
      return metres(forward > length / 2 ? forward - length : forward)
    },
  }
}

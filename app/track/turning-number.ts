import type { Centreline } from '~/track/centreline'

/**
 * How often the line, as it is drawn, turns round once it is closed: 1 anticlockwise, −1 clockwise, 0 where it crosses itself
 * once, as a figure of eight. The sum of the turns from segment to segment over 2π, which is whole on a closed line (Hopf's
 * Umlaufsatz). A layout driven against the drawing turns the other way.
 */
export function turningNumber({ count, east, north }: Centreline): number {
  let sum = 0
  for (let i = 0; i < count; i++) {
    const next = (i + 1) % count
    const cross = east[i]! * north[next]! - north[i]! * east[next]!
    const dot = east[i]! * east[next]! + north[i]! * north[next]!
    sum += Math.atan2(cross, dot)
  }
  return Math.round(sum / (2 * Math.PI)) + 0
}

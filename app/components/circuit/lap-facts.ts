import type { Road } from '~/draw/road'
import { heightProfile } from '~/track/heights'
import { turningNumber } from '~/track/turning-number'
import { metres } from '~/track/units'
import { circuitWords as words } from '~/words/circuits'
import { formatKilometres, formatNumber } from '~/words/measures'
import { lapDirection } from '~/words/overview'

const HEIGHT_STEP = metres(10)

/** Which way round the lap is driven, in words. */
export const directionOf = ({ frame }: Road): string =>
  lapDirection(turningNumber(frame.centreline) * (frame.reversed ? -1 : 1))

/** Length, direction, corners and height range of a lap, for a list of facts. */
export function lapFacts(road: Road, corners: number): (readonly [string, string])[] {
  const heights = heightProfile(road.frame, HEIGHT_STEP)
  const range = heights && words.heightRange(formatNumber(heights.lowest.height), formatNumber(heights.highest.height))
  return [
    [words.facts.length, formatKilometres(road.frame.length)],
    [words.facts.direction, directionOf(road)],
    [words.facts.corners, formatNumber(corners)],
    [words.facts.heights, range ?? words.noHeights],
  ]
}

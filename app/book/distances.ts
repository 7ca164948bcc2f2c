import { type Metres, type MetresPerSecond, metres, type Seconds, seconds } from '~/track/units'
import { placeOf } from './assemble'
import type { Ground } from './kinds'
import type { ReadMark } from './marks-for'
import type { GroundChoice, MarkView, PlaceView } from './view'

/** One line of a corner's table of marks. */
export interface MarkLine extends ReadMark {
  /** Which of its places the line tells. */
  ground: Ground
  place: PlaceView
  /** The other place, where the mark has both and both are looked at. */
  other: PlaceView | null
  /** To the next line's mark along the driven line; null for the last. */
  toNext: { metres: Metres; lengths: number; seconds: Seconds | null } | null
  /** Real against simulator, signed metres along the road: negative is sooner here. Null where a place is missing. */
  againstSim: Metres | null
}

/** Metres along the driven line between two places of one corner. */
export type DrivenDistance = (from: Placed, to: Placed) => Metres
export type Placed = Pick<PlaceView, 'station' | 'offset'>

/**
 * A corner's marks as lines with their distances.
 * @param choice which places are looked at; with `both`, a line tells the real place where there is one
 * @param driven metres along the driven line through these places
 * @param carLength metres
 */
export function markLines(
  marks: readonly ReadMark[],
  choice: GroundChoice,
  driven: (places: readonly Placed[]) => DrivenDistance,
  carLength: Metres,
): MarkLine[] {
  const shown = marks.flatMap((read) => {
    const told = toldPlace(read.mark, choice)
    return told ? [{ ...read, ...told }] : []
  })
  shown.sort((a, b) => a.place.toDatum - b.place.toDatum)
  const distance = driven(shown.map((line) => line.place))
  return shown.map((line, index) => {
    const next = shown[index + 1]
    return { ...line, toNext: next ? toNext(line, next, distance, carLength) : null, againstSim: againstSim(line.mark) }
  })
}

function toldPlace(
  mark: MarkView,
  choice: GroundChoice,
): { ground: Ground; place: PlaceView; other: PlaceView | null } | null {
  if (choice === 'both') {
    const place = placeOf(mark)
    if (!place) return null
    return { ground: mark.real ? 'real' : 'sim', place, other: mark.real ? mark.sim : null }
  }
  const place = mark[choice]
  return place ? { ground: choice, place, other: null } : null
}

type Told = ReadMark & { place: PlaceView }

function toNext(line: Told, next: Told, distance: DrivenDistance, carLength: Metres) {
  const apart = distance(line.place, next.place)
  return { metres: apart, lengths: apart / carLength, seconds: secondsBetween(apart, line.mark.speed, next.mark.speed) }
}

/**
 * Time over a distance between two given speeds at constant acceleration: t = 2 d / (v₁ + v₂). Null where a speed is not given
 * or both are 0. Source: uniformly accelerated motion.
 */
export function secondsBetween(
  distance: Metres,
  from: MetresPerSecond | null,
  to: MetresPerSecond | null,
): Seconds | null {
  if (from === null || to === null || from + to === 0) return null
  return seconds((2 * distance) / (from + to))
}

/** The real place against the simulator's, signed metres along the road: negative is sooner here, positive later. */
export function againstSim(mark: Pick<MarkView, 'sim' | 'real'>): Metres | null {
  return mark.sim && mark.real ? metres(mark.real.toDatum - mark.sim.toDatum) : null
}

import type { SeenMark } from '~/book/edits'
import type { Ground } from '~/book/kinds'
import type { MarkView, PlaceView } from '~/book/view'
import { type Metres, type MetresPerSecond, metres, type Offset, toKmh } from '~/track/units'

/** A place as the fields of a form hold it. */
export interface TypedPlace {
  metres: string
  side: 'before' | 'after'
  across: string
  hand: 'left' | 'right'
}

/** Metres from the middle of the road beyond which nothing is on it. */
export const FARTHEST_ACROSS = 60

const figure = (value: number, decimals: number) => String(Number(Math.abs(value).toFixed(decimals)))

/**
 * A place for the form's fields.
 * @param decimals digits kept: 1 for reading, 3 where the place must come back as it was
 */
export function typedFrom(place: Pick<PlaceView, 'toDatum' | 'offset'>, decimals = 1): TypedPlace {
  return {
    metres: figure(place.toDatum, decimals),
    side: place.toDatum < 0 ? 'before' : 'after',
    across: figure(place.offset, decimals),
    hand: place.offset < 0 ? 'right' : 'left',
  }
}

/** The place that a form's fields name, null while they name none. */
export function placeFromTyped(
  typed: Record<keyof TypedPlace, string | undefined>,
): { toDatum: Metres; offset: Offset } | null {
  const along = Number.parseFloat(typed.metres ?? '')
  const across = Number.parseFloat(typed.across ?? '')
  if (!Number.isFinite(along) || !Number.isFinite(across)) return null
  return {
    toDatum: metres(typed.side === 'after' ? along : -along),
    offset: (typed.hand === 'right' ? -across : across) as Offset,
  }
}

/** What a form carries of the mark as it was shown. */
export function seenOf(mark: MarkView, ground: Ground): SeenMark {
  return { place: mark[ground]?.stored ?? null, manner: mark.manner, gear: mark.gear, speed: mark.speed }
}

/** km/h for a form's field, at most one decimal. */
export const kmhField = (speed: MetresPerSecond | null) =>
  speed === null ? '' : String(Number(toKmh(speed).toFixed(1)))

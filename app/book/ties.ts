import { makeLapFrame, wrap } from '~/track/lap-frame'
import { along as asAlong, metres } from '~/track/units'
import type { Place, Placement } from './place'

/**
 * Resolves a tie to the metres of the drawn line at which its place is now. The one function through which every tie is read.
 *
 * Along: from the named point of the landmark, plus metres or car lengths in the direction of travel, measured along the
 * landmark's own edge where that edge's length is known (a kerb's edge inside a bend is shorter than the centreline beside it).
 * Where a tie names no point along, or its landmark does not stand on this ground, the place stays where it was.
 * @param placement the landmark on the same ground as the place, or null
 * @param carLength metres, as pinned in the book
 */
export function resolveTie(
  place: Place,
  placement: Placement | null,
  lap: { length: number; reversed: boolean; carLength: number },
): { along: number; across: number } {
  const rule = place.tie?.along
  if (!rule || !placement) return { along: place.along, across: place.across }
  const sign = lap.reversed ? -1 : 1
  const wanted = rule.metres + rule.lengths * lap.carLength
  const edge = edgeOf(placement, lap)
  const fromStart = { start: 0, middle: edge.length / 2, end: edge.length, block: blockStart(rule.block, placement) }[
    rule.from
  ]
  const alongEdge = fromStart + wanted
  const along = edge.first + sign * roadFromEdge(alongEdge, edge)
  return { along: wrap(along, lap.length), across: place.across }
}

/** A landmark's edge in the direction of travel: where it begins, its own length and the road's length beside it. */
function edgeOf(placement: Placement, lap: { length: number; reversed: boolean }) {
  const until = placement.until ?? placement.along
  const frame = makeLapFrame({ length: metres(lap.length), startAlong: asAlong(0), reversed: lap.reversed })
  const [first, last] = lap.reversed ? [until, placement.along] : [placement.along, until]
  const road = frame.ahead(frame.toStation(asAlong(first)), frame.toStation(asAlong(last)))
  return { first, road, length: placement.edgeLength ?? road }
}

/** Metres along the edge at which the n-th block begins; blocks count from 1 at the edge's start. */
function blockStart(block: number | null, placement: Placement) {
  return ((block ?? 1) - 1) * (placement.blockLength ?? 0)
}

/** Metres of road for metres of edge: scaled between the edge's ends, one to one before and after it. */
function roadFromEdge(alongEdge: number, edge: { road: number; length: number }) {
  if (edge.length <= 0 || alongEdge <= 0) return alongEdge
  if (alongEdge >= edge.length) return edge.road + (alongEdge - edge.length)
  return (alongEdge / edge.length) * edge.road
}

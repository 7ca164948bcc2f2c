import type { Centreline } from '~/track/centreline'

/*
 * Offsets are laid off along rays. Away from a vertex a ray stands square to the segment; over the last metres before a
 * vertex (half the segment, 20 m at most) it swings to the line that halves the angle there, and back on the next
 * segment. So the strips of the segments meet without gap or overlap, a parallel at an offset keeps its distance from
 * every segment, and station and offset name exactly one point as long as the offset is less than the local radius.
 */
const longestSwing = 20
/** tan 60°: a vertex that turns by more than 120° is treated as one of 120°, so that no ray runs off to infinity. */
const steepestSlant = Math.sqrt(3)

/** tan(θ/2) of the turn θ between two unit directions, left positive: how far a ray leans along the road per metre of offset. */
export function slantBetween(east1: number, north1: number, east2: number, north2: number): number {
  const sin = east1 * north2 - north1 * east2
  const cos = east1 * east2 + north1 * north2
  const slant = sin / Math.max(1 + cos, 1e-12)
  return Math.max(-steepestSlant, Math.min(steepestSlant, slant))
}

const swingOf = (lengthOfSegment: number) => Math.min(lengthOfSegment / 2, longestSwing)

/** Lean of the ray at `run` metres into the segment: metres forward along it per metre of offset to the left. */
export function slantAt(line: Centreline, segment: number, run: number): number {
  const next = segment + 1 < line.count ? segment + 1 : 0
  const whole = line.stations[segment + 1]! - line.stations[segment]!
  const swing = swingOf(whole)
  if (run < swing) return line.slants[segment]! * (1 - run / swing)
  if (run > whole - swing) return -line.slants[next]! * (1 - (whole - run) / swing)
  return 0
}

/**
 * The inverse: metres into the segment of the ray through the point that lies `foot` metres along and `offset` metres
 * left of it; 0 ≤ result ≤ the segment's length. Beyond the local radius, where rays cross, it is the foot itself.
 */
export function runOfRay(line: Centreline, segment: number, foot: number, offset: number): number {
  const next = segment + 1 < line.count ? segment + 1 : 0
  const whole = line.stations[segment + 1]! - line.stations[segment]!
  const swing = swingOf(whole)
  const inZone = (rest: number, lean: number) => {
    const spread = 1 - lean / swing
    return Math.max(0, Math.min(swing, spread > 0 ? (rest - lean) / spread : rest))
  }
  if (foot < swing) return inZone(foot, offset * line.slants[segment]!)
  if (foot > whole - swing) return whole - inZone(whole - foot, offset * line.slants[next]!)
  return foot
}

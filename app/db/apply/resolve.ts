import { and, eq } from 'drizzle-orm'
import type { LandmarkId, TeamId } from '~/book/ids'
import { GROUNDS, type Ground } from '~/book/kinds'
import type { Json } from '~/book/operation'
import type { Place, Placement } from '~/book/place'
import { resolveTie } from '~/book/ties'
import { wrap } from '~/track/lap-frame'
import type { Db } from '../database'
import { placementColumns, placementFrom } from '../placing'
import { landmarkPlacements } from '../schema'
import type { LockedScope } from './scopes'
import type { Values } from './values'

type Lap = Pick<LockedScope, 'length' | 'reversed' | 'carLength'>

/** A place where its tie holds it, to the millimetre: as it is read, so that what a person saw is what his change starts from. */
export function resolvedPlace(place: Place, placement: Placement | null, lap: Lap): Place {
  if (!place.tie?.along || !placement) return place
  const { length, reversed, carLength } = lap
  const at = resolveTie(place, placement, { length, reversed, carLength: carLength ?? 0 })
  return { ...place, along: wrap(Math.round(at.along * 1000) / 1000, length) } as Place
}

/** A mark's values with each tied place where its landmark is now. */
export async function resolvePlaces(db: Db, team: TeamId, lap: Lap, values: Values): Promise<Values> {
  const resolved = { ...values }
  for (const ground of GROUNDS) {
    const place = (values[ground] ?? null) as unknown as Place | null
    const landmark = place?.tie?.along ? place.tie.landmarkId : null
    if (!place || !landmark) continue
    const placement = await placementOf(db, team, landmark, ground)
    resolved[ground] = resolvedPlace(place, placement, lap) as unknown as Json
  }
  return resolved
}

async function placementOf(db: Db, team: TeamId, landmark: LandmarkId, ground: Ground): Promise<Placement | null> {
  const table = landmarkPlacements
  const [row] = await db
    .select(placementColumns(table))
    .from(table)
    .where(and(eq(table.teamId, team), eq(table.landmarkId, landmark), eq(table.ground, ground)))
  return row ? placementFrom(row) : null
}

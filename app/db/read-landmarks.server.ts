import { and, eq } from 'drizzle-orm'
import type { Actor } from '~/book/actions'
import type { LayoutId } from '~/book/ids'
import type { Ground } from '~/book/kinds'
import type { Placement } from '~/book/place'
import type { LandmarkRow, StretchRow } from '~/book/rows'
import { metres } from '~/track/units'
import type { Db } from './database'
import { ownTeam } from './own-team'
import { type PlacementRow, placementColumns, placementFrom } from './placing'
import { landmarkPlacements, landmarks, stretches, stretchPlacements } from './schema'

type Joined = { [Column in keyof PlacementRow]: PlacementRow[Column] | null } & { ground: Ground | null }

/** Things of a layout with the placement of each ground, from one row per thing and ground; the join finds none for some. */
function withPlacements<Thing extends { id: string }>(rows: readonly { thing: Thing; placement: Joined | null }[]) {
  const found = new Map<string, Thing & Record<Ground, Placement | null>>()
  for (const { thing, placement } of rows) {
    const known = found.get(thing.id) ?? { ...thing, real: null, sim: null }
    found.set(thing.id, known)
    if (!placement || placement.ground === null || placement.along === null) continue
    Object.assign(known, { [placement.ground]: placementFrom({ ...placement, along: placement.along }) })
  }
  return [...found.values()]
}

/** The live landmarks of a layout. */
export async function readLandmarks(db: Db, actor: Actor, layout: LayoutId): Promise<LandmarkRow[]> {
  const rows = await db
    .select({
      thing: {
        id: landmarks.id,
        kind: landmarks.kind,
        name: landmarks.name,
        text: landmarks.text,
        corner: landmarks.cornerId,
        height: landmarks.height,
      },
      placement: placementColumns(landmarkPlacements),
    })
    .from(landmarks)
    .leftJoin(
      landmarkPlacements,
      and(eq(landmarkPlacements.teamId, landmarks.teamId), eq(landmarkPlacements.landmarkId, landmarks.id)),
    )
    .where(and(ownTeam(actor, landmarks.teamId), eq(landmarks.layoutId, layout), eq(landmarks.state, 'live')))
  return withPlacements(rows).map((row) => ({ ...row, height: row.height === null ? null : metres(row.height) }))
}

/** The live stretches of a layout. */
export async function readStretches(db: Db, actor: Actor, layout: LayoutId): Promise<StretchRow[]> {
  const rows = await db
    .select({
      thing: { id: stretches.id, kind: stretches.kind, name: stretches.name },
      placement: placementColumns(stretchPlacements),
    })
    .from(stretches)
    .leftJoin(
      stretchPlacements,
      and(eq(stretchPlacements.teamId, stretches.teamId), eq(stretchPlacements.stretchId, stretches.id)),
    )
    .where(and(ownTeam(actor, stretches.teamId), eq(stretches.layoutId, layout), eq(stretches.state, 'live')))
  return withPlacements(rows)
}

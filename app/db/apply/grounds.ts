import { and, eq } from 'drizzle-orm'
import type { LandmarkId, MarkId, StretchId, TeamId } from '~/book/ids'
import type { Ground } from '~/book/kinds'
import type { Json } from '~/book/operation'
import type { Place, Placement } from '~/book/place'
import type { Db } from '../database'
import { placeColumns, placeFrom, placementColumns, placementFrom, tieColumns } from '../placing'
import { landmarkPlacements, places, stretchPlacements, ties } from '../schema'

/** The fields `sim` and `real` of a kind: rows of their own, each replaced whole. */
export interface GroundStore {
  read(db: Db, team: TeamId, id: string): Promise<Partial<Record<Ground, Json>>>
  add(db: Db, team: TeamId, id: string, ground: Ground, value: Json): Promise<void>
  remove(db: Db, team: TeamId, id: string, ground: Ground): Promise<void>
}

/** A place or a placement is plain data. */
const asJson = (value: Place | Placement) => value as unknown as Json

export const markGrounds: GroundStore = {
  async read(db, team, id) {
    const rows = await db
      .select(placeColumns)
      .from(places)
      .leftJoin(
        ties,
        and(eq(ties.teamId, places.teamId), eq(ties.markId, places.markId), eq(ties.ground, places.ground)),
      )
      .where(and(eq(places.teamId, team), eq(places.markId, id as MarkId)))
    return Object.fromEntries(rows.map((row) => [row.ground, asJson(placeFrom(row))]))
  },
  async remove(db, team, id, ground) {
    await db
      .delete(places)
      .where(and(eq(places.teamId, team), eq(places.markId, id as MarkId), eq(places.ground, ground)))
  },
  async add(db, team, id, ground, value) {
    const markId = id as MarkId
    const { along, across, tie } = value as unknown as Place
    await db.insert(places).values({ teamId: team, markId, ground, along, across })
    if (tie) await db.insert(ties).values({ teamId: team, markId, ground, ...tieColumns(tie) })
  },
}

export const landmarkGrounds: GroundStore = {
  async read(db, team, id) {
    const rows = await db
      .select(placementColumns(landmarkPlacements))
      .from(landmarkPlacements)
      .where(and(eq(landmarkPlacements.teamId, team), eq(landmarkPlacements.landmarkId, id as LandmarkId)))
    return Object.fromEntries(rows.map((row) => [row.ground, asJson(placementFrom(row))]))
  },
  async remove(db, team, id, ground) {
    const table = landmarkPlacements
    await db
      .delete(table)
      .where(and(eq(table.teamId, team), eq(table.landmarkId, id as LandmarkId), eq(table.ground, ground)))
  },
  async add(db, team, id, ground, value) {
    const landmarkId = id as LandmarkId
    await db.insert(landmarkPlacements).values({ teamId: team, landmarkId, ground, ...(value as unknown as Placement) })
  },
}

export const stretchGrounds: GroundStore = {
  async read(db, team, id) {
    const rows = await db
      .select(placementColumns(stretchPlacements))
      .from(stretchPlacements)
      .where(and(eq(stretchPlacements.teamId, team), eq(stretchPlacements.stretchId, id as StretchId)))
    return Object.fromEntries(rows.map((row) => [row.ground, asJson(placementFrom(row))]))
  },
  async remove(db, team, id, ground) {
    const table = stretchPlacements
    await db
      .delete(table)
      .where(and(eq(table.teamId, team), eq(table.stretchId, id as StretchId), eq(table.ground, ground)))
  },
  async add(db, team, id, ground, value) {
    const stretchId = id as StretchId
    await db.insert(stretchPlacements).values({ teamId: team, stretchId, ground, ...(value as unknown as Placement) })
  },
}

import { and, eq } from 'drizzle-orm'
import type { FeatureCollection } from 'geojson'
import type { Actor } from '~/book/actions'
import type { GeometryHash, TeamId } from '~/book/ids'
import { type Centreline, makeCentreline } from '~/track/centreline'
import type { Db } from './database'
import { ownTeam } from './own-team'
import { centrelines, grounds } from './schema'

/** Things named by hash never change: what was built once is kept, the latest used ones of each kind. */
const KEPT = 24

function makeKeeper<Thing>() {
  const kept = new Map<string, Thing>()
  return {
    get(key: string): Thing | undefined {
      const thing = kept.get(key)
      if (thing === undefined) return undefined
      kept.delete(key)
      kept.set(key, thing)
      return thing
    },
    put(key: string, thing: Thing): void {
      kept.set(key, thing)
      const oldest = kept.keys().next().value
      if (kept.size > KEPT && oldest !== undefined) kept.delete(oldest)
    },
  }
}

const builtCentrelines = makeKeeper<Centreline>()
const readGrounds = makeKeeper<FeatureCollection>()

/** The team whose things the actor may read; a member's request has been checked by the read that named the hash. */
const teamOf = (actor: Actor): TeamId | null => (actor.kind === 'stranger' ? null : actor.team)

/** A centreline of the actor's team, ready for use; null where the team has none of this hash. */
export async function readCentreline(db: Db, actor: Actor, hash: GeometryHash): Promise<Centreline | null> {
  const key = `${teamOf(actor)} ${hash}`
  const known = builtCentrelines.get(key)
  if (known) return known
  const [row] = await db
    .select({ positions: centrelines.positions })
    .from(centrelines)
    .where(and(ownTeam(actor, centrelines.teamId), eq(centrelines.hash, hash)))
  if (!row) return null
  const built = makeCentreline(row.positions)
  builtCentrelines.put(key, built)
  return built
}

/** What surrounds the road, as GeoJSON; null where the team has none of this hash. */
export async function readGround(db: Db, actor: Actor, hash: GeometryHash): Promise<FeatureCollection | null> {
  const key = `${teamOf(actor)} ${hash}`
  const known = readGrounds.get(key)
  if (known) return known
  const [row] = await db
    .select({ features: grounds.features })
    .from(grounds)
    .where(and(ownTeam(actor, grounds.teamId), eq(grounds.hash, hash)))
  if (!row) return null
  readGrounds.put(key, row.features)
  return row.features
}

import type { GeometryHash } from '~/book/ids'
import { readCentreline, readGround } from '~/db/read-geometry.server'
import { dbContext } from '~/middleware/context'
import { allow, refusal } from '~/middleware/refusal.server'
import { teamContext } from '~/middleware/team.server'
import type { Route } from './+types/geometry'

/** A centreline or a ground by its hash: never another thing under this name, so it is kept for good. */
const KEPT = 'private, max-age=31536000, immutable'

export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = context.get(teamContext)
  allow(actor, 'circuit.read')
  const db = context.get(dbContext)
  const hash = params.hash as GeometryHash
  const centreline = await readCentreline(db, actor, hash)
  const geometry = centreline ? { positions: centreline.positions } : await readGround(db, actor, hash)
  if (!geometry) throw refusal('not-found')
  return Response.json(geometry, { headers: { 'Cache-Control': KEPT } })
}

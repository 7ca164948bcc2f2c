import type { RouterContextProvider } from 'react-router'
import type { Actor } from '~/book/actions'
import type { LayoutView } from '~/book/view'
import { readCentreline, readGround } from '~/db/read-geometry.server'
import { type LayoutFrame, makeFrame } from '~/track/layout-frame'
import { along } from '~/track/units'
import { dbContext } from './context'
import { geometryContext } from './geometry.server'

/**
 * Reads a layout's geometry for its actor and lays it beside the request, so that the page's drawings find it.
 * @returns the layout's frame, for figures that need the road itself
 */
export async function layOutGeometry(
  context: Readonly<RouterContextProvider>,
  actor: Actor,
  layout: Pick<LayoutView, 'centreline' | 'ground' | 'startAlong' | 'reversed'>,
): Promise<LayoutFrame> {
  const db = context.get(dbContext)
  const geometry = context.get(geometryContext)
  const [centreline, ground] = await Promise.all([
    readCentreline(db, actor, layout.centreline),
    layout.ground ? readGround(db, actor, layout.ground) : null,
  ])
  if (!centreline) throw new Error(`layout without its centreline ${layout.centreline}`)
  geometry.centrelines.set(layout.centreline, centreline)
  if (layout.ground && ground) geometry.grounds.set(layout.ground, ground)
  return makeFrame(centreline, { startAlong: along(layout.startAlong), reversed: layout.reversed })
}

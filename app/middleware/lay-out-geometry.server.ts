import type { RouterContextProvider } from 'react-router'
import type { Actor } from '~/book/actions'
import type { GeometryHash } from '~/book/ids'
import type { LayoutView } from '~/book/view'
import { readCentreline, readGround } from '~/db/read-geometry.server'
import type { Centreline } from '~/track/centreline'
import { type LayoutFrame, makeFrame } from '~/track/layout-frame'
import { along } from '~/track/units'
import { dbContext } from './context'
import { geometryContext } from './geometry.server'

/** Reads a centreline for its actor and lays it beside the request, so that the page's drawings find it. */
export async function layOutCentreline(
  context: Readonly<RouterContextProvider>,
  actor: Actor,
  hash: GeometryHash,
): Promise<Centreline> {
  const centreline = await readCentreline(context.get(dbContext), actor, hash)
  if (!centreline) throw new Error(`layout without its centreline ${hash}`)
  context.get(geometryContext).centrelines.set(hash, centreline)
  return centreline
}

/**
 * Reads a layout's geometry for its actor and lays it beside the request, so that the page's drawings find it.
 * @returns the layout's frame, for figures that need the road itself
 */
export async function layOutGeometry(
  context: Readonly<RouterContextProvider>,
  actor: Actor,
  layout: Pick<LayoutView, 'centreline' | 'ground' | 'startAlong' | 'reversed'>,
): Promise<LayoutFrame> {
  const [centreline, ground] = await Promise.all([
    layOutCentreline(context, actor, layout.centreline),
    layout.ground ? readGround(context.get(dbContext), actor, layout.ground) : null,
  ])
  if (layout.ground && ground) context.get(geometryContext).grounds.set(layout.ground, ground)
  return makeFrame(centreline, { startAlong: along(layout.startAlong), reversed: layout.reversed })
}

import type { FeatureCollection } from 'geojson'
import { createContext, use } from 'react'
import type { GeometryHash } from '~/book/ids'
import type { Centreline } from '~/track/centreline'

/**
 * Geometry is immutable and named by its hash, so it never travels in loader data: on the server the loader lays it beside the
 * request, in the browser it comes from its own URL and is kept. A drawing asks for it while rendering and waits in the nearest
 * `Suspense`; while the page comes alive the server's drawing stays in place.
 */
export interface GeometryStore {
  centreline(team: string, hash: GeometryHash): Promise<Centreline>
  ground(team: string, hash: GeometryHash): Promise<FeatureCollection>
}

export const GeometryContext = createContext<GeometryStore | null>(null)

function useStore(): GeometryStore {
  const store = use(GeometryContext)
  if (!store) throw new Error('no geometry store around this drawing')
  return store
}

/** The centreline of this hash; suspends until it is there. */
export function useCentreline(team: string, hash: GeometryHash): Centreline {
  return use(useStore().centreline(team, hash))
}

const nothing: Promise<null> = settled(null)

/** The ground features of this hash, null where the layout has none; suspends until they are there. */
export function useGround(team: string, hash: GeometryHash | null): FeatureCollection | null {
  const store = useStore()
  return use(hash ? store.ground(team, hash) : nothing)
}

/** A promise that `use` reads without waiting: React reads `status` and `value` of a thenable it has seen settle. */
export function settled<Value>(value: Value): Promise<Value> {
  return Object.assign(Promise.resolve(value), { status: 'fulfilled' as const, value })
}

import type { FeatureCollection } from 'geojson'
import { createContext } from 'react-router'
import type { GeometryHash } from '~/book/ids'
import { type GeometryStore, settled } from '~/components/geometry/geometry-store'
import type { Centreline } from '~/track/centreline'

/** The geometry that this request's loaders were allowed to read, laid out for the render. */
export interface RequestGeometry {
  centrelines: Map<GeometryHash, Centreline>
  grounds: Map<GeometryHash, FeatureCollection>
}

export const makeRequestGeometry = (): RequestGeometry => ({ centrelines: new Map(), grounds: new Map() })

export const geometryContext = createContext<RequestGeometry>()

/** The render's store: what the loaders laid out, and nothing else. */
export function serverStore(geometry: RequestGeometry): GeometryStore {
  return {
    centreline: (_team, hash) => settled(laidOut(geometry.centrelines, hash)),
    ground: (_team, hash) => settled(laidOut(geometry.grounds, hash)),
  }
}

function laidOut<Value>(known: Map<GeometryHash, Value>, hash: GeometryHash): Value {
  const value = known.get(hash)
  if (value === undefined) throw new Error(`no loader laid out geometry ${hash}`)
  return value
}

import type { FeatureCollection } from 'geojson'
import { href } from 'react-router'
import type { GeometryHash } from '~/book/ids'
import { type Centreline, makeCentreline } from '~/track/centreline'
import type { Position } from '~/track/units'
import type { GeometryStore } from './geometry-store'

/** The browser's store: each hash is fetched once a page life; the browser's own cache keeps it for good. */
export function makeBrowserStore(): GeometryStore {
  const centrelines = new Map<GeometryHash, Promise<Centreline>>()
  const grounds = new Map<GeometryHash, Promise<FeatureCollection>>()
  return {
    centreline: (team, hash) =>
      once(centrelines, hash, () =>
        fetchJson<{ positions: Position[] }>(team, hash).then(({ positions }) => makeCentreline(positions)),
      ),
    ground: (team, hash) => once(grounds, hash, () => fetchJson<FeatureCollection>(team, hash)),
  }
}

/** A failed load is forgotten, so that the next drawing tries again. */
function once<Value>(kept: Map<GeometryHash, Promise<Value>>, hash: GeometryHash, load: () => Promise<Value>) {
  const known = kept.get(hash)
  if (known) return known
  const loading = load()
  kept.set(hash, loading)
  loading.catch(() => kept.delete(hash))
  return loading
}

async function fetchJson<Value>(team: string, hash: GeometryHash): Promise<Value> {
  const response = await fetch(href('/teams/:team/geometry/:hash', { team, hash }))
  if (!response.ok) throw new Error(`geometry answered ${response.status}`)
  return (await response.json()) as Value
}

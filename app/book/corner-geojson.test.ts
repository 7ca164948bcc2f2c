import { describe, expect, it } from 'vitest'
import { makeCentreline } from '~/track/centreline'
import { frameAsDrawn } from '~/track/layout-frame'
import { makePlane } from '~/track/plane'
import type { Position } from '~/track/units'
import { bookRows, kerb, mark, place } from '../../tests/support/book-rows'
import { assembleBookView } from './assemble'
import { cornerGeoJson } from './corner-geojson'
import { cornerOf } from './cuts'

/** A circle about 2,000 m round, with heights. */
const plane = makePlane([
  [-14, 55],
  [-13.99, 55.006],
])
const frame = frameAsDrawn(
  makeCentreline(
    Array.from({ length: 200 }, (_, index): Position => {
      const angle = (index * Math.PI) / 100
      const [lon, lat] = plane.toLngLat({ x: 318.31 * Math.cos(angle), y: 318.31 * Math.sin(angle) })
      return [lon, lat, 10 + index / 10]
    }),
  ),
)

function geoJson() {
  const rows = bookRows({
    landmarks: [kerb],
    marks: [
      mark({ id: 'm-both', kind: 'brake', role: 'target', real: place(400, 4), sim: place(409, 4) }),
      mark({ id: 'm-sim', kind: 'apex', sim: place(503, -5) }),
    ],
  })
  const view = assembleBookView({ ...rows, layout: { ...rows.layout, length: frame.length } })
  return cornerGeoJson(cornerOf(view, '1')!, frame)
}

describe('a corner for other programs', () => {
  it('is one FeatureCollection: the stretch of road, landmarks, and a mark’s two places apart', () => {
    const kinds = geoJson().features.map((feature) => [feature.properties?.type, feature.properties?.ground])
    expect(kinds).toEqual([
      ['corner', undefined],
      ['landmark', 'real'],
      ['mark', 'sim'],
      ['mark', 'real'],
      ['mark', 'sim'],
    ])
  })

  it('draws the road and a kerb as lines with the road’s heights, marks as points left of travel', () => {
    const { features } = geoJson()
    const [road, edge, , real] = features
    expect(road?.geometry.type).toBe('LineString')
    expect(edge?.geometry.type).toBe('LineString')
    expect(real?.geometry.type).toBe('Point')
    if (road?.geometry.type !== 'LineString' || real?.geometry.type !== 'Point') throw new Error('wrong geometry')
    expect(road.geometry.coordinates[0]).toHaveLength(3)
    const at = frame.locate(real.geometry.coordinates as [number, number])
    expect(at.station).toBeCloseTo(400, 1)
    expect(at.offset).toBeCloseTo(4, 1)
  })

  it('names every feature apart and has no crs member', () => {
    const collection = geoJson()
    const names = collection.features.map((feature) => feature.id)
    expect(new Set(names).size).toBe(names.length)
    expect(collection).not.toHaveProperty('crs')
  })
})

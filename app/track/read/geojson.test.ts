import { describe, expect, it } from 'vitest'
import { readLayout } from '~/track/read-layout'
import { globe, oval, type Spot, text } from '../../../tests/fixtures/circuits/shapes'

const read = (value: unknown) => readLayout(text(JSON.stringify(value)), 'c.geojson')
const feature = (geometry: unknown, properties: unknown = null) => ({ type: 'Feature', properties, geometry })
const collection = (...features: unknown[]) => ({ type: 'FeatureCollection', features })
const ring = (spots: readonly Spot[]) => [...globe(spots), globe(spots)[0]!]
const line = { type: 'LineString', coordinates: ring(oval(40)) }

describe('Lines of a GeoJSON file', () => {
  it.each([
    ['a LineString alone', line],
    ['a Feature', feature(line)],
    ['a FeatureCollection', collection(feature(line))],
    ['a GeometryCollection', { type: 'GeometryCollection', geometries: [line] }],
    ['a MultiLineString of one', { type: 'MultiLineString', coordinates: [line.coordinates] }],
    ['a Polygon', { type: 'Polygon', coordinates: [line.coordinates] }],
    ['a MultiPolygon', { type: 'MultiPolygon', coordinates: [[line.coordinates]] }],
    ['members in another order', { coordinates: line.coordinates, type: 'LineString' }],
  ])('%s is read', (_, value) => {
    expect(read(value)).toMatchObject({ ok: true, layout: { positions: line.coordinates.slice(0, -1) }, warnings: [] })
  })

  it('heights are kept where they are, positions with and without mixed', () => {
    const mixed = line.coordinates.map((position, i) => (i % 3 === 1 ? [...position, 7.25 + i] : position))
    expect(read({ type: 'LineString', coordinates: mixed })).toMatchObject({
      ok: true,
      layout: { positions: mixed.slice(0, -1), heightDatum: 'ellipsoid' },
    })
  })

  it('a fourth value is left out with a warning, and so is a height that is no number', () => {
    const odd = line.coordinates.map((position, i) => [...position, i === 3 ? null : 12, 99 + i])
    const reading = read({ type: 'LineString', coordinates: odd })
    expect(reading).toMatchObject({ ok: true, warnings: [{ code: 'extra-coordinate' }, { code: 'heights-left-out' }] })
    expect(reading.ok && reading.layout.positions.map((position) => position.length)).toEqual([
      3,
      3,
      3,
      2,
      ...Array(36).fill(3),
    ])
  })

  it('points, areas beside lines and inner rings are left out with a warning', () => {
    const point = { type: 'Point', coordinates: [-14.2, 55.1] }
    const area = { type: 'Polygon', coordinates: [ring(oval(12)), ring(oval(9))] }
    expect(read(collection(feature(point), feature(line), feature(null), feature(area)))).toMatchObject({
      ok: true,
      warnings: [{ code: 'points-ignored' }, { code: 'polygons-left-out' }],
    })
    expect(read(area)).toMatchObject({ ok: true, warnings: [{ code: 'inner-rings-left-out' }] })
  })

  it('the name is that of the line’s feature, else of the collection', () => {
    const named = collection(feature(line, { name: ' Spit\n ring ' }))
    expect(read({ ...named, name: 'Export' })).toMatchObject({ layout: { name: 'Spit ring' } })
    expect(read({ ...collection(feature(line)), name: 'Export' })).toMatchObject({ layout: { name: 'Export' } })
  })
})

describe('Places of what is wrong in a GeoJSON file', () => {
  const spoilt = (position: unknown) => ({
    type: 'LineString',
    coordinates: line.coordinates.with(4, position as never),
  })

  it.each([
    ['a latitude past the pole', [-14, 91.5], 'swapped-axes'],
    ['a longitude past the date line', [181, 55], 'out-of-range'],
    ['metres of a grid', [412345.6, 6123456.7], 'out-of-range'],
    ['a single number', [-14], 'coordinates-missing'],
    ['text', ['-14', '55'], 'not-a-number'],
    ['null', [null, 55], 'not-a-number'],
  ])('%s', (_, position, code) => {
    expect(read(collection(feature(null), feature(spoilt(position))))).toMatchObject({
      ok: false,
      problems: [{ code, where: 'feature 2, position 5' }],
    })
  })

  it('a number too large to hold', () => {
    const huge = JSON.stringify(line).replace('[', '[[1e999,55],')
    expect(readLayout(text(huge), 'c.json')).toMatchObject({
      problems: [{ code: 'not-a-number', where: 'position 1' }],
    })
  })

  it('an empty position, and positions nested too deep', () => {
    expect(read(spoilt([]))).toMatchObject({ problems: [{ code: 'coordinates-missing' }] })
    expect(read({ type: 'LineString', coordinates: [line.coordinates] })).toMatchObject({
      problems: [{ code: 'geojson-shape' }],
    })
    expect(read({ type: 'MultiLineString', coordinates: line.coordinates })).toMatchObject({
      problems: [{ code: 'geojson-shape' }],
    })
  })

  it('a wrong position of a point that is not read does not matter', () => {
    expect(read(collection(feature({ type: 'Point', coordinates: [0, 777] }), feature(line)))).toMatchObject({
      ok: true,
    })
  })

  it('a line of one position among others is left out and named', () => {
    const short = { type: 'LineString', coordinates: [[-14.3, 55.2]] }
    expect(read(collection(feature(line), feature(short)))).toMatchObject({
      ok: true,
      warnings: [{ code: 'line-too-short', where: 'feature 2' }],
    })
  })
})

/**
 * RFC 7946, The GeoJSON Format, August 2016, https://www.rfc-editor.org/rfc/rfc7946: what it asks of a reader. Each test
 * names its section. (Primary text read.)
 */
import { describe, expect, it } from 'vitest'
import { type LayoutReading, readLayout } from '~/track/read-layout'
import { flat, globe, oval, text } from '../fixtures/circuits/shapes'

const places = globe(oval(30))
const ring = [...places, places[0]!]
const line = { type: 'LineString', coordinates: ring }
const feature = (geometry: unknown, more: object = {}) => ({ type: 'Feature', properties: null, geometry, ...more })
const collection = (features: unknown[], more: object = {}) => ({ type: 'FeatureCollection', features, ...more })
const read = (value: unknown) => readLayout(text(JSON.stringify(value)), 'c.geojson')
const codes = (reading: LayoutReading) => (reading.ok ? reading.warnings : reading.problems).map(({ code }) => code)

describe('2, 3: a GeoJSON text is one object of a known type', () => {
  it.each([
    ['a list at the top', [feature(line)], 'not-geojson'],
    ['an object without a type', { coordinates: ring }, 'not-geojson'],
    ['a type in small letters', { type: 'linestring', coordinates: ring }, 'unknown-type'],
    ['a type of another format', { type: 'Topology', objects: {} }, 'unknown-type'],
    ['a type that is no text', { type: 7, coordinates: ring }, 'not-geojson'],
  ])('%s is refused', (_, value, code) => {
    expect(read(value)).toMatchObject({ ok: false, problems: [{ code }] })
  })

  it('a type in small letters is told how it is written', () => {
    const reading = read({ type: 'point', coordinates: [1, 2] })
    expect(reading.ok || reading.problems[0]!.message).toContain('“Point”')
  })
})

describe('3.1.1: a position is longitude, latitude and perhaps a height', () => {
  it('latitudes past 90 are taken for axes the other way round', () => {
    // The rectangle of 3.1.9, 40 to 50° N and 170° E to 170° W, with its axes swapped.
    const swapped = [
      [40, 170],
      [50, 170],
      [50, -170],
      [40, -170],
      [40, 170],
    ]
    expect(read({ type: 'Polygon', coordinates: [swapped] })).toMatchObject({
      ok: false,
      problems: [{ code: 'swapped-axes', where: 'position 1' }],
    })
  })

  it('a fourth value is ignored', () => {
    const four = { type: 'LineString', coordinates: ring.map((place, i) => [...place, 20 + i, 7]) }
    expect(read(four)).toMatchObject({ ok: true, warnings: [{ code: 'extra-coordinate' }] })
    const reading = read(four)
    expect(reading.ok && reading.layout.positions).toEqual(places.map((place, i) => [...place, 20 + i]))
  })

  it('one number is no position', () => {
    expect(read({ type: 'LineString', coordinates: [[1], ...ring] })).toMatchObject({
      problems: [{ code: 'coordinates-missing' }],
    })
  })
})

describe('3.1.4, 3.1.6: lines and rings', () => {
  it('a LineString of one position is refused', () => {
    expect(codes(read({ type: 'LineString', coordinates: [ring[0]] }))).toEqual(['line-too-short'])
  })

  it('a ring of three positions is refused', () => {
    expect(codes(read({ type: 'Polygon', coordinates: [[ring[0], ring[9], ring[0]]] }))).toEqual(['ring-too-short'])
  })

  it('a ring drawn clockwise is read, and stays clockwise: the drawing’s direction is the circuit’s', () => {
    const reading = read({ type: 'Polygon', coordinates: [ring.toReversed()] })
    expect(reading).toMatchObject({ ok: true, warnings: [] })
    expect(reading.ok && reading.layout.positions).toEqual(ring.toReversed().slice(0, -1))
  })

  it('the first ring of a polygon is the outer one', () => {
    const reading = read({ type: 'Polygon', coordinates: [ring, globe(oval(10))] })
    expect(reading.ok && reading.layout.positions).toEqual(places)
  })
})

describe('3.1.9: a line cut at the antimeridian', () => {
  it('is joined again', () => {
    const lon = (x: number) => Math.round((x > 180 ? x - 360 : x) * 1e9) / 1e9
    const half = (from: number, sign: number) =>
      Array.from({ length: 13 }, (_, i) => {
        const angle = from + (Math.PI * i) / 12
        const edge = i === 0 || i === 12
        return [edge ? sign * 180 : lon(180 + 0.006 * Math.cos(angle)), 45 + 0.004 * Math.sin(angle)]
      })
    const cut = { type: 'MultiLineString', coordinates: [half(Math.PI / 2, 1), half(-Math.PI / 2, -1)] }
    const reading = read(cut)
    expect(reading).toMatchObject({ ok: true, warnings: [{ code: 'pieces-joined' }] })
    expect(reading.ok && reading.layout.positions).toHaveLength(24)
  })
})

describe('3.2, 3.3: features', () => {
  it('a feature without a geometry, and a collection without features, do not stop the reading', () => {
    expect(read(collection([feature(null), feature(line)]))).toMatchObject({ ok: true, warnings: [] })
    expect(codes(read(feature(null)))).toEqual(['no-line'])
    expect(codes(read(collection([])))).toEqual(['no-line'])
    expect(codes(read({ type: 'FeatureCollection' }))).toEqual(['geojson-shape'])
  })

  it('an id may be a text or a number', () => {
    for (const id of ['bend', 17]) expect(read(feature(line, { id }))).toMatchObject({ ok: true, warnings: [] })
  })
})

describe('4, 5: reference system and bounding box', () => {
  it('a crs member other than CRS84 is told and not followed', () => {
    const crs = (name: string) => ({ crs: { type: 'name', properties: { name } } })
    expect(codes(read({ ...line, ...crs('urn:ogc:def:crs:OGC:1.3:CRS84') }))).toEqual([])
    const other = read({ ...line, ...crs('urn:ogc:def:crs:EPSG::3857') })
    expect(codes(other)).toEqual(['crs-ignored'])
    expect(other.ok && other.layout.positions).toEqual(places)
  })

  it('heights are above the WGS 84 ellipsoid', () => {
    expect(read({ type: 'LineString', coordinates: ring.map((place) => [...place, 3]) })).toMatchObject({
      layout: { heightDatum: 'ellipsoid' },
    })
  })

  it.each([
    // 5.2: the Fiji archipelago, across the antimeridian. 5: two axes and three.
    [[177.0, -20.0, -178.0, -16.0], []],
    [[100.0, 0.0, -100.0, 105.0, 1.0, 0.0], []],
    [[177.0, -20.0, -178.0], ['bbox-ignored']],
    ['none', ['bbox-ignored']],
  ])('a bbox of %j', (bbox, warned) => {
    expect(codes(read(feature(line, { bbox })))).toEqual(warned)
    expect(read(feature(line, { bbox }))).toMatchObject({ ok: true })
  })
})

describe('6.1, 7.1: other members', () => {
  it('members that the text does not define are never an error', () => {
    expect(
      read(collection([feature(line, { style: { stroke: '#333' } })], { generator: 'shore', depth: [[1]] })),
    ).toMatchObject({
      ok: true,
      warnings: [],
    })
  })

  it.each([
    ['coordinates in a Feature', feature(line, { coordinates: [1, 2] })],
    ['properties in a FeatureCollection', collection([feature(line)], { properties: {} })],
    ['features in a geometry', { ...line, features: [] }],
  ])('%s are left out with a warning', (_, value) => {
    expect(codes(read(value))).toEqual(['member-not-allowed'])
    expect(read(value)).toMatchObject({ ok: true })
  })
})

it('the line that comes out is the one that went in, to the digit', () => {
  const reading = read(line)
  expect(reading.ok && reading.layout.positions.map(flat)).toEqual(places.map(flat))
})

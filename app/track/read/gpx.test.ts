import { describe, expect, it } from 'vitest'
import { readLayout } from '~/track/read-layout'
import { globe, oval, text } from '../../../tests/fixtures/circuits/shapes'

const places = globe(oval(40))
const points = (element: string, inside: (i: number) => string = () => '') =>
  [...places, places[0]!]
    .map(([lon, lat], i) => `<${element} lat="${lat}" lon="${lon}">${inside(i)}</${element}>`)
    .join('')
const gpx = (content: string, attributes = 'xmlns="http://www.topografix.com/GPX/1/1"') =>
  text(`<?xml version="1.0"?>\n<gpx version="1.1" creator="t" ${attributes}>\n${content}\n</gpx>`)
const track = (content: string) => `<trk><trkseg>${content}</trkseg></trk>`
const read = (bytes: Uint8Array) => readLayout(bytes, 'lap.gpx')

describe('Tracks and routes', () => {
  it('a track without times and heights is read', () => {
    expect(read(gpx(track(points('trkpt'))))).toMatchObject({ ok: true, layout: { positions: places }, warnings: [] })
  })

  it('a route is read where there is no track', () => {
    expect(read(gpx(`<rte><name>Shore</name>${points('rtept')}</rte>`))).toMatchObject({
      ok: true,
      layout: { name: 'Shore' },
    })
    expect(read(gpx(`<rte>${points('rtept')}</rte>${track(points('trkpt'))}`))).toMatchObject({
      ok: true,
      warnings: [{ code: 'routes-left-out' }],
    })
  })

  it('waypoints are left out with a warning, and are no line by themselves', () => {
    const way = '<wpt lat="55" lon="-14"/>'
    expect(read(gpx(way + track(points('trkpt'))))).toMatchObject({ ok: true, warnings: [{ code: 'points-ignored' }] })
    expect(read(gpx(way + way))).toMatchObject({ ok: false, problems: [{ code: 'no-line' }] })
  })

  it('elements with a prefix are read by their namespace', () => {
    const prefixed = track(points('trkpt')).replaceAll(/<(\/?)/g, '<$1gpx:')
    const bytes = text(`<gpx:gpx xmlns:gpx="http://www.topografix.com/GPX/1/1">${prefixed}</gpx:gpx>`)
    expect(read(bytes)).toMatchObject({ ok: true, layout: { positions: places } })
  })

  it('an element of another namespace is left out, whatever its name', () => {
    const strange = '<x:trkpt xmlns:x="urn:shore" lat="1" lon="2"><x:ele>3</x:ele></x:trkpt>'
    expect(read(gpx(track(strange + points('trkpt', () => '<x:ele xmlns:x="urn:shore">9</x:ele>'))))).toMatchObject({
      ok: true,
      layout: { positions: places },
    })
  })

  it('an undeclared prefix in extensions is passed over', () => {
    const extended = points(
      'trkpt',
      (i) => `<ele>${i / 2}</ele><extensions><tpx:hr>90</tpx:hr><ele>1</ele></extensions>`,
    )
    const reading = read(gpx(track(extended)))
    expect(reading.ok && reading.layout.positions.map(([, , height]) => height)).toEqual(places.map((_, i) => i / 2))
    expect(reading).toMatchObject({ layout: { heightDatum: 'sea-level' } })
  })

  it('a point without a time does not shift the times of the others', () => {
    const timed = points('trkpt', (i) =>
      i === 5 ? '' : `<time>2026-04-11T10:00:${String(i).padStart(2, '0')}Z</time>`,
    )
    expect(read(gpx(track(timed)))).toMatchObject({ ok: true, laps: [{ seconds: 40, gapSeconds: 2 }] })
  })

  it('a height that is no decimal number is left out with a warning', () => {
    const reading = read(gpx(track(points('trkpt', (i) => `<ele>${i === 2 ? '0x25' : i}</ele>`))))
    expect(reading).toMatchObject({ ok: true, warnings: [{ code: 'heights-left-out' }] })
    expect(reading.ok && reading.layout.positions[2]).toEqual(places[2])
  })
})

describe('Coordinates that are not right', () => {
  it.each([
    ['lat="0x25" lon="-14"', 'not-a-number'],
    ['lat="1e999" lon="-14"', 'not-a-number'],
    ['lat="NaN" lon="-14"', 'not-a-number'],
    ['lat="55" lon="Infinity"', 'not-a-number'],
    ['lat="55"', 'coordinates-missing'],
    ['lat="" lon="-14"', 'coordinates-missing'],
    ['lat="-114.2" lon="55"', 'swapped-axes'],
    ['lat="91" lon="120"', 'out-of-range'],
    ['lat="55" lon="-180.5"', 'out-of-range'],
  ])('<trkpt %s> is refused with its line', (attributes, code) => {
    expect(read(gpx(`${track(`\n<trkpt ${attributes}/>${points('trkpt')}`)}`))).toMatchObject({
      ok: false,
      problems: [{ code, where: 'line 4' }],
    })
  })

  it('a decimal comma is read as a point, with a warning', () => {
    const commas = track(points('trkpt', () => '<ele>3,5</ele>')).replaceAll(/"(-?\d+)\.(\d+)"/g, '"$1,$2"')
    const reading = read(gpx(commas))
    expect(reading).toMatchObject({ ok: true, layout: { positions: places.map((place) => [...place, 3.5]) } })
    expect(reading).toMatchObject({ warnings: [{ code: 'decimal-comma' }] })
  })
})

describe('XML that is not right', () => {
  it.each([
    ['a document type', '<!DOCTYPE gpx SYSTEM "file:///etc/passwd"><gpx/>', 'xml-doctype'],
    ['entities that grow', '<!DOCTYPE g [<!ENTITY a "aa"><!ENTITY b "&a;&a;">]><gpx>&b;</gpx>', 'xml-doctype'],
    ['a document type that never ends', `<!DOCTYPE g [${'<!ENTITY a "b">'.repeat(9000)}`, 'xml-doctype'],
    ['an unknown entity', '<gpx><name>&sand;</name></gpx>', 'xml-broken'],
    ['an end that is missing', '<gpx><trk><trkseg>', 'xml-broken'],
    ['an end that does not fit', '<gpx><trk></gpx>', 'xml-broken'],
    ['a second root', '<gpx/><gpx/>', 'xml-broken'],
    ['deep nesting', `<gpx>${'<a>'.repeat(70)}`, 'xml-too-deep'],
    ['many attributes', `<gpx ${Array.from({ length: 70 }, (_, i) => `a${i}=""`).join(' ')}/>`, 'xml-broken'],
  ])('%s is refused', (_, content, code) => {
    expect(read(text(content))).toMatchObject({ ok: false, problems: [{ code }] })
  })
})

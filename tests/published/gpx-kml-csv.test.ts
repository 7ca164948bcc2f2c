/**
 * GPX 1.1 (schema http://www.topografix.com/GPX/1/1/gpx.xsd; ranges as a third party quotes them), KML 2.2 (OGC 07-147r2,
 * quoted; gx:coord from memory) and CSV (RFC 4180, from memory): what they ask of a reader.
 */
import { describe, expect, it } from 'vitest'
import { type LayoutReading, readLayout } from '~/track/read-layout'
import { globe, oval, text } from '../fixtures/circuits/shapes'

const places = globe(oval(30))
const ring = [...places, places[0]!]
const codes = (reading: LayoutReading) => (reading.ok ? reading.warnings : reading.problems).map(({ code }) => code)

describe('GPX 1.1', () => {
  const gpx = (content: string) =>
    readLayout(
      text(`<gpx version="1.1" creator="t" xmlns="http://www.topografix.com/GPX/1/1">${content}</gpx>`),
      'c.gpx',
    )
  const point = (lon: number, lat: number, inside = '') => `<trkpt lat="${lat}" lon="${lon}">${inside}</trkpt>`
  const track = (points: string) => `<trk><trkseg>${points}</trkseg></trk>`
  const lap = (inside: (i: number) => string = () => '') =>
    ring.map(([lon, lat], i) => point(lon, lat, inside(i))).join('')

  it.each([
    [-180, 12, []],
    [179.999999, 12, []],
    [180, 12, ['out-of-range']],
    [-180.000001, 12, ['out-of-range']],
    [33, 90, []],
    [33, -90, []],
    [33, 90.000001, ['swapped-axes']],
    [120, -90.000001, ['out-of-range']],
  ])('−180 ≤ lon < 180 and −90 ≤ lat ≤ 90: %d, %d', (lon, lat, refused) => {
    const strange = codes(gpx(track(point(lon, lat) + lap()))).filter((code) => /range|axes/.test(code))
    expect(strange).toEqual(refused)
  })

  it('a time is in UTC, or is converted from its zone; fractions of a second count', () => {
    const zones = (i: number) => {
      const seconds = (i / 4).toFixed(2).padStart(5, '0')
      return `<time>${i % 2 ? `2026-04-11T12:00:${seconds}+02:00` : `2026-04-11T10:00:${seconds}Z`}</time>`
    }
    expect(gpx(track(lap(zones)))).toMatchObject({ ok: true, laps: [{ seconds: 7.5, gapSeconds: 0.25 }] })
  })

  it('time and height may be missing', () => {
    const reading = gpx(track(lap((i) => (i % 2 ? `<ele>${i}</ele>` : ''))))
    expect(reading.ok && reading.layout.positions.map((position) => position.length)).toEqual(
      places.map((_, i) => (i % 2 ? 3 : 2)),
    )
  })

  it('a track without segments, and a segment of one point, are passed over', () => {
    expect(gpx(`<trk/>${track('')}${track(point(-14, 55))}${track(lap())}`)).toMatchObject({
      ok: true,
      layout: { positions: places },
    })
    expect(codes(gpx('<trk><name>empty</name></trk>'))).toEqual(['no-line'])
    expect(codes(gpx(track(point(-14, 55))))).toEqual(['line-too-short'])
  })

  it('extensions of any kind are passed over', () => {
    const extensions = '<extensions><v:speed xmlns:v="urn:v">31</v:speed><trkpt lat="x"/></extensions>'
    expect(gpx(track(lap(() => extensions)) + extensions)).toMatchObject({ ok: true, layout: { positions: places } })
  })

  it('a lost fix begins a new segment, and no line is drawn to it', () => {
    const points = ring.map(([lon, lat]) => point(lon, lat))
    const cut = `<trk><trkseg>${points.slice(0, 17).join('')}</trkseg><trkseg>${points.slice(17).join('')}</trkseg></trk>`
    const timed = cut.replaceAll('></trkpt>', '><time>2026-04-11T10:00:00Z</time></trkpt>')
    expect(gpx(timed)).toMatchObject({ ok: false, problems: [{ code: 'ring-open' }] })
  })

  it('external entities and entities that grow are refused', () => {
    const external = '<!DOCTYPE gpx [<!ENTITY x SYSTEM "file:///etc/hostname">]><gpx><name>&x;</name></gpx>'
    const growing = `<!DOCTYPE gpx [<!ENTITY a "ha">${Array.from({ length: 9 }, (_, i) => `<!ENTITY ${'bcdefghij'[i]} "${`&${'abcdefghi'[i]};`.repeat(10)}">`).join('')}]><gpx><name>&j;</name></gpx>`
    expect(codes(readLayout(text(external), 'c.gpx'))).toEqual(['xml-doctype'])
    expect(codes(readLayout(text(growing), 'c.gpx'))).toEqual(['xml-doctype'])
  })
})

describe('KML 2.2', () => {
  const kml = (content: string) =>
    readLayout(text(`<kml xmlns="http://www.opengis.net/kml/2.2"><Placemark>${content}</Placemark></kml>`), 'c.kml')
  const tuples = ring.map(([lon, lat], i) => `${lon},${lat},${i}`)
  const line = (mode: string) =>
    `<LineString>${mode}<coordinates>\n\t${tuples.join('\n ')}\t</coordinates></LineString>`

  it('a longitude of 180 is allowed, a latitude past 90 is not', () => {
    const first = (tuple: string) =>
      codes(kml(`<LineString><coordinates>${[tuple, ...tuples].join(' ')}</coordinates></LineString>`))
    expect(first('180,12')).toEqual(['too-long'])
    expect(first('180.5,12')).toEqual(['out-of-range'])
    expect(first('120,90.5')).toEqual(['out-of-range'])
  })

  it('an altitude counts only where the altitude mode is not clampToGround, the default', () => {
    const heights = (mode: string) => {
      const reading = kml(line(mode))
      return reading.ok && [...new Set(reading.layout.positions.map((position) => position.length))]
    }
    expect(heights('<altitudeMode>absolute</altitudeMode>')).toEqual([3])
    expect(heights('<altitudeMode>clampToGround</altitudeMode>')).toEqual([2])
    expect(heights('')).toEqual([2])
  })

  it('altitudes are above sea level', () => {
    expect(kml(line('<altitudeMode>absolute</altitudeMode>'))).toMatchObject({ layout: { heightDatum: 'sea-level' } })
  })

  it('gx:coord separates its numbers by blanks', () => {
    const coords = ring.map(([lon, lat]) => `<gx:coord>${lon} ${lat} 4.5</gx:coord>`).join('')
    const track = `<gx:Track xmlns:gx="http://www.google.com/kml/ext/2.2"><altitudeMode>absolute</altitudeMode>${coords}</gx:Track>`
    expect(kml(track)).toMatchObject({ ok: true, layout: { positions: places.map((place) => [...place, 4.5]) } })
  })

  it('a KMZ is a zip archive and is not unpacked', () => {
    const zip = new Uint8Array([0x50, 0x4b, 0x03, 0x04, 0x14, 0, 0, 0, 8, 0])
    expect(codes(readLayout(zip, 'c.kmz'))).toEqual(['not-the-format'])
  })
})

describe('CSV, RFC 4180', () => {
  const rows = (separator: string, end: string) =>
    [['note', 'lon', 'lat'], ...ring.map(([lon, lat], i) => [i === 3 ? '"a ""b"", c"' : 'd', String(lon), String(lat)])]
      .map((row) => row.join(separator))
      .join(end)
  const csv = (content: string) => readLayout(text(content), 'c.csv')

  it.each([
    ['CRLF', ',', '\r\n'],
    ['LF', ',', '\n'],
    ['semicolons', ';', '\r\n'],
  ])('%s: quotation marks are doubled inside quoted fields', (_, separator, end) => {
    expect(csv(rows(separator, end))).toMatchObject({ ok: true, layout: { positions: places } })
    expect(csv(rows(separator, end) + end)).toMatchObject({ ok: true, layout: { positions: places } })
  })

  it('a byte order mark and decimal commas are read with a warning', () => {
    const commas = ring.map((place) => place.map((value) => String(value).replace('.', ',')).join(';')).join('\r\n')
    const reading = csv(`\uFEFFlon;lat\r\n${commas}`)
    expect(reading).toMatchObject({ ok: true, layout: { positions: places } })
    expect(codes(reading)).toEqual(['byte-order-mark', 'decimal-comma'])
  })
})

/** Files made to exhaust a reader: time, memory or stack. Each near the 20 MB that are read at most. */
import { drive, gpxOf, repeatable, sandbarLoop } from '../fixtures/circuits/make'

const size = 20 * 1024 * 1024 - 4096

/** `part` again and again between a head and a tail, up to the size. */
function filled(head: string, part: string, tail: string, most = size): string {
  const times = Math.floor((most - head.length - tail.length) / part.length)
  return head + part.repeat(times) + tail
}

/** Parts made one by one until the size is reached. */
function made(head: string, part: (i: number) => string, tail: string, most = size): string {
  const parts = [head]
  let length = head.length + tail.length
  for (let i = 0; length < most; i++) {
    const next = part(i)
    length += next.length
    parts.push(next)
  }
  parts.push(tail)
  return parts.join('')
}

const gpxHead = '<gpx version="1.1" creator="t" xmlns="http://www.topografix.com/GPX/1/1"><trk><trkseg>\n'
const gpxTail = '</trkseg></trk></gpx>'
const kmlHead = '<kml xmlns="http://www.opengis.net/kml/2.2"><Placemark><LineString><coordinates>'
const kmlTail = '</coordinates></LineString></Placemark></kml>'
const line = (coordinates: string) => `{"type":"LineString","coordinates":[${coordinates}]}`

/** A place on an oval of 3 km, a little off it, for the i-th of `n` positions and `rounds` times round. */
function onOval(i: number, n: number, rounds: number, off: number): [number, number] {
  const turn = (2 * Math.PI * rounds * i) / n
  return [-14 + (0.0085 + off) * Math.cos(turn), 55 + (0.0035 + off) * Math.sin(turn)]
}

const random = repeatable(4711)

function denseJson(): string {
  const parts: string[] = []
  const n = 590_000
  for (let i = 0; i < n; i++)
    parts.push(
      `[${onOval(i, n, 1, 0)
        .map((v) => v.toFixed(10))
        .join(',')}]`,
    )
  return line(parts.join(','))
}

function jitterJson(): string {
  const parts: string[] = []
  const n = 590_000
  for (let i = 0; i < n; i++)
    parts.push(
      `[${onOval(i, n, 1, 3e-5 * random())
        .map((v) => v.toFixed(8))
        .join(',')}]`,
    )
  return line(parts.join(','))
}

/** Zigzags of three metres, one on the other without crossing. */
function zigzagJson(): string {
  const parts: string[] = []
  for (let i = 0; i < 19_000; i++) {
    const x = -14 + (i % 2) * 2e-5 + i * 1e-11
    parts.push(`[${x.toFixed(12)},${(55 + i * 1e-12 + (i % 2) * 5e-7).toFixed(13)}]`)
  }
  return line(parts.join(','))
}

function denseGpx(): string {
  const n = 215_000
  const second = (i: number) =>
    `${String(Math.floor(i / 3600) % 24).padStart(2, '0')}:${String(Math.floor(i / 60) % 60).padStart(2, '0')}:${String(i % 60).padStart(2, '0')}`
  return made(
    gpxHead,
    (i) => {
      const [lon, lat] = onOval(i, n, 90, 1e-5 * random())
      return `<trkpt lat="${lat.toFixed(7)}" lon="${lon.toFixed(7)}"><ele>${(i % 90) + 0.5}</ele><time>2026-05-01T${second(i)}Z</time></trkpt>\n`
    },
    gpxTail,
  )
}

function stillGpx(): string {
  return made(
    gpxHead,
    () => `<trkpt lat="${(55 + 1e-5 * random()).toFixed(6)}" lon="${(-14 + 1e-5 * random()).toFixed(6)}"/>`,
    gpxTail,
  )
}

function wildGpx(): string {
  return made(
    gpxHead,
    () => `<trkpt lat="${(180 * random() - 90).toFixed(3)}" lon="${(359 * random() - 180).toFixed(3)}"/>`,
    gpxTail,
  )
}

/** Straights to and fro over one place, all the same way through it. */
function overOnePlaceGpx(): string {
  return made(
    gpxHead,
    (i) => {
      const [x, y] = [
        [-200, 0],
        [200, 0],
        [200, 300],
        [-200, 300],
      ][i % 4] as [number, number]
      return `<trkpt lat="${(55 + (y + random()) * 9e-6).toFixed(6)}" lon="${(-14 + (x + random()) * 1.5e-5).toFixed(6)}"/>`
    },
    gpxTail,
  )
}

function segmentsGpx(): string {
  return made(
    gpxHead,
    (i) => {
      const [lon, lat] = onOval(i, 200_000, 30, 0)
      return `<trkpt lat="${lat.toFixed(6)}" lon="${lon.toFixed(6)}"/><trkpt lat="${(lat + 1e-5).toFixed(6)}" lon="${lon.toFixed(6)}"/></trkseg><trkseg>`
    },
    gpxTail,
  )
}

function piecesJson(): string {
  const parts: string[] = []
  for (let i = 0; i < 4990; i++) {
    const [a, b] = [onOval(i, 4990, 1, 0), onOval(i + 1, 4990, 1, 0)]
    parts.push(JSON.stringify(i % 3 ? [a, b] : [b, a]))
  }
  parts.sort(() => random() - 0.5)
  return `{"type":"MultiLineString","coordinates":[${parts.join(',')}]}`
}

const csv = (head: string, row: (i: number) => string) => made(`${head}\n`, row, '')

/** Every hostile file: its name and its text or bytes. */
export const hostileFiles: Readonly<Record<string, () => string | Uint8Array>> = {
  'nothing.geojson': () => '',
  'blanks.json': () => ' '.repeat(size),
  'one-long-text.json': () => filled('{"type":"Feature","name":"', 'x', '"}'),
  'escapes.json': () => filled('{"type":"Feature","name":"', '\\u00e9', '"}'),
  'numbers.json': () => filled('[', '0,', '0]'),
  'numbers-in-a-member.json': () => filled('{"type":"Feature","x":[', '0.5,', '0]}'),
  'numbers-as-a-position.json': () => filled(`{"type":"LineString","coordinates":[[`, '0.5,', '0]]}'),
  'texts.json': () => made('{"type":"Feature","x":[', (i) => `"${i.toString(36)}",`, '0]}'),
  'members.json': () => made('{"type":"Feature"', (i) => `,"${i.toString(36)}":0`, '}'),
  'objects.json': () =>
    made('{"type":"Feature","x":[', (i) => (i < 599_000 ? `{"k${i}":0},` : `"${'y'.repeat(1000)}",`), '0]}'),
  'features.json': () =>
    `{"type":"FeatureCollection","features":[${'{"type":"Feature","geometry":{"type":"Point","coordinates":[1,2]}},'.repeat(199_000)}{}]}`,
  'brackets.json': () => '['.repeat(size),
  'containers.json': () => filled('{"type":"Feature","x":[', '[],', '0]}'),
  'dense.geojson': denseJson,
  'jitter.geojson': jitterJson,
  'zigzag.geojson': zigzagJson,
  'pieces.geojson': piecesJson,
  'cut-off.geojson': () => denseJson().slice(0, 9_000_000),
  'wide.geojson': () =>
    new Uint8Array([
      0xff,
      0xfe,
      ...new Uint8Array(new Uint16Array(Array.from(denseJson().slice(0, 9_000_000), (c) => c.charCodeAt(0))).buffer),
    ]),
  'dense.gpx': denseGpx,
  'still.gpx': stillGpx,
  'wild.gpx': wildGpx,
  'over-one-place.gpx': overOnePlaceGpx,
  'segments.gpx': segmentsGpx,
  'two-hours.gpx': () => gpxOf('Long', [drive(0.1, 190_000, 9)]),
  'elements.gpx': () => filled('<gpx>', '<a/>', '</gpx>'),
  'nested.gpx': () => '<a>'.repeat(size / 3),
  'attributes.gpx': () => made('<gpx ', (i) => `a${i.toString(36)}="" `, '></gpx>'),
  'one-attribute.gpx': () => filled('<gpx a="', 'x', '"></gpx>'),
  'entities.gpx': () => filled('<gpx>', '&amp;', '</gpx>'),
  'entities-in-a-name.gpx': () => filled('<gpx><metadata><name>', '&amp;', '</name></metadata></gpx>'),
  'unknown-entities.gpx': () => filled('<gpx>', '&a;', '</gpx>'),
  'comment.gpx': () => filled('<gpx><!--', 'x', '--></gpx>'),
  'doctype.gpx': () => filled('<!DOCTYPE gpx [', '<!ENTITY a "b">', ']><gpx></gpx>'),
  'one-name.gpx': () => `<${'g'.repeat(size)}`,
  'namespaces.gpx': () => made('<gpx>', (i) => `<a xmlns:p${i}="u${i}"/>`, '</gpx>'),
  'tuples.kml': () => filled(kmlHead, '1,2 ', kmlTail),
  'spaced-tuples.kml': () =>
    made(
      kmlHead,
      (i) =>
        `${onOval(i, 400_000, 1, 0)
          .map((v) => v.toFixed(9))
          .join(' , ')} `,
      kmlTail,
    ),
  'coords.kml': () =>
    made(
      '<kml xmlns:gx="http://www.google.com/kml/ext/2.2"><Placemark><gx:Track>',
      (i) =>
        `<when>2026-05-01T10:00:00Z</when><gx:coord>${onOval(i, 200_000, 40, 0)
          .map((v) => v.toFixed(6))
          .join(' ')} 3</gx:coord>`,
      '</gx:Track></Placemark></kml>',
    ),
  'commas.kml': () => filled(kmlHead, ',', kmlTail),
  'line-ends.csv': () => '\n'.repeat(size),
  'rows.csv': () => csv('lon,lat', () => '0,0\n'),
  'dense.csv': () =>
    csv(
      'lon,lat,height,time',
      (i) =>
        `${onOval(i, 500_000, 60, 1e-5 * random())
          .map((v) => v.toFixed(8))
          .join(',')},12.5,${(i / 100).toFixed(2)}\n`,
    ),
  'quoted.csv': () =>
    csv(
      'lon;lat',
      (i) =>
        `"${onOval(i, 700_000, 1, 0)
          .map((v) => v.toFixed(7).replace('.', ','))
          .join('";"')}"\n`,
    ),
  'columns.csv': () => filled('lon,lat', ',', '\n1,2\n'),
  'open-quote.csv': () => filled('lon,lat\n1,2\n"', '1,2\n', ''),
  'quotes.csv': () => filled('lon,lat\n', '"', '\n'),
  'comments.csv': () => filled('lon,lat\n', '#\n', ''),
  'no-header.csv': () => filled('', '1.25,2.5\n', ''),
  'zeros.csv': () => new Uint8Array(size),
  'letters.bin': () => new Uint8Array(size).map(() => 33 + Math.floor(90 * random())),
  'noise.gpx': () => new Uint8Array(size).map(() => Math.floor(256 * random())),
  'metres.csv': () =>
    csv('x,y,right,left', (i) => {
      const point = sandbarLoop.length >= 0 ? onOval(i, 600_000, 1, 0) : [0, 0]
      return `${((point[0]! + 14) * 60_000).toFixed(4)},${((point[1]! - 55) * 110_000).toFixed(4)},5.5,4.5\n`
    }),
}

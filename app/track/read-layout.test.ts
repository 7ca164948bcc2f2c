import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { makePlane } from '~/track/plane'
import { type LayoutReading, largestFile, readLayout } from '~/track/read-layout'
import { loopLength, samples, sandbarLoop } from '../../tests/fixtures/circuits/make'
import { lineString, oval, text } from '../../tests/fixtures/circuits/shapes'

const lengthOf = (reading: LayoutReading): number => {
  if (!reading.ok) return Number.NaN
  const { positions } = reading.layout
  const spots = positions.map(makePlane(positions).toPlane)
  return spots.reduce((sum, spot, i) => {
    const next = spots[(i + 1) % spots.length]!
    return sum + Math.hypot(next.x - spot.x, next.y - spot.y)
  }, 0)
}

const firstMessage = (reading: LayoutReading) => (reading.ok ? '' : (reading.problems[0]?.message ?? ''))

const codes = (reading: LayoutReading) => (reading.ok ? reading.warnings : reading.problems).map(({ code }) => code)

describe('Every way in which the Sandbar Loop comes', () => {
  const truth = loopLength(sandbarLoop())
  const options = { 'sandbar-metres.csv': { anchor: [-14, 55] as const } }

  it.each(Object.keys(samples))('%s is read with the loop’s length within half a per cent', (name) => {
    const reading = readLayout(text(samples[name]!()), name, options[name as keyof typeof options])
    expect(reading).toMatchObject({ ok: true })
    expect(Math.abs(lengthOf(reading) / truth - 1)).toBeLessThan(0.005)
  })

  it('the drawn ones run the way they are driven', () => {
    const readings = ['sandbar-pieces.geojson', 'sandbar.kml', 'sandbar-semicolon.csv'].map((name) =>
      readLayout(text(samples[name]!()), name),
    )
    const areas = readings.map((reading) => {
      const { positions } = (reading as Extract<LayoutReading, { ok: true }>).layout
      return positions.reduce((sum, [x, y], i) => {
        const [nextX, nextY] = positions[(i + 1) % positions.length]!
        return sum + x * nextY - nextX * y
      }, 0)
    })
    expect(areas.map(Math.sign)).toEqual([1, 1, 1])
  })

  it('the first position is not repeated at the end', () => {
    for (const [name, make] of Object.entries(samples)) {
      const reading = readLayout(text(make()), name, { anchor: [-14, 55] })
      const { positions } = (reading as Extract<LayoutReading, { ok: true }>).layout
      expect(positions.at(-1)).not.toEqual(positions[0])
    }
  })

  it('a name in the file is the layout’s name', () => {
    expect(readLayout(text(samples['sandbar.kml']!()), 'sandbar.kml')).toMatchObject({
      layout: { name: 'Sandbar Loop' },
    })
    expect(readLayout(text(samples['sandbar.gpx']!()), 'sandbar.gpx')).toMatchObject({
      layout: { name: 'Sandbar Loop' },
    })
  })
})

describe('What a message says', () => {
  it('names the file, the place and the remedy', () => {
    const bytes = text('lon,lat\n-14.01,55.01\n-14.02,155.02\n')
    expect(readLayout(bytes, 'shore.csv')).toEqual({
      ok: false,
      problems: [
        {
          code: 'swapped-axes',
          message:
            'shore.csv, line 3: Longitude and latitude look swapped: 155.02 stands where a latitude belongs. Put the longitude first.',
          where: 'line 3',
        },
      ],
    })
  })

  it('tells the gap of a line that does not close, and that it can be closed', () => {
    const reading = readLayout(lineString(oval(60).slice(0, 55), { open: true }), 'shore.geojson')
    expect(reading).toMatchObject({ ok: false, problems: [{ code: 'ring-open', remedy: 'close' }] })
    const message = firstMessage(reading)
    expect(message).toMatch(
      /^shore\.geojson: The centreline does not close\. The last point is \d{3}\u00A0m from the first\./,
    )
  })

  it('shows a file’s name on one line and cut short', () => {
    const reading = readLayout(text(''), `${'long'.repeat(80)}\n\u202E.gpx`)
    const message = firstMessage(reading)
    expect(message.startsWith(`${'long'.repeat(30)}…: `)).toBe(true)
  })
})

describe('Remedies', () => {
  it('a wide gap is closed when asked for', () => {
    const open = lineString(oval(60).slice(0, 50), { open: true })
    expect(readLayout(open, 'a.geojson')).toMatchObject({ ok: false })
    const closed = readLayout(open, 'a.geojson', { close: true })
    expect(closed).toMatchObject({ ok: true })
    expect(codes(closed)).toEqual(['ring-closed'])
  })

  it('metres are laid round the anchor that is given', () => {
    const bytes = text(samples['sandbar-metres.csv']!())
    expect(readLayout(bytes, 'm.csv')).toMatchObject({
      ok: false,
      problems: [{ code: 'anchor-needed', remedy: 'give-anchor' }],
    })
    const reading = readLayout(bytes, 'm.csv', { anchor: [179.998, -41.5] })
    const { positions } = (reading as Extract<LayoutReading, { ok: true }>).layout
    expect(positions.some(([lon]) => lon < -179.9)).toBe(true)
    expect(lengthOf(reading)).toBeCloseTo(lengthOf(readLayout(bytes, 'm.csv', { anchor: [-14, 55] })), 1)
    expect(codes(readLayout(bytes, 'm.csv', { anchor: [10, 95] }))).toEqual(['anchor-out-of-range'])
  })
})

describe('Any bytes end in an answer', () => {
  const names = ['a.geojson', 'a.json', 'a.gpx', 'a.kml', 'a.csv', 'a.txt', 'a', '']
  const answers = (bytes: Uint8Array, name: string) => {
    const reading = readLayout(bytes, name, { anchor: [3, 4] })
    if (!reading.ok) return reading.problems.length > 0 && reading.problems.every(({ message }) => message.length > 10)
    const { positions } = reading.layout
    return (
      positions.length >= 8 &&
      positions.every(([lon, lat]) => Math.abs(lon) <= 180 && Math.abs(lat) <= 90) &&
      lengthOf(reading) >= 300
    )
  }

  it('random bytes', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 300 }), fc.constantFrom(...names), (bytes, name) => answers(bytes, name)),
      { numRuns: 500 },
    )
  })

  it('random text of the signs that the formats are made of', () => {
    const sign = fc.constantFrom(
      ...'{}[]":,0123456789.-eE<>/=?! \n\r\t;#lonatxygpk'.split(''),
      '<gpx>',
      '<trkpt lat="1" lon="2"/>',
      '"type":"LineString"',
      'coordinates',
      '<!--',
      ']]>',
      '<![CDATA[',
      '&amp;',
      '\u0000',
      '\uFEFF',
    )
    fc.assert(
      fc.property(fc.array(sign, { maxLength: 80 }), fc.constantFrom(...names), (signs, name) =>
        answers(text(signs.join('')), name),
      ),
      { numRuns: 1000 },
    )
  })

  it.each(Object.keys(samples).filter((name) => !name.includes('ten')))(
    '%s with bytes changed, or cut off anywhere',
    (name) => {
      const whole = text(samples[name]!())
      const change = fc.tuple(fc.nat(whole.length - 1), fc.nat(255))
      fc.assert(
        fc.property(
          fc.array(change, { maxLength: 6 }),
          fc.integer({ min: 0, max: 2 * whole.length }),
          (changes, length) => {
            const bytes = whole.slice(0, length)
            for (const [at, byte] of changes) if (at < bytes.length) bytes[at] = byte
            return answers(bytes, name)
          },
        ),
        { numRuns: 150 },
      )
    },
  )
})

describe('The file before it is read', () => {
  it.each([
    ['nothing', new Uint8Array(), 'a.gpx', 'file-empty'],
    ['blanks only', text(' \n\t '), 'a.csv', 'file-empty'],
    ['a byte order mark alone', new Uint8Array([0xef, 0xbb, 0xbf]), 'a.csv', 'file-empty'],
    ['a byte more than 20 MB', new Uint8Array(largestFile + 1).fill(32), 'a.csv', 'file-too-large'],
    ['a zip archive', new Uint8Array([0x50, 0x4b, 3, 4, 20]), 'a.kml', 'not-the-format'],
    ['a PNG picture', new Uint8Array([0x89, 0x50, 0x4e, 0x47, 13, 10]), 'a.gpx', 'not-the-format'],
    ['zero bytes', new Uint8Array(90), 'a.csv', 'not-the-format'],
    ['a web page', text('<!DOCTYPE html><html><body>Sign in</body></html>'), 'a.gpx', 'not-the-format'],
    ['a web page in small letters', text('<!doctype html><p>Sign in<br>'), 'a.csv', 'not-the-format'],
    ['a web page without a document type', text('<html><head></head></html>'), 'a.kml', 'not-the-format'],
    ['XML of another kind', text('<svg xmlns="http://www.w3.org/2000/svg"/>'), 'a.xml', 'not-the-format'],
    ['GeoJSON named as GPX', lineString(oval(40)), 'a.gpx', 'not-the-format'],
    ['GeoJSON named as CSV', lineString(oval(40)), 'a.csv', 'not-the-format'],
    ['KML named as GPX', text('<kml/>'), 'a.gpx', 'not-the-format'],
    ['text named as GeoJSON', text('lon,lat\n1,2\n'), 'a.geojson', 'not-the-format'],
    ['an encoding nobody knows', text('<?xml version="1.0" encoding="sand-7"?><gpx/>'), 'a.gpx', 'unknown-encoding'],
  ])('%s is refused', (_, bytes, name, code) => {
    expect(codes(readLayout(bytes, name))).toEqual([code])
  })

  it('a file without an ending is read by its content', () => {
    expect(readLayout(lineString(oval(40)), 'centreline')).toMatchObject({ ok: true, format: 'geojson' })
  })

  it('byte order marks of UTF-8 and of UTF-16 in both orders are left out with a warning', () => {
    const content = new TextDecoder().decode(lineString(oval(40)))
    const little = new Uint8Array(new Uint16Array(Array.from(`\uFEFF${content}`, (c) => c.charCodeAt(0))).buffer)
    const big = little.map((_, i) => little[i ^ 1]!)
    const readings = [text(`\uFEFF${content}`), little, big].map((bytes) => readLayout(bytes, 'a.geojson'))
    expect(readings.map(codes)).toEqual([['byte-order-mark'], ['byte-order-mark'], ['byte-order-mark']])
    expect(readings.map((reading) => reading.ok && reading.layout.positions.length)).toEqual([40, 40, 40])
  })

  it('XML in an encoding that its declaration names is read', () => {
    const head = '<?xml version="1.0" encoding="ISO-8859-1"?><gpx><rte><name>D\u00FCne</name>'
    const points = new TextDecoder().decode(lineString(oval(40)))
    const route = (JSON.parse(points) as { coordinates: number[][] }).coordinates.map(
      ([lon, lat]) => `<rtept lat="${lat}" lon="${lon}"/>`,
    )
    const bytes = Uint8Array.from(`${head}${route.join('')}</rte></gpx>`, (c) => c.charCodeAt(0))
    expect(readLayout(bytes, 'd.gpx')).toMatchObject({ ok: true, layout: { name: 'D\u00FCne' } })
  })
})

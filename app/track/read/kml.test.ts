import { describe, expect, it } from 'vitest'
import { readLayout } from '~/track/read-layout'
import { globe, oval, text } from '../../../tests/fixtures/circuits/shapes'

const places = globe(oval(40))
const closed = [...places, places[0]!]
const tuples = (height?: (i: number) => number) =>
  closed.map(([lon, lat], i) => `${lon},${lat}${height ? `,${height(i)}` : ''}`).join('\n')
const kml = (content: string) =>
  text(
    `<kml xmlns="http://www.opengis.net/kml/2.2" xmlns:gx="http://www.google.com/kml/ext/2.2"><Placemark><name>Spit</name>${content}</Placemark></kml>`,
  )
const lineString = (coordinates: string, mode = '') =>
  `<LineString>${mode}<coordinates>${coordinates}</coordinates></LineString>`
const read = (bytes: Uint8Array) => readLayout(bytes, 'spit.kml')
const heightsOf = (reading: ReturnType<typeof read>) =>
  reading.ok ? reading.layout.positions.map(([, , height]) => height) : []

describe('Lines of a KML file', () => {
  it.each([
    ['a LineString', lineString(tuples())],
    ['a LinearRing', `<LinearRing><coordinates>${tuples()}</coordinates></LinearRing>`],
    [
      'a Polygon',
      `<Polygon><outerBoundaryIs><LinearRing><coordinates>${tuples()}</coordinates></LinearRing></outerBoundaryIs></Polygon>`,
    ],
    ['a MultiGeometry', `<MultiGeometry>${lineString(tuples())}</MultiGeometry>`],
    ['a gx:Track', `<gx:Track>${closed.map(([lon, lat]) => `<gx:coord>${lon} ${lat}</gx:coord>`).join('')}</gx:Track>`],
  ])('%s is read', (_, content) => {
    expect(read(kml(content))).toMatchObject({ ok: true, layout: { name: 'Spit', positions: places }, warnings: [] })
  })

  it('points beside the line are left out with a warning', () => {
    const point = '<Point><coordinates>-14.5,55.5</coordinates></Point>'
    expect(read(kml(`<MultiGeometry>${point}${lineString(tuples())}</MultiGeometry>`))).toMatchObject({
      ok: true,
      layout: { positions: places },
      warnings: [{ code: 'points-ignored' }],
    })
    expect(read(kml(point))).toMatchObject({ ok: false, problems: [{ code: 'no-line' }] })
  })

  it('blanks next to the commas are read, with a warning', () => {
    const spaced = tuples((i) => i).replaceAll(',', ' , ')
    const reading = read(kml(lineString(spaced, '<altitudeMode>absolute</altitudeMode>')))
    expect(reading).toMatchObject({ ok: true, warnings: [{ code: 'blanks-in-coordinates' }] })
    expect(heightsOf(reading)).toEqual(places.map((_, i) => i))
  })

  it.each([
    ['positions without commas', tuples().replaceAll(',', ' '), 'coordinates-broken'],
    [
      'decimal commas',
      tuples((i) => i + 0.5)
        .split('\n')
        .slice(1)
        .join(' ')
        .replaceAll('.', ','),
      'coordinates-broken',
    ],
    ['a word', tuples().replace(/^[^,]+/, 'west'), 'not-a-number'],
    ['axes the other way round', closed.map(([lon, lat]) => `${lat},${lon * 10}`).join(' '), 'swapped-axes'],
  ])('%s are refused with the position', (_, coordinates, code) => {
    expect(read(kml(lineString(coordinates)))).toMatchObject({
      ok: false,
      problems: [{ code, where: 'line 1, position 1' }],
    })
  })

  it('a fourth value is left out with a warning', () => {
    const four = tuples((i) => i).replaceAll('\n', ',1\n')
    expect(read(kml(lineString(four)))).toMatchObject({
      ok: true,
      warnings: [{ code: 'heights-left-out' }, { code: 'extra-coordinate' }],
    })
  })
})

describe('Heights of a KML file', () => {
  const height = (i: number) => 5 + i / 8

  it('count where the altitude mode is absolute, before or after the coordinates', () => {
    const mode = '<altitudeMode>absolute</altitudeMode>'
    const after = `<LineString><coordinates>${tuples(height)}</coordinates>${mode}</LineString>`
    for (const content of [lineString(tuples(height), mode), after]) {
      expect(heightsOf(read(kml(content)))).toEqual(places.map((_, i) => height(i)))
    }
  })

  it.each(['', '<altitudeMode>clampToGround</altitudeMode>', '<altitudeMode>relativeToGround</altitudeMode>'])(
    'are left out with a warning where it is %j',
    (mode) => {
      const reading = read(kml(lineString(tuples(height), mode)))
      expect(reading).toMatchObject({ ok: true, warnings: [{ code: 'heights-left-out' }] })
      expect(heightsOf(reading)).toEqual(places.map(() => undefined))
    },
  )
})

describe('A recorded track in a KML file', () => {
  const when = (i: number) => `<when>2026-04-11T10:00:${String(i % 60).padStart(2, '0')}Z</when>`
  const coord = (i: number) => `<gx:coord>${closed[i]!.join(' ')} ${i}</gx:coord>`
  const all = closed.map((_, i) => i)

  it('takes the n-th time for the n-th position, in lists or turn about', () => {
    for (const content of [
      all.map(when).join('') + all.map(coord).join(''),
      all.map((i) => when(i) + coord(i)).join(''),
    ]) {
      expect(read(kml(`<gx:Track>${content}</gx:Track>`))).toMatchObject({
        ok: true,
        laps: [{ seconds: 40, gapSeconds: 1 }],
      })
    }
  })

  it('is cut at a blank position, which is a pause', () => {
    const paused = all.map((i) => (i === 20 ? '<gx:coord></gx:coord>' : coord(i))).join('')
    expect(read(kml(`<gx:Track>${all.map(when).join('')}${paused}</gx:Track>`))).toMatchObject({
      ok: false,
      problems: [{ code: 'ring-open' }],
    })
  })
})

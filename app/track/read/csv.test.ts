import { describe, expect, it } from 'vitest'
import { readLayout } from '~/track/read-layout'
import { globe, oval, text } from '../../../tests/fixtures/circuits/shapes'

const places = globe(oval(40))
const closed = [...places, places[0]!]
const table = (header: string, row: (lon: number, lat: number, i: number) => string, end = '\n') =>
  [header, ...closed.map(([lon, lat], i) => row(lon, lat, i))].join(end)
const read = (content: string, options = {}) => readLayout(text(content), 'shore.csv', options)

describe('Columns by the names in the header', () => {
  it.each([
    ['lon,lat', (lon: number, lat: number) => `${lon},${lat}`],
    ['Latitude,Longitude', (lon: number, lat: number) => `${lat},${lon}`],
    [
      '#,GPS Lat (deg),lat accel (g),GPS Long (deg)',
      (lon: number, lat: number, i: number) => `${i},${lat},0.${i},${lon}`,
    ],
    ['posLat|posLng', (lon: number, lat: number) => `${lat}|${lon}`],
    ['lng\tlat', (lon: number, lat: number) => `${lon}\t${lat}`],
    ['name;lon;lat', (lon: number, lat: number) => `"a;""b""";${lon};"${lat}"`],
  ])('%j', (header, row) => {
    expect(read(table(header, row))).toMatchObject({ ok: true, layout: { positions: places }, warnings: [] })
  })

  it('heights, and widths to both sides, stay with their positions', () => {
    const content = table(
      'lon,lat,elevation,width_right,width_left',
      (lon, lat, i) => `${lon},${lat},${i},${4 + i / 10},${7 - i / 10}`,
    )
    const lines = content.split('\n')
    const reading = read([...lines.slice(0, 6), lines[5], ...lines.slice(6)].join('\n'))
    expect(reading).toMatchObject({ ok: true, warnings: [{ code: 'duplicate-positions' }] })
    expect(reading.ok && reading.layout.positions.map(([, , height]) => height)).toEqual(places.map((_, i) => i))
    expect(reading.ok && reading.layout.widths).toEqual(places.map((_, i) => ({ right: 4 + i / 10, left: 7 - i / 10 })))
  })

  it('comments, lines before the header, a row of units and blank lines are passed over', () => {
    const content = table('lon,lat', (lon, lat, i) => (i === 3 ? `# pits\n\n${lon},${lat}` : `${lon},${lat}`), '\r\n')
    const [header, ...rows] = content.split('\r\n')
    const dressed = ['# made at the shore', 'Session,Saturday', header, 'deg,deg', ...rows].join('\r\n')
    expect(read(dressed)).toMatchObject({ ok: true, layout: { positions: places }, warnings: [] })
  })

  it('a first line tells the delimiter, and decimal commas are read with a warning', () => {
    const content = table('sep=;\nlon;lat', (lon, lat) => `${lon};${lat}`.replaceAll('.', ','))
    expect(read(content)).toMatchObject({
      ok: true,
      layout: { positions: places },
      warnings: [{ code: 'decimal-comma' }],
    })
    const inQuotes = table(
      'lon,lat',
      (lon, lat) => `"${String(lon).replace('.', ',')}","${String(lat).replace('.', ',')}"`,
    )
    expect(read(inQuotes)).toMatchObject({
      ok: true,
      layout: { positions: places },
      warnings: [{ code: 'decimal-comma' }],
    })
  })

  it('line ends of carriage returns alone are line ends', () => {
    expect(read(table('lon,lat', (lon, lat) => `${lon},${lat}`, '\r'))).toMatchObject({
      ok: true,
      layout: { positions: places },
    })
  })
})

describe('Metres', () => {
  const metres = (header: string) => [header, ...oval(40).map(([x, y]) => `${x},${y},5,6`)].join('\n')

  it('a header behind a number sign is a header', () => {
    const reading = read(metres('# x_m, y_m, w_tr_right_m, w_tr_left_m'), { anchor: [-14, 55] })
    expect(reading).toMatchObject({ ok: true, warnings: [{ code: 'ring-closed' }] })
    const [first] = reading.ok ? reading.layout.positions : []
    expect(first![0]).toBeCloseTo(places[0]![0], 9)
    expect(first![1]).toBeCloseTo(places[0]![1], 9)
    expect(reading.ok && reading.layout.widths![0]).toEqual({ right: 5, left: 6 })
  })

  it.each([
    ['a point 40 km off', '40000,0,5,6', 'out-of-range'],
    ['a negative width', '0,0,-5,6', 'width-out-of-range'],
    ['a width of 900 m', '0,0,5,900', 'width-out-of-range'],
    ['a missing width', '0,0,5', 'coordinates-missing'],
  ])('%s is refused with its line', (_, row, code) => {
    const content = metres('x,y,right,left').replace('\n', `\n${row}\n`)
    expect(read(content, { anchor: [-14, 55] })).toMatchObject({ ok: false, problems: [{ code, where: 'line 2' }] })
  })
})

describe('Tables that are not right', () => {
  it.each([
    ['no header', '-14,55\n-14.1,55.1\n', 'no-header', 'line 1'],
    ['a header of other things', 'speed,gear\n120,4\n', 'no-header', 'line 1'],
    ['a header and no rows', 'lon,lat\n', 'no-line', undefined],
    ['a quotation mark never closed', 'lon,lat\n1,2\n"3,4\n5,6\n7,8', 'quote-open', 'line 3'],
    ['a hexadecimal number', 'lon,lat\n1,2\n0x25,4\n', 'not-a-number', 'line 3'],
    ['a number too large', 'lon,lat\n1,1e999\n', 'not-a-number', 'line 2'],
    ['no number at all', 'lon,lat\nNaN,NaN\n', 'not-a-number', 'line 2'],
    ['a missing latitude', 'lon,lat\n1,2\n3\n', 'coordinates-missing', 'line 3'],
    ['a row cut off', 'lon,lat\n1,2\n3,-', 'not-a-number', 'line 3'],
  ])('%s', (_, content, code, where) => {
    const reading = read(content)
    expect(reading.ok ? [] : reading.problems.map((found) => [found.code, found.where])).toEqual([[code, where]])
  })

  it('a row inside quotation marks keeps the count of lines right', () => {
    expect(read('lon,lat,note\n1,2,"a\nb"\n3,x,\n')).toMatchObject({
      problems: [{ code: 'not-a-number', where: 'line 4' }],
    })
  })
})

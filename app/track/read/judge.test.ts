import { describe, expect, it } from 'vitest'
import { type LayoutReading, readLayout } from '~/track/read-layout'
import { eight, flat, lineString, oval, type Spot } from '../../../tests/fixtures/circuits/shapes'

const read = (spots: readonly Spot[], shape = {}, options = {}) =>
  readLayout(lineString(spots, shape), 'c.geojson', options)
const codes = (reading: LayoutReading) => (reading.ok ? reading.warnings : reading.problems).map(({ code }) => code)
const scaled = (spots: readonly Spot[], by: number) => spots.map(([x, y]): Spot => [x * by, y * by])
/** Half the circumference of the oval's 40-cornered line, by the corners themselves. */
const perimeter = (spots: readonly Spot[]) =>
  spots.reduce((sum, [x, y], i) => {
    const [nextX, nextY] = spots[(i + 1) % spots.length]!
    return sum + Math.hypot(nextX - x, nextY - y)
  }, 0)

describe('A ring', () => {
  it('open by under 60 m is closed with a warning, by more is refused', () => {
    const open = (metres: number): Spot[] => {
      const spots = oval(40)
      const [ax, ay] = spots[0]!
      return [...spots, [ax, ay - metres]]
    }
    expect(codes(read(open(59.9), { open: true }))).toEqual(['ring-closed'])
    expect(codes(read(open(60.1), { open: true }))).toEqual(['ring-open'])
  })

  it('that repeats its first position is closed without a word', () => {
    expect(codes(read(oval(40)))).toEqual([])
    expect(read(oval(40))).toMatchObject({ layout: { positions: { length: 40 } } })
  })

  it('has eight positions or more, repeated ones not counted', () => {
    expect(codes(read(oval(8)))).toEqual([])
    expect(codes(read(oval(7)))).toEqual(['too-few-positions'])
    expect(codes(read(oval(7).flatMap((spot) => [spot, spot])))).toEqual(['too-few-positions'])
  })

  it('repeated positions are left out with a warning that counts them', () => {
    const reading = read(oval(40).flatMap((spot, i) => (i % 10 === 3 ? [spot, spot, spot] : [spot])))
    expect(reading).toMatchObject({ ok: true, layout: { positions: { length: 40 } } })
    expect(reading.ok && reading.warnings.map(({ message }) => message)).toEqual([
      'c.geojson: 8 positions repeat the one before. They are left out.',
    ])
  })

  it('is 300 m to 30 km long', () => {
    const base = perimeter(oval(40))
    expect(codes(read(scaled(oval(40), 301 / base)))).toEqual([])
    expect(codes(read(scaled(oval(40), 299 / base)))).toEqual(['too-short'])
    expect(codes(read(scaled(oval(40), 29_950 / base)))).toEqual([])
    expect(codes(read(scaled(oval(40), 30_050 / base)))).toEqual(['too-long'])
  })

  it('with a position on the other side of the globe is too long, not folded back', () => {
    const spots = JSON.parse(new TextDecoder().decode(lineString(oval(40)))) as { coordinates: number[][] }
    spots.coordinates[7] = [166, -55]
    const reading = readLayout(new TextEncoder().encode(JSON.stringify(spots)), 'c.geojson')
    expect(codes(reading)).toEqual(['too-long'])
  })
})

describe('Crossings', () => {
  it('a bridge at 20° or more is accepted, a flatter one refused', () => {
    expect(codes(read(eight(90)))).toEqual([])
    expect(codes(read(eight(21)))).toEqual([])
    expect(codes(read(eight(19)))).toEqual(['crossing-too-flat'])
  })

  it('a crossing at a position that both passes share counts once', () => {
    const spots = eight(90)
    const shared = [...spots.slice(0, 9), [0, 0] as Spot, ...spots.slice(9), [0, 0] as Spot]
    expect(codes(read(shared))).toEqual([])
  })

  it('passes under 100 m apart along the lap are refused', () => {
    const over = (side: number): Spot[] => [
      [-400, 0],
      [-200, 0],
      [10 + side, 0],
      [10 + side, side],
      [10, side],
      [10, -150],
      [10, -300],
      [-200, -300],
      [-400, -300],
    ]
    expect(codes(read(over(26)))).toEqual([])
    expect(codes(read(over(24)))).toEqual(['crossing-too-near'])
  })

  it('more than two are refused, and told where the first is', () => {
    const petals = (n: number): Spot[] =>
      Array.from({ length: 240 }, (_, i) => {
        const angle = (2 * Math.PI * i) / 240
        const r = 300 * (0.25 + Math.cos(n * angle))
        return [r * Math.cos(angle), r * Math.sin(angle)] as Spot
      })
    const reading = read(petals(3))
    expect(codes(reading)).toEqual(['too-many-crossings'])
    expect(reading.ok || reading.problems[0]!.where).toMatch(/m and .* along the line from its first position$/)
  })

  it('driving the same road twice, or there and back, is no lap', () => {
    expect(codes(read([...oval(40), ...oval(40)]))).toEqual(['too-many-crossings'])
    const road: Spot[] = Array.from({ length: 12 }, (_, i) => [i * 40, 0])
    expect(codes(read([...road, ...road.slice(1, -1).toReversed()]))).toEqual(['too-many-crossings'])
  })

  it('a spur driven straight out and back is told as a fold', () => {
    const spots = oval(40)
    const [x, y] = spots[9]!
    expect(codes(read([...spots.slice(0, 10), [x, y + 40], [x, y], ...spots.slice(10)]))).toContain('crossing-too-flat')
  })
})

describe('A line denser than any circuit needs', () => {
  it('is thinned to half a metre, its length the same within 0.01 %', () => {
    const dense = oval(30_000)
    const reading = read(dense)
    expect(codes(reading)).toEqual(['thinned'])
    const spots = reading.ok ? reading.layout.positions.map(flat) : []
    expect(spots.length).toBeLessThan(5200)
    expect(Math.abs(perimeter(spots) / perimeter(dense) - 1)).toBeLessThan(1e-4)
    const steps = spots.slice(1).map(([x, y], i) => Math.hypot(x - spots[i]![0], y - spots[i]![1]))
    expect(Math.min(...steps)).toBeGreaterThanOrEqual(0.4999)
    expect(Math.max(...steps)).toBeLessThan(0.7)
  })

  it('is left as it is up to 20,000 positions', () => {
    expect(read(oval(20_000))).toMatchObject({ ok: true, layout: { positions: { length: 20_000 } }, warnings: [] })
  })
})

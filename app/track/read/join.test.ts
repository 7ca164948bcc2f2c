import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { type LayoutReading, readLayout } from '~/track/read-layout'
import { flat, globe, oval, type Spot, text } from '../../../tests/fixtures/circuits/shapes'

const multi = (pieces: readonly (readonly Spot[])[]) =>
  text(JSON.stringify({ type: 'MultiLineString', coordinates: pieces.map((piece) => globe(piece)) }))
const read = (pieces: readonly (readonly Spot[])[], options = {}) => readLayout(multi(pieces), 'map.geojson', options)
const codes = (reading: LayoutReading) => (reading.ok ? reading.warnings : reading.problems).map(({ code }) => code)
const spotsOf = (reading: LayoutReading) =>
  reading.ok ? reading.layout.positions.map(flat).map(([x, y]) => `${x.toFixed(1)} ${y.toFixed(1)}`) : []

const ring = oval(60)
/** The oval cut at some of its places; neighbours share the place of the cut. */
const cutAt = (places: readonly number[]): Spot[][] =>
  places.map((from, i) => {
    const to = places[(i + 1) % places.length]!
    return Array.from({ length: ((to - from + 60) % 60) + 1 }, (_, k) => ring[(from + k) % 60]!)
  })

describe('Pieces joined end to end', () => {
  it('come to the same ring however they are shuffled and turned', () => {
    const order = fc.shuffledSubarray([0, 1, 2, 3, 4, 5], { minLength: 6 })
    fc.assert(
      fc.property(order, fc.array(fc.boolean(), { minLength: 6, maxLength: 6 }), (shuffled, turned) => {
        const pieces = cutAt([0, 4, 17, 26, 39, 50])
        const mixed = shuffled.map((i) => (turned[i] ? pieces[i]!.toReversed() : pieces[i]!))
        const reading = read(mixed)
        expect(codes(reading)).toEqual(['pieces-joined'])
        expect(spotsOf(reading).toSorted()).toEqual(
          ring
            .map(([x, y]) => `${x.toFixed(1)} ${y.toFixed(1)}`)
            .map((s) => s.replaceAll('-0.0', '0.0'))
            .toSorted(),
        )
      }),
      { numRuns: 40 },
    )
  })

  it('run the way in which most of their length is drawn', () => {
    const [a, b, c, d] = cutAt([0, 20, 34, 47]) as [Spot[], Spot[], Spot[], Spot[]]
    const turning = (reading: LayoutReading) => {
      const spots = reading.ok ? reading.layout.positions.map(flat) : []
      return Math.sign(
        spots.reduce(
          (sum, [x, y], i) => sum + x * spots[(i + 1) % spots.length]![1] - spots[(i + 1) % spots.length]![0] * y,
          0,
        ),
      )
    }
    expect(turning(read([a.toReversed(), b, c, d]))).toBe(1)
    expect(turning(read([a, b.toReversed(), c.toReversed(), d.toReversed()]))).toBe(-1)
  })

  it('a gap under 60 m between two of them is bridged and told', () => {
    const [a, b, c] = cutAt([0, 20, 40]) as [Spot[], Spot[], Spot[]]
    const reading = read([a, b.slice(1, -1), c])
    expect(codes(reading)).toEqual(['pieces-joined', 'ring-closed'])
    expect(reading.ok && reading.warnings[0]!.message).toMatch(/widest gap between two of them, 4\d\u00A0m/)
  })

  it('a pit lane that leaves the road and comes back is left out and listed with its length', () => {
    const [a, b, c] = cutAt([0, 25, 44]) as [Spot[], Spot[], Spot[]]
    const pits = [a[0]!, ...a.slice(1, -1).map(([x, y]): Spot => [x * 0.9, y * 0.9]), a.at(-1)!]
    for (const pieces of [
      [a, pits, b, c],
      [pits, c, b, a],
    ]) {
      const reading = read(pieces)
      expect(codes(reading)).toEqual(['pieces-joined', 'pieces-left-out'])
      expect(reading.pieces?.filter(({ used }) => !used)).toEqual([
        { index: pieces.indexOf(pits) + 1, used: false, lengthMetres: expect.closeTo(1063, -0.5) },
      ])
    }
  })

  it('the pieces chosen are the ones joined', () => {
    const [a, b, c] = cutAt([0, 25, 44]) as [Spot[], Spot[], Spot[]]
    const pits = [a[0]!, ...a.slice(1, -1).map(([x, y]): Spot => [x * 0.9, y * 0.9]), a.at(-1)!]
    const reading = read([a, pits, b, c], { pieces: [2, 3, 4] })
    expect(reading.pieces?.map(({ used }) => used)).toEqual([false, true, true, true])
    expect(read([a, pits, b, c], { pieces: [5] })).toMatchObject({ ok: false, problems: [{ code: 'no-such-piece' }] })
    expect(read([a, pits, b, c], { pieces: [] })).toMatchObject({ ok: false, problems: [{ code: 'no-such-piece' }] })
  })

  it('a ring of its own is taken whole, and other lines beside it are left out', () => {
    const lane: Spot[] = [
      [0, 0],
      [40, 10],
      [90, 20],
    ]
    const reading = read([lane, [...ring, ring[0]!]])
    expect(codes(reading)).toEqual(['pieces-left-out'])
    expect(spotsOf(reading)).toHaveLength(60)
  })

  it('pieces too far apart do not close', () => {
    expect(codes(read(cutAt([0, 20, 40]).slice(0, 2)))).toEqual(['ring-open'])
  })

  it('a ring cut at the date line is one ring', () => {
    const shifted = globe(ring).map(([lon, lat]) => [lon + 14 + 180, lat] as const)
    const east = shifted.filter(([lon]) => lon <= 180)
    const west = shifted.filter(([lon]) => lon > 180).map(([lon, lat]) => [lon - 360, lat])
    const start = west.findIndex(([, lat], i) => i > 0 && lat! < 55 && west[i - 1]![1]! >= 55)
    const pieces = [[...east], [...west.slice(start), ...west.slice(0, start)]]
    const reading = readLayout(text(JSON.stringify({ type: 'MultiLineString', coordinates: pieces })), 'line.geojson')
    expect(reading).toMatchObject({ ok: true })
    expect(codes(reading)).toEqual(['pieces-joined', 'ring-closed'])
  })
})

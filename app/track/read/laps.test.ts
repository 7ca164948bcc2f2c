import { describe, expect, it } from 'vitest'
import { type LayoutReading, readLayout } from '~/track/read-layout'
import { flat, gpxTrace, oval, type Spot, type TraceFix } from '../../../tests/fixtures/circuits/shapes'

const read = (segments: readonly (readonly TraceFix[])[], options = {}) =>
  readLayout(gpxTrace(...segments), 'laps.gpx', options)
const codes = (reading: LayoutReading) => (reading.ok ? reading.warnings : reading.problems).map(({ code }) => code)
const spotsOf = (reading: LayoutReading) => (reading.ok ? reading.layout.positions.map(flat) : [])

/** A round of the oval, wider by a share and with a fix each second from `start` on. */
const round = (share: number, start: number, n = 80): TraceFix[] =>
  oval(n).map(([x, y], i) => [x * share, y * share, start + i])
/** The way out to the first round and the way in after the last. */
const out: TraceFix[] = Array.from({ length: 8 }, (_, i) => [505 + i, -320 + 40 * i, i - 8])
const finish = (share: number, start: number): TraceFix[] => round(share, start).slice(0, 6)
const lengths = (reading: LayoutReading) => reading.laps?.map(({ lengthMetres }) => Math.round(lengthMetres))

describe('Laps of a trace', () => {
  const three = [...out, ...round(1.01, 0), ...round(1, 80), ...round(1.02, 160), ...finish(1, 240)]

  it('are the rounds back to the same place, and the one of median length is taken', () => {
    const reading = read([three])
    expect(reading).toMatchObject({ ok: true, lapTaken: 1, warnings: [{ code: 'lap-taken', remedy: 'choose-lap' }] })
    expect(reading.laps).toEqual(
      [1, 2, 3].map((index) => ({
        index,
        lengthMetres: expect.any(Number),
        seconds: expect.closeTo(80, 0),
        gapSeconds: 1,
      })),
    )
    const [first, second, third] = lengths(reading) as [number, number, number]
    expect(second).toBeLessThan(first)
    expect(first).toBeLessThan(third)
  })

  it('are never averaged: every position of the lap taken is one of the trace', () => {
    const spots = spotsOf(read([three]))
    expect(Math.abs(spots.length - 80)).toBeLessThan(2)
    const nearest = spots.map(([x, y]) => Math.min(...three.map(([tx, ty]) => Math.hypot(tx - x, ty - y))))
    expect(Math.max(...nearest)).toBeLessThan(0.001)
  })

  it('are found without times as well', () => {
    const reading = read([three.map(([x, y]) => [x, y])])
    expect(reading).toMatchObject({ ok: true, lapTaken: 1 })
    expect(reading.laps?.map((lap) => 'seconds' in lap || 'gapSeconds' in lap)).toEqual([false, false, false])
  })

  it('another one is taken when chosen, and one that is not there is refused', () => {
    const widest = Math.max(...spotsOf(read([three], { lap: 3 })).map(([x]) => x))
    expect(widest).toBeGreaterThan(507)
    expect(read([three], { lap: 3 })).toMatchObject({ ok: true, lapTaken: 3 })
    expect(read([three], { lap: 4 })).toMatchObject({ ok: false, problems: [{ code: 'no-such-lap' }] })
  })

  it('a lap with a time gap over 2 s is offered and not taken', () => {
    const late = (fixes: readonly TraceFix[]) => fixes.map(([x, y, t]): TraceFix => [x, y, t! + 3])
    const gap = [
      ...out,
      ...round(1.01, 0).slice(0, 40),
      ...late([...round(1.01, 0).slice(40), ...round(1, 80), ...round(1.02, 160), ...finish(1, 240)]),
    ]
    const reading = read([gap])
    expect(reading).toMatchObject({ ok: true, lapTaken: 2 })
    expect(reading.laps?.map(({ gapSeconds }) => gapSeconds)).toEqual([4, 1, 1])
  })

  it('where all have gaps the one of median length is taken with a warning', () => {
    const slow = three.map(([x, y, t]): TraceFix => [x, y, 5 * t!])
    const reading = read([slow])
    expect(reading).toMatchObject({ ok: true, lapTaken: 1 })
    expect(codes(reading)).toEqual(['lap-taken', 'laps-with-gaps'])
  })

  it('a lap in which the receiver jumps is not taken', () => {
    const jump = three.with(8 + 30, [90_000, 4000, 30])
    const reading = read([jump])
    expect(reading).toMatchObject({ ok: true })
    expect(Math.max(...spotsOf(reading).map(([x, y]) => Math.hypot(x, y)))).toBeLessThan(511)
  })

  it('nothing is drawn across a lost fix: the lap it is in is left out', () => {
    const whole = [...out, ...round(1.01, 0), ...round(1, 80), ...round(1.02, 160), ...finish(1, 240)]
    const reading = read([whole.slice(0, 50), whole.slice(52)])
    expect(reading).toMatchObject({ ok: true, lapTaken: 1 })
    expect(codes(reading)).toEqual(['segments-left-out', 'lap-taken'])
    expect(reading.laps).toHaveLength(2)
  })

  it('many positions in one second and positions repeated do not matter', () => {
    const whole = three.flatMap(([x, y, t]): TraceFix[] => [
      [x, y, Math.floor(t! / 2) * 2],
      [x, y, Math.floor(t! / 2) * 2],
    ])
    expect(read([whole])).toMatchObject({
      ok: true,
      lapTaken: 1,
      warnings: [{ code: 'lap-taken' }, { code: 'duplicate-positions' }],
    })
  })
})

describe('Where a lap begins and ends', () => {
  it('passing 20 m beside the place is no return', () => {
    const spiral = Array.from({ length: 200 }, (_, i): TraceFix => {
      const [[x, y]] = oval(1, (2 * Math.PI * i) / 80) as [Spot]
      return [x + 0, y + 0, i].map((v, k) => (k < 2 ? v * (1 + (0.08 * i) / 80) : v)) as unknown as TraceFix
    })
    expect(codes(read([spiral]))).toEqual(['ring-open'])
  })

  it('passing the other way is no return', () => {
    const forth = oval(80, 0, 0.5).map(([x, y], i): TraceFix => [x, y, i])
    const back = forth.toReversed().map(([x, y], i): TraceFix => [x + 3, y + 3, 80 + i])
    expect(read([[...forth, ...back]]).laps?.length ?? 0).toBeLessThan(2)
    expect(read([[...forth, ...back]])).toMatchObject({ ok: false })
  })

  it('one lap and a little over is cut where it comes round', () => {
    const reading = read([[...round(1, 0), ...finish(1.004, 80)]])
    expect(reading).toMatchObject({ ok: true, lapTaken: 1 })
    expect(Math.abs(spotsOf(reading).length - 80)).toBeLessThan(2)
    expect(Math.abs(lengths(reading)![0]! - 2553)).toBeLessThan(10)
  })

  it('one lap that stops short of its beginning is closed with a warning', () => {
    const reading = read([round(1, 0, 140).slice(0, 139)])
    expect(reading).toMatchObject({ ok: true })
    expect(codes(reading)).toEqual(['ring-closed'])
  })

  it('laps each in a stretch of their own are laps', () => {
    const reading = read([round(1.01, 0, 90), round(1, 200, 90), round(1.02, 400, 90)])
    expect(reading).toMatchObject({ ok: true, lapTaken: 1 })
    expect(reading.laps).toHaveLength(3)
    expect(codes(reading)).toEqual(['lap-taken', 'ring-closed'])
  })

  it('of a track interrupted everywhere the longest stretch is judged', () => {
    const reading = read([round(1, 0).slice(0, 50), round(1, 0).slice(55, 75)])
    expect(codes(reading)).toEqual(['ring-open'])
  })
})

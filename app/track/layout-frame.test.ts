import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { locate, makeCentreline, signedGap, straightDistance } from '~/track/centreline'
import { frameAsDrawn, makeFrame } from '~/track/layout-frame'
import { along, type Position, station, offset as toOffset } from '~/track/units'
import { evenly, shareOfLap as share } from '../../tests/support/arbitraries'
import { nineCorners, sparsePoints, toPositions } from '../../tests/support/circuits'

const positions = toPositions(sparsePoints(nineCorners, 19)).map(
  ([longitude, latitude], i): Position => [longitude, latitude, 30 + 12 * Math.sin(i / 9)],
)
const line = makeCentreline(positions)

const aside = evenly(-9, 9).map(toOffset)
const laps = fc.record({ start: share, reversed: fc.boolean() })
const frameOf = ({ start, reversed }: { start: number; reversed: boolean }) =>
  makeFrame(line, { startAlong: along(start * line.length), reversed })

describe('a layout whose start line is moved or whose direction is turned', () => {
  it('keeps the place of every mark on the ground', () => {
    fc.assert(
      fc.property(laps, laps, share, aside, (lap, otherLap, part, offset) => {
        const [one, other] = [frameOf(lap), frameOf(otherLap)]
        const before = station(part * line.length)
        const point = one.pointAt(before, offset)
        const moved = other.toStation(one.toAlong(before))
        const across = other.toOffset(one.toAcross(offset))
        expect(straightDistance(other.pointAt(moved, across), point)).toBeLessThan(1e-6)
      }),
    )
  })

  it('leads to a point and back in its own stations and offsets', () => {
    fc.assert(
      fc.property(laps, share, aside, (lap, part, offset) => {
        const frame = frameOf(lap)
        const found = frame.locate(frame.pointAt(station(part * line.length), offset))
        expect(Math.abs(signedGap(frame, station(part * line.length), found.station))).toBeLessThan(1e-6)
        expect(found.offset).toBeCloseTo(offset, 6)
      }),
    )
  })

  it('changes the sign of every offset when it is turned, and the sign alone', () => {
    fc.assert(
      fc.property(share, share, aside, (start, part, offset) => {
        const startAlong = along(start * line.length)
        const forward = makeFrame(line, { startAlong, reversed: false })
        const backward = makeFrame(line, { startAlong, reversed: true })
        const point = forward.pointAt(station(part * line.length), offset)
        expect(backward.locate(point).offset).toBeCloseTo(-forward.locate(point).offset, 6)
        const sum = backward.locate(point).station + forward.locate(point).station
        expect(Math.abs(signedGap(forward, station(0), station(sum)))).toBeLessThan(1e-6)
      }),
    )
  })

  it('has the same distance between two places, or the rest of the lap when it is turned', () => {
    fc.assert(
      fc.property(share, share, share, (start, one, other) => {
        const startAlong = along(start * line.length)
        const forward = makeFrame(line, { startAlong, reversed: false })
        const backward = makeFrame(line, { startAlong, reversed: true })
        const [from, to] = [along(one * line.length), along(other * line.length)]
        const there = forward.roadDistance(forward.toStation(from), forward.toStation(to))
        const back = backward.roadDistance(backward.toStation(to), backward.toStation(from))
        expect(Math.abs(signedGap(line, station(there), station(back)))).toBeLessThan(1e-6)
        expect(forward.length).toBe(backward.length)
      }),
    )
  })

  it('faces the other way when it is turned', () => {
    fc.assert(
      fc.property(share, (part) => {
        const backward = makeFrame(line, { startAlong: along(0), reversed: true })
        const place = along(part * line.length)
        const ahead = frameAsDrawn(line).headingAt(station(place))
        const other = backward.headingAt(backward.toStation(place))
        expect(Math.abs(((other - ahead + 720) % 360) - 180)).toBeLessThan(1e-6)
      }),
    )
  })

  it('keeps the height of every place', () => {
    fc.assert(
      fc.property(laps, share, (lap, part) => {
        const frame = frameOf(lap)
        const place = along(part * line.length)
        expect(frame.heightAt(frame.toStation(place))).toBeCloseTo(
          frameAsDrawn(line).heightAt(station(place)) ?? Number.NaN,
          6,
        )
      }),
    )
  })

  it('cuts stretches in its own driving order', () => {
    fc.assert(
      fc.property(laps, share, share, (lap, one, other) => {
        const frame = frameOf(lap)
        const [from, to] = [station(one * line.length), station(other * line.length)]
        const cut = frame.sliceOf(from, to)
        const whole = cut.slice(1).reduce((sum, position, i) => sum + straightDistance(cut[i]!, position), 0)
        expect(whole).toBeCloseTo(frame.roadDistance(from, to) || frame.length, 4)
        expect(straightDistance(cut[0]!, frame.pointAt(from))).toBeLessThan(1e-6)
        expect(straightDistance(cut.at(-1)!, frame.pointAt(to))).toBeLessThan(1e-6)
      }),
    )
  })

  it('hands a hint on in its own stations', () => {
    const frame = makeFrame(line, { startAlong: along(1000), reversed: true })
    const point = frame.pointAt(station(300), toOffset(2))
    expect(frame.locate(point, station(290)).station).toBeCloseTo(300, 6)
  })
})

describe('the frame as drawn', () => {
  it('counts as the centreline itself does', () => {
    const point = frameAsDrawn(line).pointAt(station(777), toOffset(-4))
    expect(frameAsDrawn(line).locate(point)).toEqual(locate(line, point))
  })
})

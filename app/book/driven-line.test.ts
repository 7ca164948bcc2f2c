import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { makeCentreline } from '~/track/centreline'
import { frameAsDrawn, makeFrame } from '~/track/layout-frame'
import { makePlane } from '~/track/plane'
import { along, offset, type Position, station } from '~/track/units'
import { makeDrivenLine } from './driven-line'

/** A circle of 100 m radius driven to the left, drawn by 720 chords; the middle of the road is 0.001 % shorter than the arc. */
function circle() {
  const plane = makePlane([
    [-14, 55],
    [-13.996, 55.002],
  ])
  const positions: Position[] = Array.from({ length: 720 }, (_, index) => {
    const angle = (index * Math.PI) / 360
    return plane.toLngLat({ x: 100 * Math.cos(angle), y: 100 * Math.sin(angle) })
  })
  return makeCentreline(positions)
}
const frame = frameAsDrawn(circle())
const placed = (at: number, side: number) => ({ station: station(at), offset: offset(side) })

describe('the line through the marks', () => {
  it('is shorter inside and longer outside: by the radius it runs on', () => {
    const quarter = frame.length / 4
    for (const side of [5, -5]) {
      const line = makeDrivenLine(frame, [placed(10, side), placed(10 + quarter, side)])!
      expect(line.distance(station(10), station(10 + quarter))).toBeCloseTo(((100 - side) * Math.PI) / 2, 1)
    }
  })

  it('goes through every mark and never wider than its neighbours', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: -6, max: 6, noNaN: true }), { minLength: 2, maxLength: 9 }), (sides) => {
        const places = sides.map((side, index) => placed(600 + index * 17, side))
        const line = makeDrivenLine(frame, places)!
        for (const [index, side] of sides.entries()) {
          expect(line.offsetAt(places[index]!.station)).toBeCloseTo(side, 9)
          const next = sides[index + 1] ?? side
          const between = line.offsetAt(station((600 + index * 17 + 8) % frame.length))
          expect(between).toBeGreaterThanOrEqual(Math.min(side, next) - 1e-9)
          expect(between).toBeLessThanOrEqual(Math.max(side, next) + 1e-9)
        }
      }),
    )
  })

  it('adds up: whole and parts agree, also over the start line', () => {
    const places = [placed(frame.length - 60, 4), placed(frame.length - 20, -3), placed(15, -5), placed(70, 5)]
    const line = makeDrivenLine(frame, places)!
    const parts = places.slice(1).map((place, index) => line.distance(places[index]!.station, place.station))
    const whole = line.distance(places[0]!.station, places.at(-1)!.station)
    expect(parts.reduce((sum, part) => sum + part, 0)).toBeCloseTo(whole, 2)
  })

  it('is as long when the lap is driven backwards', () => {
    const centreline = circle()
    const forward = makeFrame(centreline, { startAlong: along(0), reversed: false })
    const backward = makeFrame(centreline, { startAlong: along(0), reversed: true })
    const there = makeDrivenLine(forward, [placed(100, 3), placed(160, -4)])!
    const back = makeDrivenLine(backward, [placed(forward.length - 160, 4), placed(forward.length - 100, -3)])!
    expect(back.distance(station(forward.length - 160), station(forward.length - 100))).toBeCloseTo(
      there.distance(station(100), station(160)),
      6,
    )
  })

  it('needs a mark', () => {
    expect(makeDrivenLine(frame, [])).toBeNull()
  })
})

import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { locate, makeCentreline, planePointAt, pointAt, signedGap, straightDistance } from '~/track/centreline'
import { offset, station } from '~/track/units'
import { evenly, shareOfLap as share } from '../../tests/support/arbitraries'
import {
  evenPoints,
  figureEight,
  gaussian,
  nineCorners,
  outAndBack,
  seededRandom,
  sparsePoints,
  toPositions,
} from '../../tests/support/circuits'

const eight = makeCentreline(toPositions(evenPoints(figureEight, 4)))
const legs = makeCentreline(toPositions(evenPoints(outAndBack, 6)))
const plain = makeCentreline(toPositions(sparsePoints(nineCorners, 11)))

describe('without a hint', () => {
  it('the nearest part of the line is taken', () => {
    fc.assert(
      fc.property(evenly(-300, 1100), evenly(-300, 900), (x, y) => {
        const point = { x: x - 400, y: y - 300 }
        const found = locate(plain, plain.plane.toLngLat(point))
        const foot = planePointAt(plain, found.station)
        const ours = Math.abs(found.offset)
        let least = Infinity
        for (let s = 0; s < plain.length; s += 1) {
          const there = planePointAt(plain, station(s))
          least = Math.min(least, Math.hypot(there.x - point.x, there.y - point.y))
        }
        expect(ours).toBeLessThanOrEqual(least + 1e-6)
        // The road lies there too: the foot of the ray is no further off than a slanting ray can be.
        expect(Math.hypot(foot.x - point.x, foot.y - point.y)).toBeLessThan(2 * least + 40)
      }),
      { numRuns: 60 },
    )
  })
})

describe('with a hint', () => {
  // The straights of the eight cross at along 407 and 1435.
  const crossing = eight.plane.toLngLat(planePointAt(eight, station(407.5)))

  it('the crossing of a figure eight belongs to the branch that the hint speaks for', () => {
    const [one, other] = [station(380), station(1410)]
    expect(signedGap(eight, one, locate(eight, crossing, one).station)).toBeLessThan(40)
    expect(signedGap(eight, other, locate(eight, crossing, other).station)).toBeLessThan(40)
    expect(locate(eight, crossing, one).station).not.toBeCloseTo(locate(eight, crossing, other).station, 0)
  })

  it('a trace over the crossing keeps its order, though the other branch is nearer at times', () => {
    const random = seededRandom(5)
    let hint = station(0)
    for (let s = 0; s < eight.length; s += 3) {
      const aside = Math.max(-6, Math.min(6, 3 * gaussian(random)))
      const found = locate(eight, pointAt(eight, station(s), offset(aside)), hint)
      expect(Math.abs(signedGap(eight, station(s), found.station))).toBeLessThan(1e-6)
      hint = found.station
    }
  })

  it('parallel straights 20 m apart do not swap under 4 m of noise', () => {
    const random = seededRandom(6)
    let hint = station(40)
    for (let s = 40; s < 850; s += 2) {
      const found = locate(legs, pointAt(legs, station(s), offset(4 * gaussian(random))), hint)
      expect(Math.abs(signedGap(legs, station(s), found.station))).toBeLessThan(15)
      hint = found.station
    }
  })

  it('a hint on another part of the lap pulls no point off the road it lies on, 20 m from the next', () => {
    fc.assert(
      fc.property(share, share, evenly(-2, 2), (part, elsewhere, aside) => {
        const s = station(part * legs.length)
        const point = pointAt(legs, s, offset(aside))
        const found = locate(legs, point, station(elsewhere * legs.length))
        expect(Math.abs(found.offset)).toBeLessThan(2.001)
        expect(straightDistance(pointAt(legs, found.station, found.offset), point)).toBeLessThan(1e-6)
      }),
    )
  })

  it('a hint across the start line, above the lap length or below 0 counts round the lap', () => {
    const point = pointAt(plain, station(6), offset(2))
    for (const hint of [plain.length - 9, plain.length + 12, -14]) {
      expect(locate(plain, point, station(hint)).station).toBeCloseTo(6, 6)
    }
  })

  it('a hint far along the same road changes nothing', () => {
    fc.assert(
      fc.property(share, (part) => {
        const s = station(part * legs.length * 0.45)
        const point = pointAt(legs, s, offset(-3))
        expect(locate(legs, point, station(s + 60)).station).toBeCloseTo(locate(legs, point).station, 6)
      }),
    )
  })
})

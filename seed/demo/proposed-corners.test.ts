import { describe, expect, it } from 'vitest'
import { makeCentreline, signedGap } from '~/track/centreline'
import { proposeCorners } from '~/track/corners'
import { station } from '~/track/units'
import { alongAt, centreline, positions } from './road'
import { source } from './source'

/** A flat-out kink of 420 m radius carries a number by custom; no proposal reaches that wide. */
const byCustom = '4'
const named = source.corners.filter((corner) => corner.number !== byCustom)

describe("the demo circuit's proposed corners", () => {
  it('are those its people number, but for the flat-out kink: same hand, apex within 18 m of the datum', () => {
    const found = proposeCorners(centreline)
    expect(found.map((corner) => corner.direction)).toEqual(named.map((corner) => corner.direction))
    found.forEach((corner, i) => {
      const datum = station(alongAt(named[i]!.datum.station))
      expect(Math.abs(signedGap(centreline, datum, corner.apex))).toBeLessThan(18)
    })
  })

  it('are the same on every twelfth position of it, 24 m apart', () => {
    const sparse = makeCentreline(positions.filter((_, i) => i % 12 === 0))
    expect(proposeCorners(sparse).map((corner) => corner.direction)).toEqual(named.map((corner) => corner.direction))
  })
})

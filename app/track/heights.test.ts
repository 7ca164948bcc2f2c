import { describe, expect, it } from 'vitest'
import { makeCentreline } from '~/track/centreline'
import { crestsAndCompressions, type HeightProfile, heightProfile } from '~/track/heights'
import { makeFrame } from '~/track/layout-frame'
import { along, metres, type Position } from '~/track/units'
import { evenPoints, gaussian, nineCorners, seededRandom, toPositions } from '../../tests/support/circuits'

const length = nineCorners.length
const ringTurn = (s: number) => (2 * Math.PI * s) / length

/** Two long waves: gradient and curvature are known exactly. */
const rolling = {
  height: (s: number) => 60 + 14 * Math.sin(2 * ringTurn(s)) + 5 * Math.cos(5 * ringTurn(s)),
  gradient: (s: number) => ringTurn(1) * (28 * Math.cos(2 * ringTurn(s)) - 25 * Math.sin(5 * ringTurn(s))),
  curvature: (s: number) => ringTurn(1) ** 2 * (-56 * Math.sin(2 * ringTurn(s)) - 125 * Math.cos(5 * ringTurn(s))),
}

/** The nine-corner circuit every `spacing` metres with a height for each place along, or none. */
function circuit(height: (s: number, i: number) => number | undefined, spacing = 6) {
  const points = toPositions(evenPoints(nineCorners, spacing))
  return makeCentreline(
    points.map(([longitude, latitude], i): Position => {
      const value = height((i * length) / points.length, i)
      return value === undefined ? [longitude, latitude] : [longitude, latitude, value]
    }),
  )
}

function profileOf(height: (s: number, i: number) => number | undefined, spacing?: number): HeightProfile {
  const profile = heightProfile(circuit(height, spacing), metres(10))
  if (!profile) throw new Error('The circuit has heights')
  return profile
}

/** Greatest difference from a truth over all samples; NaN or null anywhere fails. */
function worst(profile: HeightProfile, key: 'height' | 'gradient' | 'verticalCurvature', truth: (s: number) => number) {
  return profile.samples.reduce((most, sample) => {
    const value = sample[key]
    expect(value).not.toBeNull()
    expect(value).not.toBeNaN()
    return Math.max(most, Math.abs((value ?? Number.NaN) - truth(sample.station)))
  }, 0)
}

describe('heights of a lap', () => {
  it('are those of the road: height within 0.1 m, gradient within 0.2 %, curvature within a tenth of its greatest', () => {
    const profile = profileOf(rolling.height)
    expect(worst(profile, 'height', rolling.height)).toBeLessThan(0.1)
    expect(worst(profile, 'gradient', rolling.gradient)).toBeLessThan(0.002)
    expect(worst(profile, 'verticalCurvature', rolling.curvature)).toBeLessThan(0.1 * 181 * ringTurn(1) ** 2)
  })

  it('bear 30 m between positions: height within 0.3 m, gradient within 0.5 %', () => {
    // Chords of 30 m cut the bends short, so places are taken back to the road that the vertices were read from.
    const line = circuit(rolling.height, 30)
    const onRoad = (s: number) => {
      const i = line.stations.findLastIndex((vertex) => vertex <= s)
      const share = (s - line.stations[i]!) / (line.stations[i + 1]! - line.stations[i]!)
      return ((i + share) * length) / line.count
    }
    const profile = profileOf(rolling.height, 30)
    expect(worst(profile, 'height', (s) => rolling.height(onRoad(s)))).toBeLessThan(0.3)
    expect(worst(profile, 'gradient', (s) => rolling.gradient(onRoad(s)))).toBeLessThan(0.005)
  })

  it('bear whole-metre steps, and say so', () => {
    const profile = profileOf((s) => Math.round(rolling.height(s)))
    expect(profile.resolution).toBe(1)
    expect(worst(profile, 'height', rolling.height)).toBeLessThan(0.6)
    expect(worst(profile, 'gradient', rolling.gradient)).toBeLessThan(0.02)
  })

  it('bear 0 for missing, voids and spikes', () => {
    const profile = profileOf((s, i) =>
      i % 29 === 3 ? 0 : i % 37 === 8 ? -32768 : rolling.height(s) + (i % 41 === 5 ? 40 : 0),
    )
    expect(worst(profile, 'height', rolling.height)).toBeLessThan(0.2)
  })

  it('are null where there are none, or only zeros', () => {
    expect(
      heightProfile(
        circuit(() => undefined),
        metres(10),
      ),
    ).toBeNull()
    expect(
      heightProfile(
        circuit(() => 0),
        metres(10),
      ),
    ).toBeNull()
  })

  it('stay unknown across a gap of more than 100 m and are filled across a shorter one', () => {
    const long = profileOf((s) => (s > 900 && s < 1400 ? undefined : rolling.height(s)))
    const inGap = long.samples.filter(({ station }) => station > 915 && station < 1385)
    expect(inGap.flatMap((s) => [s.height, s.gradient, s.verticalCurvature]).filter((value) => value !== null)).toEqual(
      [],
    )
    expect(long.known).toBeCloseTo(1 - 500 / length, 1)
    const short = profileOf((s) => (s > 900 && s < 980 ? undefined : rolling.height(s)))
    expect(short.known).toBe(1)
    expect(worst(short, 'height', rolling.height)).toBeLessThan(0.6)
  })

  it('tell the lowest and the highest place and the metres climbed', () => {
    const profile = profileOf((s) => 30 + 8 * Math.sin(3 * ringTurn(s)))
    expect(profile.lowest.height).toBeCloseTo(22, 0)
    expect(profile.highest.height).toBeCloseTo(38, 0)
    expect(Math.abs(profile.climb - 3 * 16)).toBeLessThan(1)
    const top = (profile.highest.station / length) * 12
    expect(Math.min(...[1, 5, 9].map((twelfth) => Math.abs(top - twelfth)))).toBeLessThan(0.2)
  })

  it('turn round with the direction: gradient changes its sign, curvature does not, the climb is the same', () => {
    const line = circuit(rolling.height)
    const backward = heightProfile(makeFrame(line, { startAlong: along(0), reversed: true }), metres(10))
    const forward = heightProfile(line, metres(10))
    forward?.samples.forEach((sample, k) => {
      const mirrored = backward?.samples[(forward.samples.length - k) % forward.samples.length]
      expect(mirrored?.height).toBeCloseTo(sample.height ?? Number.NaN, 6)
      expect(mirrored?.gradient).toBeCloseTo(-(sample.gradient ?? Number.NaN), 6)
      expect(mirrored?.verticalCurvature).toBeCloseTo(sample.verticalCurvature ?? Number.NaN, 8)
    })
    expect(backward?.climb).toBeCloseTo(forward?.climb ?? Number.NaN, 4)
  })
})

describe('crests and compressions', () => {
  it('are found where the road has them, with their radius', () => {
    const truth = (s: number) => 60 + 6 * Math.cos(4 * ringTurn(s))
    const found = crestsAndCompressions(profileOf(truth))
    expect(found.map((crest) => crest.kind)).toEqual([
      'crest',
      'compression',
      'crest',
      'compression',
      'crest',
      'compression',
      'crest',
      'compression',
    ])
    found.forEach((crest) => {
      expect(crest.verticalRadius / (1 / (6 * (4 * ringTurn(1)) ** 2))).toBeCloseTo(1, 1)
    })
  })

  it('are not invented from whole-metre steps, noise, or no heights', () => {
    const random = seededRandom(21)
    const even = (s: number) => 40 + 9 * Math.sin(ringTurn(s))
    expect(crestsAndCompressions(profileOf(even))).toEqual([])
    expect(crestsAndCompressions(profileOf((s) => Math.round(even(s))))).toEqual([])
    expect(crestsAndCompressions(profileOf((s) => even(s) + 0.4 * gaussian(random), 2))).toEqual([])
    expect(crestsAndCompressions(profileOf(() => 12.3))).toEqual([])
  })

  it('keep their kind when the lap is driven the other way', () => {
    const line = circuit((s) => 60 + 6 * Math.cos(4 * ringTurn(s)))
    const kinds = (reversed: boolean) => {
      const profile = heightProfile(makeFrame(line, { startAlong: along(100), reversed }), metres(10))
      return profile ? crestsAndCompressions(profile).map((crest) => crest.kind) : []
    }
    expect(kinds(false)).toHaveLength(8)
    expect(kinds(true)).toEqual(kinds(false).reverse())
  })
})

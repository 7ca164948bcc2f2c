import { readFileSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import { makeCentreline } from '~/track/centreline'
import { drivenBack, firstChoices, readAnew, startMoved } from '~/track/import-choices'
import { choicesFrom } from '~/track/import-choices-schema'
import { asDrawn, draftCorners, widthOf } from '~/track/layout-draft'
import { makeFrame } from '~/track/layout-frame'
import { readLayout } from '~/track/read-layout'
import { along, metres, station } from '~/track/units'

const bytes = readFileSync('tests/fixtures/circuits/sandbar.kml')
const reading = readLayout(bytes, 'sandbar.kml')
if (!reading.ok) throw new Error('the sample file reads')
const line = makeCentreline(reading.layout.positions)
const forward = makeFrame(line, { startAlong: along(120), reversed: false })
const back = makeFrame(line, { startAlong: along(120), reversed: true })

describe('corners of a circuit on its way in', () => {
  test('are numbered from 1 in the order in which they are driven', () => {
    const corners = draftCorners(forward)
    expect(corners.length).toBeGreaterThan(3)
    expect(corners.map(({ number }) => number)).toEqual(corners.map((_, i) => String(i + 1)))
    const apexes = corners.map(({ apex }) => apex)
    expect(apexes).toEqual([...apexes].sort((a, b) => a - b))
  })
  test('keep their keys when the lap is driven the other way', () => {
    const keys = draftCorners(forward).map(({ key }) => key)
    expect(new Set(keys).size).toBe(keys.length)
    expect(draftCorners(back).map(({ key }) => key)).toEqual([...keys].reverse())
  })
  test('are the same rows of the drawn line whichever way they are driven', () => {
    const drawn = draftCorners(forward).map((corner) => asDrawn(corner, forward))
    const drawnBack = draftCorners(back)
      .map((corner) => asDrawn(corner, back))
      .reverse()
    for (const [i, corner] of drawn.entries()) {
      const other = drawnBack[i]!
      expect(other.direction).toBe(corner.direction)
      for (const place of ['entry', 'apex', 'exit'] as const) expect(other[place]).toBeCloseTo(corner[place], 6)
    }
  })
})

describe('choices of an import', () => {
  const typed = { ...firstChoices('Sandbar').typed, corners: { '310': { accepted: false, number: '7', name: 'Spit' } } }
  const choices = { ...firstChoices(), typed }

  test('driving the other way keeps names and numbers the corners anew', () => {
    const turned = drivenBack(choices)
    expect(turned.reversed).toBe(true)
    expect(turned.typed.corners).toEqual({ '310': { accepted: false, number: '', name: 'Spit' } })
    expect(turned.typed.name).toBe('Sandbar')
  })
  test('the start line moves forward in the direction driven', () => {
    expect(startMoved(choices, forward, station(200), metres(50)).startAlong).toBeCloseTo(370, 9)
    expect(startMoved(choices, back, station(100), metres(5)).startAlong).toBeCloseTo(15, 9)
  })
  test('another lap of the file lets go of start line, direction and corners', () => {
    const anew = readAnew({ ...choices, reversed: true, startAlong: along(90) }, { lap: 3 })
    expect(anew).toMatchObject({ lap: 3, reversed: false, startAlong: 0 })
    expect(anew.typed.corners).toEqual({})
    expect(anew.typed.name).toBe('Sandbar')
  })
  test('come back from where they were kept as they went in', () => {
    expect(choicesFrom(JSON.parse(JSON.stringify(choices)))).toEqual(choices)
  })
  test('begin anew where what was kept is none', () => {
    expect(choicesFrom({ lap: 'two' })).toEqual(firstChoices())
  })
})

test('a road is as wide as the middle one of its widths, left and right together', () => {
  const side = (right: number, left: number) => ({ right: metres(right), left: metres(left) })
  expect(widthOf({ widths: [side(5, 6), side(4, 5), side(7, 9)] })).toBe(11)
  expect(widthOf({})).toBeNull()
})

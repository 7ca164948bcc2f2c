import { describe, expect, it } from 'vitest'
import type { GroundChoice } from '~/book/view'
import { type CornerReading, cornerMap, cornerProjection, cornerScene, stretchOfMarks } from '~/draw/corner-map'
import { eachShape, type GlyphShape } from '~/draw/display-list'
import type { GlyphForm } from '~/draw/glyphs'
import { readGround } from '~/draw/ground'
import { overlap } from '~/draw/lines'
import { markLabels } from '~/draw/map-labels'
import { type MapMark, placedMarks } from '~/draw/map-marks'
import { STYLE_KEYS } from '~/draw/style-keys'
import { type Offset, type Station, station } from '~/track/units'
import { drawnCorners, drawnGround, drawnLandmarks, drawnRoad } from '../../tests/support/drawings'

const road = drawnRoad()
const corners = drawnCorners(road)
const corner = corners[2]!
const scene = cornerScene({
  road,
  ground: readGround(drawnGround(road), road.frame.centreline.plane),
  landmarks: drawnLandmarks(road, corner.apex),
  direction: corner.direction,
  datum: corner.apex,
})
const words = { metres: (value: number) => `${value} m` }

const place = (toDatum: number, offset: number, form: GlyphForm) => ({
  station: station((corner.apex + toDatum + road.frame.length) % road.frame.length),
  offset: offset as Offset,
  form,
  figure: `${Math.abs(toDatum)} before`,
  label: `${form} ${toDatum}`,
})

/** Marks crowded together as they are before a slow corner. */
const marks: MapMark[] = [
  mark('look', 'look', null, place(-151, 3.1, 'seen'), null),
  mark('first', 'brake', 'start', place(-112, 4.2, 'driven'), null),
  mark('target', 'brake', 'target', place(-98, 4.3, 'seen'), place(-89, 4.4, 'sim')),
  mark('gear', 'gear', null, place(-81, 4.1, 'told'), place(-75, 4.2, 'sim')),
  mark('turn', 'turnin', null, place(-64, 4, 'seen'), place(-63.4, 4, 'sim')),
  mark('off', 'release', null, place(-21, -1.7, 'told'), null),
  mark('apex', 'apex', null, place(3, -4.6, 'seen'), place(6, -4.5, 'sim')),
  mark('on', 'throttle', null, place(9, -4.4, 'told'), null),
  mark('out', 'trackout', null, null, place(71, 4.6, 'sim')),
]

function mark(
  id: string,
  kind: MapMark['kind'],
  role: MapMark['role'],
  real: MapMark['real'],
  sim: MapMark['sim'],
): MapMark {
  return { id, kind, role, gear: kind === 'gear' ? 3 : null, name: `Mark ${kind}`, real, sim }
}

const reading = (over: Partial<CornerReading> = {}): CornerReading => ({
  marks,
  show: 'both',
  selected: null,
  labels: true,
  driven: [],
  aims: [],
  reader: 'desk',
  ...over,
})

const stretch = stretchOfMarks(road, { entry: station(corner.apex - 40), exit: station(corner.apex + 45) }, marks)
const views = [
  { width: 940, height: 400 },
  { width: 411, height: 190 },
  { width: 390, height: 360 },
]
const draw = (sheet: { width: number; height: number }, over: Partial<CornerReading> = {}) =>
  cornerMap(scene, reading(over), cornerProjection(road, stretch, sheet), words)
const glyphsOf = (list: ReturnType<typeof draw>) =>
  [...eachShape(list.shapes)].filter((shape): shape is GlyphShape => shape.type === 'glyph')

describe('the map of a corner', () => {
  it.each(views)('shows every mark of the grounds looked at ($width × $height)', (sheet) => {
    const counts = (['both', 'real', 'sim'] as GroundChoice[]).map((show) => glyphsOf(draw(sheet, { show })).length)
    // The turn-in places lie 0.6 m apart: together they are one mark.
    expect(counts).toEqual([12, 8, 5])
    for (const { x, y } of glyphsOf(draw(sheet))) {
      expect(x).toBeGreaterThan(0)
      expect(x).toBeLessThan(sheet.width)
      expect(y).toBeGreaterThan(0)
      expect(y).toBeLessThan(sheet.height)
    }
  })

  it('draws the simulator alone hollow and dashed, and a little smaller', () => {
    for (const glyph of glyphsOf(draw(views[0]!, { show: 'sim' }))) {
      expect(glyph.form).toBe('sim')
      expect(glyph.size).toBeLessThan(15)
    }
  })

  it('paints real marks over those of the simulator', () => {
    const forms = glyphsOf(draw(views[0]!)).map(({ form }) => form === 'sim')
    expect(forms).toEqual([...forms].sort().reverse())
  })

  it.each(views)('sets no label on another, on a mark or on the road ($width × $height)', (sheet) => {
    const projection = cornerProjection(road, stretch, sheet)
    const placed = placedMarks(marks, 'both', road, projection)
    const line = road.lap().map(projection.toPx)
    const room = { sheet: { x: 0, y: 0, ...sheet }, boxes: [], lines: [{ points: line, clearance: 6 }] }
    const labels = markLabels(placed, room, 'desk')
    expect(labels.length).toBeGreaterThan(2)
    labels.forEach(({ box }, i) => {
      for (const other of labels.slice(i + 1)) expect(overlap(box, other.box)).toBe(false)
      for (const { at } of placed)
        expect(overlap(box, { x: at[0] - 7, y: at[1] - 7, width: 14, height: 14 })).toBe(false)
    })
  })

  it('moves no mark to make room for a label', () => {
    for (const sheet of views) {
      expect(glyphsOf(draw(sheet, { labels: true }))).toEqual(glyphsOf(draw(sheet, { labels: false })))
    }
  })

  it('sets the labels of brake, turn-in, apex and track-out before there is no room for all', () => {
    const projection = cornerProjection(road, stretch, { width: 300, height: 170 })
    const placed = placedMarks(marks, 'both', road, projection)
    const room = { sheet: { x: 0, y: 0, width: 300, height: 170 }, boxes: [], lines: [] }
    const kinds = markLabels(placed, room, 'desk').map((label) => label.mark.mark.kind)
    const first = kinds.filter((kind) => ['brake', 'turnin', 'apex', 'trackout'].includes(kind))
    expect(first.length).toBeGreaterThan(2)
    expect(kinds.length).toBeLessThan(marks.length)
    expect(kinds.slice(0, first.length)).toEqual(first)
  })

  it('turns a brake mark with the road and mirrors a turn-in for a left corner', () => {
    const left = { ...scene, direction: 'left' as const }
    const list = cornerMap(left, reading(), cornerProjection(road, stretch, views[0]!), words)
    const brake = glyphsOf(list).find(({ kind }) => kind === 'brakestart')!
    expect(brake.turn).toBeCloseTo(road.headingAt(marks[1]!.real!.station as Station), 0)
    expect(brake.mirror).toBe(true)
    expect(glyphsOf(draw(views[0]!))[0]!.mirror).toBe(corner.direction === 'left')
  })

  it('ties the two places of a mark together, but not one that is alone', () => {
    const tethers = [...eachShape(draw(views[0]!).shapes)].filter(({ style }) => style.startsWith('tether-'))
    expect(tethers.map(({ style }) => style)).toEqual(['tether-brake', 'tether-gear', 'tether-apex'])
  })

  it('says of every mark what it is', () => {
    const groups = draw(views[0]!).shapes.flatMap((shape) => (shape.type === 'group' ? [shape] : []))
    expect(groups.find(({ id }) => id === 'target sim')?.label).toBe('sim -89')
  })

  it('rings the selected mark, both of its places', () => {
    const rings = [...eachShape(draw(views[0]!, { selected: 'gear' }).shapes)].filter(
      ({ style }) => style === 'selected',
    )
    expect(rings).toHaveLength(2)
  })

  it('has north up', () => {
    const dark = [...eachShape(draw(views[0]!).shapes)].find(({ style }) => style === 'needle-dark')!
    const ring = [...eachShape(draw(views[0]!).shapes)].find(({ style }) => style === 'needle-ring')!
    if (dark.type !== 'polygon' || ring.type !== 'circle') throw new Error('a needle is a ring and a wedge')
    expect(dark.points[0]).toBe(ring.x)
    expect(dark.points[1]).toBeLessThan(ring.y)
    const projection = cornerProjection(road, stretch, views[0]!)
    const { x, y } = projection.middle
    expect(projection.toPx({ x, y: y + 50 })[1]).toBeLessThan(projection.toPx({ x, y })[1])
  })

  it('draws a simulator thing that stands elsewhere hollow beside the real one', () => {
    const hollow = (show: GroundChoice) =>
      [...eachShape(draw(views[0]!, { show }).shapes)].filter(({ style }) => style === 'thing-sim').length
    expect([hollow('real'), hollow('both'), hollow('sim')]).toEqual([0, 1, 1])
  })

  it('draws the same list twice, in known styles', () => {
    expect(draw(views[1]!)).toEqual(draw(views[1]!))
    for (const shape of eachShape(draw(views[0]!).shapes)) {
      if (shape.type !== 'text') expect(STYLE_KEYS).toContain(shape.style)
    }
  })
})

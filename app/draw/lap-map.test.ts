import { describe, expect, it } from 'vitest'
import { eachShape, type Point } from '~/draw/display-list'
import { readGround } from '~/draw/ground'
import { lapMap } from '~/draw/lap-map'
import { overlap, segmentDistance2 } from '~/draw/lines'
import { drawnWidth, lapLine } from '~/draw/road-shapes'
import { STYLE_KEYS } from '~/draw/style-keys'
import { TEXT_FACES } from '~/draw/text-styles'
import { type DrawnRoad, drawnCorners, drawnGround, drawnLandmarks, drawnRoad } from '../../tests/support/drawings'

const words = {
  title: 'Sandpiper Ring',
  line: '3.87 km, 9 corners, clockwise',
  contours: 'contours 5 m',
  metres: (value: number) => `${value} m`,
}

const sheets = [
  { width: 956, height: 656 },
  { width: 1180, height: 530 },
  { width: 390, height: 343 },
  { width: 360, height: 620 },
]
const shapes = [
  { east: 1, north: 1 },
  { east: 0.6, north: 1.3 },
  { east: 1.7, north: 0.7 },
]
const cases = sheets.flatMap((sheet) => shapes.map((shape) => ({ ...sheet, ...shape })))

function mapOf(road: DrawnRoad, { width, height }: { width: number; height: number }, bare = false) {
  const corners = drawnCorners(road)
  const ground = bare ? [] : readGround(drawnGround(road), road.frame.centreline.plane)
  const landmarks = bare ? [] : drawnLandmarks(road, corners[2]!.apex)
  return lapMap({ road, ground, landmarks, corners, width, height, words })
}

/** The least distance from a box's outline and middle to a line, px. */
function distanceToLine(box: { x: number; y: number; width: number; height: number }, line: readonly Point[]): number {
  const samples = [0, 0.25, 0.5, 0.75, 1].flatMap((u) =>
    [0, 0.5, 1].map((v): Point => [box.x + u * box.width, box.y + v * box.height]),
  )
  const distances = samples.flatMap((at) => line.slice(1).map((to, i) => segmentDistance2(at, line[i]!, to)))
  return Math.sqrt(Math.min(...distances))
}

describe('the map of a lap', () => {
  it.each(cases)('sets no plate on the road ($width × $height, stretched $east, $north)', (which) => {
    const road = drawnRoad(which)
    const { plates, projection } = mapOf(road, which)
    const line = lapLine(road, projection)
    for (const { box } of plates) expect(distanceToLine(box, line)).toBeGreaterThan(drawnWidth(road, projection) / 2)
    expect(plates.length).toBeGreaterThanOrEqual(drawnCorners(road).length - 1)
  })

  it.each(cases)('sets no plate on another, and none off the sheet ($width × $height, $east, $north)', (which) => {
    const { plates } = mapOf(drawnRoad(which), which)
    plates.forEach(({ box }, i) => {
      expect(box.x).toBeGreaterThanOrEqual(0)
      expect(box.y).toBeGreaterThanOrEqual(0)
      expect(box.x + box.width).toBeLessThanOrEqual(which.width)
      expect(box.y + box.height).toBeLessThanOrEqual(which.height)
      for (const other of plates.slice(i + 1)) expect(overlap(box, other.box)).toBe(false)
    })
  })

  it.each(cases)('keeps the cartouche off road and plates ($width × $height, $east, $north)', (which) => {
    const road = drawnRoad(which)
    const { list, plates, projection } = mapOf(road, which)
    const sheet = [...eachShape(list.shapes)].find(({ style }) => style === 'sheet-frame')!
    if (sheet.type !== 'rect') throw new Error('the cartouche is a frame')
    expect(distanceToLine(sheet, lapLine(road, projection))).toBeGreaterThan(drawnWidth(road, projection) / 2)
    for (const { box } of plates) expect(overlap(box, sheet)).toBe(false)
  })

  it('stands outside its bend where nothing is in the way', () => {
    const road = drawnRoad()
    const { plates, projection } = mapOf(road, { width: 1400, height: 1100 }, true)
    const corners = new Map(drawnCorners(road).map((corner) => [corner.id, corner]))
    const outside = plates.filter(({ corner, box }) => {
      const { apex, direction } = corners.get(corner.id)!
      const middle = projection.toPlane([box.x + box.width / 2, box.y + box.height / 2])
      const { offset } = road.frame.locate(road.frame.centreline.plane.toLngLat(middle), apex)
      return direction === 'right' ? offset > 0 : offset < 0
    })
    expect(outside.length).toBeGreaterThanOrEqual(plates.length - 1)
  })

  it('draws the length of its scale bar right within a pixel', () => {
    for (const which of cases) {
      const { list, projection } = mapOf(drawnRoad(which), which)
      const all = [...eachShape(list.shapes)]
      const fields = all.filter((shape) => shape.type === 'rect' && /^scale-/.test(shape.style))
      const length = fields.reduce((sum, field) => sum + (field.type === 'rect' ? field.width : 0), 0)
      const end = all.find((shape) => shape.type === 'text' && /^\d+ m$/.test(shape.words))
      const told = end?.type === 'text' ? Number.parseInt(end.words, 10) : Number.NaN
      expect(Math.abs(length - told * projection.pxPerMetre)).toBeLessThan(1)
    }
  })

  it('draws the same list from the same lap', () => {
    const [one, other] = [drawnRoad({ east: 1.1 }), drawnRoad({ east: 1.1 })]
    expect(mapOf(one, sheets[0]!).list).toEqual(mapOf(other, sheets[0]!).list)
  })

  it('uses known styles alone, with and without ground', () => {
    const road = drawnRoad()
    for (const bare of [false, true]) {
      for (const shape of eachShape(mapOf(road, sheets[0]!, bare).list.shapes)) {
        if (shape.type === 'text') expect(Object.keys(TEXT_FACES)).toContain(shape.style)
        else expect(STYLE_KEYS).toContain(shape.style)
      }
    }
  })

  it('sets no word smaller than 12 px, on a narrow sheet 14 px', () => {
    const road = drawnRoad()
    const least = (sheet: { width: number; height: number }) =>
      Math.min(...[...eachShape(mapOf(road, sheet).list.shapes)].map((one) => (one.type === 'text' ? one.size : 99)))
    expect(least(sheets[0]!)).toBeGreaterThanOrEqual(12)
    // A plate's number is read with its plate.
    const narrow = [...eachShape(mapOf(road, sheets[2]!).list.shapes)]
    for (const one of narrow) {
      if (one.type === 'text' && !one.style.startsWith('plate')) expect(one.size).toBeGreaterThanOrEqual(14)
    }
  })

  it('leads from every plate to its corner', () => {
    const { list } = mapOf(drawnRoad(), sheets[0]!)
    const links = list.shapes.flatMap((shape) => (shape.type === 'group' ? [shape.href] : []))
    expect(links).toContain('/corners/4')
    expect(new Set(links).size).toBe(links.length)
  })
})

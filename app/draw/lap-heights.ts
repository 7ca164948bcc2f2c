import { scaleLinear } from 'd3-scale'
import { type Box, type DisplayList, linePath, type Point, path, polyline, type Shape, text } from '~/draw/display-list'
import { type HeightNote, lapNotes } from '~/draw/height-notes'
import type { LapCorner } from '~/draw/lap-map'
import { overlap } from '~/draw/lines'
import { numberPlate, numberWidth, PLATE_HEIGHT } from '~/draw/number-plate'
import type { Road } from '~/draw/road'
import { spread } from '~/draw/spread'
import { type Reader, type TextStyle, textSize, textWidth } from '~/draw/text-styles'
import { type HeightProfile, heightProfile } from '~/track/heights'
import { metres, type Station } from '~/track/units'

/** Words of the height sheet; the drawing gives codes and figures. */
export interface HeightWords {
  /** "60 m" */
  metres: (value: number) => string
  /** "one lap, start line to start line" */
  lap: string
  note: (note: HeightNote) => string
}

export interface LapHeightsInput {
  road: Road
  corners: readonly LapCorner[]
  width: number
  height: number
  words: HeightWords
}

interface Frame {
  left: number
  right: number
  top: number
  base: number
  reader: Reader
  x: (at: number) => number
  y: (height: number) => number
}

const PHONE_UNDER = 600
const PLATE_GAP = 2

/**
 * The heights of one lap from start line to start line, corners on the axis.
 * @returns null where the layout carries no heights: nothing is made up
 */
export function lapHeights({ road, corners, width, height, words }: LapHeightsInput): DisplayList | null {
  const length = road.frame.length
  const profile = heightProfile(road.frame, metres(Math.max(length / (width / 2), 4)))
  if (!profile) return null
  const reader: Reader = width < PHONE_UNDER ? 'phone' : 'desk'
  const levels = gridLevels(profile)
  const left = 8 + textWidth(words.metres(levels.at(-1)!), 'axis-figure', textSize('axis-figure', reader)) + 8
  const right = width - (reader === 'phone' ? 10 : 18)
  const rows = plateRows(corners, right - left)
  const [top, base] = [26, height - 16 - rows * (PLATE_HEIGHT + 3)]
  const x = scaleLinear([0, length], [left, right])
  const y = scaleLinear([levels[0]!, levels.at(-1)!], [base, top])
  const frame: Frame = { left, right, top, base, reader, x, y }
  return {
    width,
    height,
    shapes: [
      ...gridShapes(levels, frame, words),
      ...profileShapes(profile, frame),
      ...cornerShapes(corners, profile, frame, rows),
      polyline('axis', [
        [left, base],
        [right, base],
      ]),
      ...noteShapes(lapNotes(profile, corners, road.frame), profile, frame, words),
    ],
  }
}

/** Levels of the grid: three to five, round, the lowest at or under the lowest height. */
function gridLevels({ lowest, highest }: HeightProfile): number[] {
  const span = Math.max(highest.height - lowest.height, 4)
  const step = [1, 2, 5, 10, 20, 50, 100, 200, 500].find((size) => span / size <= 3.2) ?? 1000
  const from = Math.floor(lowest.height / step) * step
  const to = Math.max(Math.ceil(highest.height / step) * step, from + 2 * step)
  return Array.from({ length: Math.round((to - from) / step) + 1 }, (_, i) => from + i * step)
}

function gridShapes(levels: readonly number[], { left, right, top, reader, y }: Frame, words: HeightWords): Shape[] {
  const size = textSize('axis-figure', reader)
  return [
    path(
      'grid',
      levels
        .map((level) =>
          linePath([
            [left, y(level)],
            [right, y(level)],
          ]),
        )
        .join(''),
    ),
    ...levels.map((level, i) =>
      text('axis-figure', [left - 8, y(level) + size / 3], i === levels.length - 1 ? words.metres(level) : `${level}`, {
        anchor: 'end',
        reader,
      }),
    ),
    text('axis-figure', [right, top - 8], words.lap, { anchor: 'end', reader }),
  ]
}

/** Known stretches of the profile as points in px; the lap ends at the height it began with. */
function stretches({ samples }: HeightProfile, { x, y, right }: Frame): Point[][] {
  const all = samples.map(({ station, height }): Point | null => (height === null ? null : [x(station), y(height)]))
  const first = all[0]
  const points = [...all, first ? ([right, first[1]] as Point) : null]
  const runs: Point[][] = [[]]
  for (const point of points) {
    if (point) runs.at(-1)!.push(point)
    else if (runs.at(-1)!.length > 0) runs.push([])
  }
  return runs.filter((run) => run.length > 1)
}

function profileShapes(profile: HeightProfile, frame: Frame): Shape[] {
  const runs = stretches(profile, frame)
  const closed = runs.map((run): Point[] => [...run, [run.at(-1)![0], frame.base], [run[0]![0], frame.base]])
  const gaps = runs.slice(1).map((run, i): Point[] => [runs[i]!.at(-1)!, run[0]!])
  return [
    path('profile-ground', closed.map((run) => linePath(run, true)).join('')),
    path('profile-line', runs.map((run) => linePath(run)).join('')),
    ...(gaps.length === 0 ? [] : [path('profile-missing', gaps.map((gap) => linePath(gap)).join(''))]),
  ]
}

/** Height at a station from the nearest sample. */
function heightNear({ samples, step }: HeightProfile, at: Station): number | null {
  return samples[Math.round(at / step) % samples.length]!.height
}

/** Rows of plates that a lap's corners need side by side. */
function plateRows(corners: readonly LapCorner[], room: number): number {
  const whole = corners.reduce((sum, { number }) => sum + numberWidth(number) + PLATE_GAP, 0)
  return Math.max(1, Math.ceil(whole / room))
}

function cornerShapes(corners: readonly LapCorner[], profile: HeightProfile, frame: Frame, rows: number): Shape[] {
  const { x, y, base, left, right } = frame
  const sorted = [...corners].sort((a, b) => a.apex - b.apex)
  const rowOf = (row: number) => sorted.filter((_, i) => i % rows === row)
  const stems = sorted.flatMap(({ apex }) => {
    const height = heightNear(profile, apex)
    return height === null
      ? []
      : [
          linePath([
            [x(apex), y(height)],
            [x(apex), base],
          ]),
        ]
  })
  const plates = Array.from({ length: rows }, (_, row) => {
    const some = rowOf(row)
    const widths = some.map(({ number }) => numberWidth(number) + PLATE_GAP)
    const middles = spread(
      some.map(({ apex }) => x(apex)),
      widths,
      left - 8,
      right + 8,
    )
    const top = base + 6 + row * (PLATE_HEIGHT + 3)
    return some.flatMap((corner, i): Shape[] => [
      ...(Math.abs(middles[i]! - x(corner.apex)) < 2
        ? []
        : [
            polyline('profile-stem', [
              [x(corner.apex), base],
              [middles[i]!, top],
            ]),
          ]),
      numberPlate(corner, [middles[i]! - numberWidth(corner.number) / 2, top]),
    ])
  })
  return [...(stems.length === 0 ? [] : [path('profile-stem', stems.join(''))]), ...plates.flat()]
}

/** Notes where they fit: the crest over its top, the rest beside the slope; none over another, none over the line. */
function noteShapes(notes: readonly HeightNote[], profile: HeightProfile, frame: Frame, words: HeightWords): Shape[] {
  const line = stretches(profile, frame).flat()
  const lapWords = textWidth(words.lap, 'axis-figure', textSize('axis-figure', frame.reader))
  const taken: Box[] = [{ x: frame.right - lapWords, y: 0, width: lapWords, height: frame.top - 4 }]
  return notes.flatMap((note) => {
    const style: TextStyle = note.code === 'crest' ? 'crest-note' : 'profile-note'
    const said = words.note(note)
    const size = textSize(style, frame.reader)
    const width = textWidth(said, style, size)
    const box = notePlaces(note, frame, { width, height: size }).find(
      (place) =>
        place.x >= frame.left &&
        place.x + width <= frame.right &&
        !taken.some((other) => overlap(other, place, 3)) &&
        !line.some(
          ([px, py]) => px > place.x - 3 && px < place.x + width + 3 && py < place.y + size + 2 && py > place.y - 2,
        ),
    )
    if (!box) return []
    taken.push(box)
    return [text(style, [box.x, box.y + size * 0.85], said, { halo: 'paper', reader: frame.reader })]
  })
}

/** Places of a note, best first, as boxes of its words. */
function notePlaces(note: HeightNote, { x, y, left }: Frame, size: { width: number; height: number }): Box[] {
  const at: Point = [x(note.at), y(note.height)]
  const over = at[1] - 6 - size.height
  const middle = { x: Math.max(at[0] - size.width / 2, left + 2), y: over, ...size }
  if (note.code === 'up')
    return [8, 20, 34].map((off) => ({ x: at[0] - off - size.width, y: at[1] - size.height, ...size }))
  if (note.code === 'down') return [8, 20, 34].map((off) => ({ x: at[0] + off, y: at[1] - size.height, ...size }))
  return [
    middle,
    ...[-0.1, -0.2, 0.2, -0.5, 0.5].map((share) => ({ ...middle, x: middle.x + share * size.width })),
    { ...middle, y: over - 6 },
  ]
}

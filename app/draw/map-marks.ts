import type { BrakeRole, MarkKind } from '~/book/kinds'
import type { GroundChoice } from '~/book/view'
import { circle, type GlyphShape, type GroupShape, type Point, polyline, px, type Shape } from '~/draw/display-list'
import { GLYPH_SIZES, type GlyphForm, glyphKind } from '~/draw/glyphs'
import type { Projection } from '~/draw/projection'
import type { Road } from '~/draw/road'
import type { Offset, Station } from '~/track/units'

/** One place of a mark as a map shows it. */
export interface MapPlace {
  station: Station
  offset: Offset
  form: GlyphForm
  /** "133 before" */
  figure: string
  /** What a screen reader says of it: "Build to, 133 before, real track, seen on foot". */
  label: string
}

/** A mark as a map shows it; either place may be missing. */
export interface MapMark {
  id: string
  kind: MarkKind
  role: BrakeRole | null
  gear: number | null
  /** "Build to" */
  name: string
  sim: MapPlace | null
  real: MapPlace | null
}

/** A place that is drawn, where it lies in px. */
export interface PlacedMark {
  mark: MapMark
  ground: 'sim' | 'real'
  place: MapPlace
  at: Point
  turn: number
}

/** Real and simulator nearer than this are one solid mark, metres. */
const ONE_MARK = 1

/** The places of the grounds looked at: simulator first, so that the real ones lie on top. */
export function placedMarks(
  marks: readonly MapMark[],
  show: GroundChoice,
  road: Road,
  projection: Projection,
): PlacedMark[] {
  const placed = (mark: MapMark, ground: 'sim' | 'real'): PlacedMark[] => {
    const place = mark[ground]
    if (!place || (show !== 'both' && show !== ground)) return []
    if (ground === 'sim' && show === 'both' && areOne(mark, road)) return []
    const at = projection.toPx(road.at(place.station, place.offset))
    return [{ mark, ground, place, at, turn: px(road.headingAt(place.station)) }]
  }
  return [...marks.flatMap((mark) => placed(mark, 'sim')), ...marks.flatMap((mark) => placed(mark, 'real'))]
}

function areOne({ sim, real }: MapMark, road: Road): boolean {
  if (!sim || !real) return false
  const [a, b] = [road.at(sim.station, sim.offset), road.at(real.station, real.offset)]
  return Math.hypot(a.x - b.x, a.y - b.y) < ONE_MARK
}

/** Lines between the two places of a mark, in the colour of its kind. */
export function tetherShapes(placed: readonly PlacedMark[]): Shape[] {
  return placed.flatMap(({ mark, ground, at }) => {
    if (ground !== 'real') return []
    const sim = placed.find((other) => other.ground === 'sim' && other.mark.id === mark.id)
    return sim ? [polyline(`tether-${mark.kind}`, [sim.at, at])] : []
  })
}

/** Side of a glyph's box on a map, px. */
export const glyphSize = (ground: 'sim' | 'real') => GLYPH_SIZES.map[ground]

/** The glyph of a place at any point; `mirror` for a left corner. */
export function markGlyph({ mark, ground, place, turn }: PlacedMark, [x, y]: Point, mirror: boolean): GlyphShape {
  return {
    type: 'glyph',
    style: `mk-${mark.kind}`,
    kind: glyphKind(mark.kind, mark.role),
    form: place.form,
    x: px(x),
    y: px(y),
    size: glyphSize(ground),
    turn,
    mirror,
    gear: mark.gear,
  }
}

/** Every place as a group that says what it is; the selected mark's places in a ring. */
export function markShapes(placed: readonly PlacedMark[], selected: string | null, mirror: boolean): GroupShape[] {
  return placed.map((one) => ({
    type: 'group',
    id: `${one.mark.id} ${one.ground}`,
    label: one.place.label,
    shapes: [
      ...(one.mark.id === selected ? [circle('selected', one.at, glyphSize(one.ground) * 0.85)] : []),
      markGlyph(one, one.at, mirror),
    ],
  }))
}

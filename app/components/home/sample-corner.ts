import type { LandmarkId } from '~/book/ids'
import type { BrakeRole, LandmarkKind, MarkKind } from '~/book/kinds'
import type { LandmarkView, PlacementView } from '~/book/view'
import { type CornerReading, type CornerScene, cornerScene } from '~/draw/corner-map'
import type { GlyphForm } from '~/draw/glyphs'
import type { GroundFeature } from '~/draw/ground'
import type { MapMark, MapPlace } from '~/draw/map-marks'
import { type Road, roadOf } from '~/draw/road'
import type { Reader } from '~/draw/text-styles'
import { makeCentreline } from '~/track/centreline'
import { frameAsDrawn } from '~/track/layout-frame'
import { makePlane, type PlanePoint } from '~/track/plane'
import { metres, type Offset, type Position, type Station, station } from '~/track/units'
import { markKind } from '~/words/kinds'
import { formatToDatum } from '~/words/measures'

/** An invented right-hander for the first page: what a corner looks like in a book, simulator hollow, ground solid. */

const MIDDLE = [-31.2, 42.6] as const
const ROAD_WIDTH = 12
const HALF = ROAD_WIDTH / 2
/** The road: straight, right, straight, and far round back to its start, out of the picture. */
const APPROACH = 420
const RADIUS = 92
const TURN = 52
const HEADING = 78

const rad = (degrees: number) => (degrees * Math.PI) / 180

function sampleRoad(): Road {
  const plane = makePlane([MIDDLE])
  const points: PlanePoint[] = []
  let [x, y, heading] = [0, 0, HEADING]
  const go = (length: number, turn: number, steps: number) => {
    for (let i = 0; i < steps; i++) {
      points.push({ x, y })
      heading += turn / steps / 2
      x += (length / steps) * Math.sin(rad(heading))
      y += (length / steps) * Math.cos(rad(heading))
      heading += turn / steps / 2
    }
  }
  go(APPROACH, 0, 20)
  go(RADIUS * rad(TURN), TURN, 24)
  go(900, 0, 20)
  go(490, 270 - HEADING - TURN, 30)
  go(2000, 0, 20)
  go(470, 90, 30)
  const positions = points.map((point): Position => plane.toLngLat(point))
  return roadOf(frameAsDrawn(makeCentreline(positions)), ROAD_WIDTH)
}

const road = sampleRoad()
const datum = station(APPROACH + (RADIUS * rad(TURN)) / 2)
const at = (toDatum: number): Station => station(datum + toDatum)

const place = (toDatum: number, across: number, form: GlyphForm): MapPlace => {
  const figure = formatToDatum(metres(toDatum))
  return { station: at(toDatum), offset: across as Offset, form, figure, label: figure }
}

type Placed = readonly [toDatum: number, across: number]

function mark(
  kind: MarkKind,
  [toDatum, across]: Placed,
  form: GlyphForm,
  sim: Placed | null = null,
  role: BrakeRole | null = null,
): MapMark {
  const gear = kind === 'gear' ? 3 : null
  return {
    id: `${kind}-${role}`,
    kind,
    role,
    gear,
    name: markKind(kind, role, gear),
    real: place(toDatum, across, form),
    sim: sim && place(...sim, 'sim'),
  }
}

const marks: MapMark[] = [
  mark('look', [-186, 2.6], 'seen'),
  mark('brake', [-147, 4.4], 'driven', null, 'start'),
  mark('brake', [-133, 4.4], 'seen', [-124, 4.4], 'target'),
  mark('gear', [-108, 4.4], 'seen', [-100, 4.4]),
  mark('turnin', [-84, 4.3], 'seen', [-76, 4.3]),
  mark('release', [-28, -1.6], 'told'),
  mark('apex', [4, -4.8], 'seen'),
  mark('full', [27, -3.4], 'driven', [20, -3.9]),
  mark('trackout', [88, 4.6], 'seen', [96, 4.6]),
]

const placement = (from: number, across: number, to: number | null = null): PlacementView => ({
  station: at(from),
  until: to === null ? null : at(to),
  offset: across as Offset,
  offsetTo: null,
  edgeLength: null,
  blockLength: metres(3),
  width: metres(1.4),
  words: null,
})

function thing(kind: LandmarkKind, name: string, real: PlacementView, text: string | null = null): LandmarkView {
  return { id: name as LandmarkId, kind, name, text, corner: null, height: null, real, sim: null }
}

const landmarks: LandmarkView[] = [
  thing('kerb', 'apex kerb', placement(-16, -HALF, 17)),
  thing('kerb', 'exit kerb', placement(70, HALF, 112)),
  thing('distance-board', '100', placement(-147, HALF + 3), '100'),
  thing('distance-board', '50', placement(-97, HALF + 3), '50'),
  { ...thing('light-panel', 'light panel 5', placement(-133, HALF + 5)), sim: placement(-124, HALF + 5) },
  thing('marshal-post', 'Post 5', placement(34, -HALF - 5)),
  thing('wall', 'wall', placement(-190, -HALF - 4, -150)),
]

const beside = (from: number, to: number, across: number) => road.stretch(at(from), at(to), across)
const feature = (kind: GroundFeature['kind'], parts: Partial<GroundFeature>): GroundFeature => ({
  kind,
  name: null,
  height: null,
  rings: [],
  lines: [],
  points: [],
  ...parts,
})

const ground: GroundFeature[] = [
  ...[-64, -47, -32].map((across, i) =>
    feature('contour', { height: 5 * (i + 1), lines: [beside(-400, 280, across)] }),
  ),
  ...[36, 52, 70].map((across, i) => feature('contour', { height: 5 * (i + 4), lines: [beside(-400, 280, across)] })),
  feature('gravel', { rings: [[...beside(-26, 66, HALF + 3), ...beside(-14, 52, HALF + 26).reverse()]] }),
]

/** The corner's surroundings and the stretch of road to show. */
export const sampleScene: CornerScene = cornerScene({ road, ground, landmarks, direction: 'right', datum })
export const sampleStretch = { from: at(-204), to: at(116) }

/** Its marks, for a screen of this kind. */
export const sampleReading = (reader: Reader): CornerReading => ({
  marks,
  show: 'both',
  selected: null,
  labels: true,
  driven: DRIVEN.map(([toDatum, across]) => ({ station: at(toDatum), offset: across as Offset })),
  aims: [],
  reader,
})

/** Where the car's centre runs: along the left edge, to the apex kerb, out to the exit kerb. */
const DRIVEN: readonly Placed[] = Array.from({ length: 94 }, (_, i) => {
  const toDatum = -232 + i * 4
  const to = (from: number, until: number) => {
    const share = Math.min(1, Math.max(0, (toDatum - from) / (until - from)))
    return share * share * (3 - 2 * share)
  }
  return [toDatum, 2 + 2.4 * to(-204, -140) - 9.2 * to(-84, 4) + 9.4 * to(8, 90)] as const
})

import type { CircuitId, CornerId, LayoutId } from '~/book/ids'
import type { StretchKind } from '~/book/kinds'
import type { Placement } from '~/book/place'
import { newId } from '~/db/apply/new-id'
import type { NewCircuit } from '~/db/circuits.server'
import { type CardTexts, cardTexts } from './card-texts'
import { marramHeadGround } from './ground'
import { marramHeadLandmarks } from './landmarks'
import { marramHeadMarks } from './marks'
import { alongAt, positions, roadAhead } from './road'
import { type SourceCorner, source } from './source'

/** What a card of the demo book says; corners by number. */
export interface DemoCard {
  corner: string
  fields: CardTexts & {
    gearIn: number
    gearOut: number
    /** m/s */
    speedIn: number
    leastSpeed: number
    flat: boolean
  }
  setsUp: string | null
  compromisedFor: string | null
}

export interface DemoStretch {
  kind: StretchKind
  name: string
  real: Placement | null
  sim: Placement | null
}

/**
 * The demo scenario: a circuit, a car, and what a team's people know of its corners.
 * @param today YYYY-MM-DD; the day before it is the day of the track walk
 */
export function marramHead(today: string) {
  const landmarks = marramHeadLandmarks()
  return {
    circuit: marramHeadCircuit(),
    car: source.car,
    landmarks,
    stretches: marramHeadStretches(),
    cards: source.corners.map(demoCard),
    marks: marramHeadMarks(today, landmarks),
  }
}

export type DemoScenario = ReturnType<typeof marramHead>

/** The circuit as a person would bring it in. */
export function marramHeadCircuit(): NewCircuit {
  return {
    circuit: { id: newId<CircuitId>(), name: source.name, timeZone: source.timeZone },
    layout: {
      id: newId<LayoutId>(),
      name: 'Full circuit',
      startAlong: 0,
      reversed: false,
      roadWidth: source.roadWidth,
    },
    positions,
    ground: marramHeadGround(),
    corners: source.corners.map(({ number, name, direction, turnDegrees, roadBends, datum }) => {
      const { fromStation, untilStation, filletRadius } = roadBends
      return {
        id: newId<CornerId>(),
        number,
        name,
        direction,
        turnDegrees,
        leastRadius: filletRadius,
        entry: alongAt(fromStation),
        // The bends are arcs of one radius: their middle is as tight as any other part.
        apex: alongAt((fromStation + untilStation) / 2),
        exit: alongAt(untilStation),
        datum: { along: alongAt(datum.station), words: datum.words },
      }
    }),
  }
}

function demoCard({
  number,
  gearIn,
  gearOut,
  speedInKmh,
  leastSpeedKmh,
  flatOut,
  linkedTo,
  card,
  marks,
}: SourceCorner): DemoCard {
  const { sets, ...fromFile } = card ?? {}
  return {
    corner: number,
    fields: {
      gearIn,
      gearOut,
      speedIn: speedInKmh / 3.6,
      leastSpeed: leastSpeedKmh / 3.6,
      flat: flatOut,
      ...(card ? { ...fromFile, next: sets } : cardTexts[number]),
    },
    setsUp: linkedTo ?? null,
    compromisedFor: marks.find(({ compromisedFor }) => compromisedFor)?.compromisedFor ?? null,
  }
}

function stretch(from: number, until: number, words: string | null = null): Placement {
  const start = alongAt(from)
  const end = alongAt(until)
  if (!(roadAhead(start, end) > 0)) throw new Error('a stretch has a length')
  const open = { across: null, acrossTo: null, edgeLength: null, blockLength: null, width: null }
  return { along: start, until: end, ...open, words }
}

/** Where the road itself differs: on one ground, or between the two. */
function marramHeadStretches(): DemoStretch[] {
  return [
    { kind: 'surface', name: 'New tarmac', real: stretch(1017, 1104, 'greasy when damp'), sim: null },
    {
      kind: 'height',
      name: 'Down to Slipway',
      real: stretch(1384, 1521, '7.6 % down'),
      sim: stretch(1384, 1521, '5.9 % down'),
    },
    { kind: 'drainage', name: 'Harbour exit', real: stretch(3817, 3843, 'wet until noon'), sim: null },
    { kind: 'layout-part', name: 'End of the pit exit', real: stretch(270, 284), sim: null },
  ]
}

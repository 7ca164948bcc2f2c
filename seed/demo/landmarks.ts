import type { LandmarkKind } from '~/book/kinds'
import type { Placement } from '~/book/place'
import { metres } from '~/track/units'
import { acrossOf, alongAt, locateLocal } from './road'
import { type SourceLandmark, type SourceSpan, source } from './source'

/** A landmark of the demo circuit. */
export interface DemoLandmark {
  kind: LandmarkKind
  name: string
  text: string | null
  corner: string | null
  height: number | null
  real: Placement | null
  sim: Placement | null
}

/** Things that are kept elsewhere: gravel is ground, the start line is the layout's. */
const KEPT_ELSEWHERE = ['gravel', 'start line']

const KINDS: Record<string, LandmarkKind> = {
  gantry: 'gantry',
  'light panel': 'light-panel',
  'marshal post': 'marshal-post',
  'pit-lane speed line': 'pit-speed-line',
  'distance board': 'distance-board',
  'pit exit line': 'pit-exit-line',
  'pit entry line': 'pit-entry-line',
  'fence or wall end': 'wall-end',
  drain: 'drain',
  'safety-car line': 'safety-car-line',
  kerb: 'kerb',
  bridge: 'bridge',
  'marker post': 'marker-post',
  seam: 'seam',
  wall: 'wall',
  bumps: 'bump',
  patch: 'patch',
  'tyre wall': 'tyre-wall',
  'standing water': 'standing-water',
  'timing line': 'timing-line',
  building: 'building',
  'tyre bundle': 'tyre-bundle',
  sign: 'sign',
  mast: 'mast',
}

/** What the real thing does that its simulator twin does not. */
const REAL_WORDS: Record<string, string> = { 'Lookout exit kerb': 'rises at the end' }

/** The landmarks of Marram Head. One that stands alike on both grounds has the same placement twice. */
export function marramHeadLandmarks(): DemoLandmark[] {
  return source.landmarks.filter(({ kind }) => !KEPT_ELSEWHERE.includes(kind)).map(demoLandmark)
}

function demoLandmark(from: SourceLandmark): DemoLandmark {
  const kind = KINDS[from.kind]
  if (!kind) throw new Error(`no such landmark: ${from.kind}`)
  const real = from.real ? placement(from, from.real) : null
  const elsewhere = from.sim ? placement(from, from.sim) : null
  const words = REAL_WORDS[from.name] ?? null
  return {
    kind,
    name: from.name[0]!.toUpperCase() + from.name.slice(1),
    text: from.text ?? null,
    corner: from.corner ?? null,
    height: from.height ?? null,
    real: real && { ...real, words },
    sim: elsewhere ?? (from.existsIn === 'real' ? null : real),
  }
}

function placement(thing: SourceLandmark, span: SourceSpan): Placement {
  const edgeLength = span.edgeLength ?? thing.edgeLength ?? null
  return {
    ...whereAlong(thing, span),
    edgeLength: edgeLength === null ? null : metres(edgeLength),
    blockLength: thing.blockLength === undefined ? null : metres(thing.blockLength),
    width: thing.width === undefined ? null : metres(thing.width),
    words: null,
  }
}

function whereAlong(
  thing: SourceLandmark,
  span: SourceSpan,
): Pick<Placement, 'along' | 'until' | 'across' | 'acrossTo'> {
  if (span.x !== undefined && span.y !== undefined)
    return { ...locateLocal([span.x, span.y]), until: null, acrossTo: null }
  const sides = whereAcross(thing)
  if (span.station !== undefined) return { along: alongAt(span.station), until: null, ...sides }
  return { along: alongAt(span.fromStation!), until: alongAt(span.untilStation!), ...sides }
}

/** A kerb lies along the road's edge; a thing with width reaches from one offset to another. */
function whereAcross({ kind, side, offset, offsetFrom, offsetTo }: SourceLandmark) {
  if (offsetFrom !== undefined && offsetTo !== undefined)
    return { across: acrossOf(offsetFrom), acrossTo: acrossOf(offsetTo) }
  if (offset !== undefined) return { across: acrossOf(offset), acrossTo: null }
  const edge = source.roadWidth / 2
  if (kind === 'kerb') return { across: acrossOf(side === 'left' ? edge : -edge), acrossTo: null }
  return { across: null, acrossTo: null }
}

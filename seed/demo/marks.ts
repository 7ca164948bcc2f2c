import type { Ground } from '~/book/kinds'
import type { Place, Placement, Tie } from '~/book/place'
import { type Along, toMillimetre } from '~/track/units'
import { instantOf } from './dates'
import type { DemoLandmark } from './landmarks'
import { acrossOf, alongAt, roadAhead, roadGap } from './road'
import { type SourceCorner, type SourceMark, type SourceProof, source } from './source'

/** A tie that names its landmark, whose id the writer knows. */
export type DemoTie = Omit<Tie, 'landmarkId'> & { landmark: string | null }
export type DemoPlace = Omit<Place, 'tie'> & { tie: DemoTie | null }

/** A mark of the demo book, made by a person named by his first name. */
export interface DemoMark {
  corner: string
  by: string
  madeAt: string
  fields: {
    kind: SourceMark['kind']
    role: NonNullable<SourceMark['role']> | null
    manner: NonNullable<SourceMark['manner']> | null
    gear: number
    downshifts: number | null
    /** m/s */
    speed: number
  }
  condition: SourceMark['condition']
  real: DemoPlace
  sim: DemoPlace | null
  findings: DemoFinding[]
}

export interface DemoFinding {
  person: string
  by: string
  condition: SourceMark['condition']
  proof: 'told' | 'seen' | 'driven'
  foundAt: string
}

/** Who walks, tells and drives when: the clock of a track day. */
const TIMES = { driven: '13:30', told: '19:40', foot: '16:15' } as const
const PROOFS = { driven: 'driven', told: 'told', foot: 'seen' } as const

/** Every mark of the book, in the order of the lap. */
export function marramHeadMarks(today: string, landmarks: readonly DemoLandmark[]): DemoMark[] {
  return source.corners.flatMap((corner) => corner.marks.map((mark) => demoMark(today, corner, mark, landmarks)))
}

function demoMark(today: string, corner: SourceCorner, mark: SourceMark, landmarks: readonly DemoLandmark[]): DemoMark {
  const first = [...mark.proof].sort((a, b) => (a.on < b.on ? -1 : 1))[0]!
  const landmark = landmarkOf(mark, corner, landmarks)
  const place = (ground: Ground, at: { toDatum: number; offset: number }): DemoPlace => {
    const along = alongAt(corner.datum.station + at.toDatum)
    return { along, across: acrossOf(at.offset), tie: demoTie(mark, along, landmark, ground) }
  }
  return {
    corner: corner.number,
    by: first.by,
    madeAt: instantOf(first.on, today, TIMES[first.state]),
    fields: {
      kind: mark.kind,
      role: mark.role ?? null,
      manner: mark.manner ?? null,
      gear: mark.gear,
      downshifts: mark.downshifts ?? null,
      speed: mark.speedKmh / 3.6,
    },
    condition: mark.condition,
    real: place('real', mark),
    sim: mark.sim ? place('sim', mark.sim) : null,
    findings: mark.proof.map((proof) => demoFinding(today, proof)),
  }
}

function demoFinding(today: string, { driver, by, condition, state, on }: SourceProof): DemoFinding {
  return { person: driver, by, condition, proof: PROOFS[state], foundAt: instantOf(on, today, TIMES[state]) }
}

/** The landmark a mark is tied to; boards are named by their corner. */
function landmarkOf({ tie }: SourceMark, corner: SourceCorner, landmarks: readonly DemoLandmark[]) {
  const { landmark: name } = tie
  if (name === undefined) return null
  const known = (wanted: string) => landmarks.find((landmark) => landmark.name.toLowerCase() === wanted.toLowerCase())
  const found = known(`${corner.name} ${name}`) ?? known(name)
  if (!found) throw new Error(`no such landmark: ${name}`)
  return found
}

/** On a ground where the landmark does not stand a place hangs on nothing. */
function demoTie({ tie }: SourceMark, along: Along, landmark: DemoLandmark | null, ground: Ground): DemoTie | null {
  const placement = landmark?.[ground] ?? null
  if (landmark && !placement) return null
  return {
    landmark: landmark?.name ?? null,
    along: placement && alongRule(along, placement),
    across: acrossRule(tie.across),
    words: tie.words,
    acrossWords: tie.across,
  }
}

/** The metres along a landmark's own edge that lead to a place of the road. */
function alongRule(along: Along, { along: start, until, edgeLength }: Placement): NonNullable<Tie['along']> {
  const rule = (from: 'start' | 'end', value: number) =>
    ({ from, block: null, metres: toMillimetre(value), lengths: 0 }) as const
  const fromStart = roadGap(start, along)
  if (until === null || fromStart <= 0) return rule('start', fromStart)
  const road = roadAhead(start, until)
  if (fromStart >= road) return rule('end', fromStart - road)
  return rule('start', fromStart * ((edgeLength ?? road) / road))
}

/** "left wheels on the line", "right wheels on the kerb": what the words say in figures, where they do. */
function acrossRule(words: string): Tie['across'] {
  const said = /^(left|right) wheels on the (line|kerb)$/.exec(words)
  if (!said) return null
  const side = said[1] as 'left' | 'right'
  return { part: `${side}-wheels`, on: said[2] === 'kerb' ? 'kerb' : `${side}-line`, metres: 0 }
}

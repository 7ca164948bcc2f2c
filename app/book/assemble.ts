import { type LapFrame, makeLapFrame } from '~/track/lap-frame'
import { across, along, degrees, type Station } from '~/track/units'
import { GROUNDS, type Ground, MARK_KINDS, type TurnDirection } from './kinds'
import type { Place, Placement } from './place'
import { type FindingRow, proofOf } from './proof'
import type { BookRows, CardRow, CornerRow, MarkRow } from './rows'
import { resolveTie } from './ties'
import {
  BOOK_VIEW_VERSION,
  type BookView,
  type CardView,
  type CornerView,
  type MarkView,
  type PlacementView,
  type PlaceView,
} from './view'

/**
 * The book as read: rows of the drawn line become stations and offsets of the lap as driven, ties are resolved, findings become
 * proof, corners come in driving order with their cards and marks. A corner without a card is a mistake of the writer and throws.
 */
export function assembleBookView(rows: BookRows): BookView {
  const { layout } = rows
  const frame = makeLapFrame({
    length: layout.length,
    startAlong: along(layout.startAlong),
    reversed: layout.reversed,
  })
  const marks = groupBy(rows.marks, (mark) => mark.card)
  const cards = new Map(rows.cards.map((card) => [card.corner, card]))
  const reader = makePlaceReader(rows, frame)
  const inOrder = rows.corners
    .map((corner) => ({ corner, stations: cornerStations(corner, frame) }))
    .sort((a, b) => a.stations.apex - b.stations.apex)

  return {
    formatVersion: BOOK_VIEW_VERSION,
    book: rows.book,
    circuit: rows.circuit,
    layout,
    car: rows.car,
    conditions: rows.conditions,
    corners: inOrder.map(({ corner, stations }, index) => {
      const card = cards.get(corner.id)
      if (!card) throw new Error(`corner ${corner.id} has no card in book ${rows.book.id}`)
      const previous = inOrder[(index + inOrder.length - 1) % inOrder.length]!
      return cornerView(corner, stations, previous.stations.exit, card, marks.get(card.id) ?? [], frame, reader)
    }),
    landmarks: rows.landmarks.map((row) => ({ ...row, ...bothPlacements(row, frame) })),
    stretches: rows.stretches.map((row) => ({ ...row, ...bothPlacements(row, frame) })),
  }
}

interface CornerStations {
  entry: Station
  apex: Station
  exit: Station
}

/** A lap driven backwards enters where the drawn corner ends. */
function cornerStations(corner: CornerRow, frame: LapFrame): CornerStations {
  const entry = frame.toStation(along(corner.entry))
  const exit = frame.toStation(along(corner.exit))
  const apex = frame.toStation(along(corner.apex))
  return frame.reversed ? { entry: exit, apex, exit: entry } : { entry, apex, exit }
}

function cornerView(
  row: CornerRow,
  stations: CornerStations,
  from: Station,
  card: CardRow,
  marks: readonly MarkRow[],
  frame: LapFrame,
  readPlace: PlaceReader,
): CornerView {
  const datum = frame.toStation(along(row.datum.along))
  const views = marks.map((mark) => markView(mark, datum, readPlace))
  return {
    id: row.id,
    number: row.number,
    name: row.name,
    direction: frame.reversed ? opposite(row.direction) : row.direction,
    turnDegrees: degrees(row.turnDegrees),
    leastRadius: row.leastRadius,
    ...stations,
    from,
    datum: { station: datum, words: row.datum.words },
    card: cardView(card),
    marks: views.sort(inRoadOrder),
  }
}

function cardView({ corner: _corner, ...card }: CardRow): CardView {
  return card
}

const opposite = (direction: TurnDirection): TurnDirection => (direction === 'left' ? 'right' : 'left')

type PlaceReader = (mark: MarkRow, ground: Ground, datum: Station) => PlaceView | null

function makePlaceReader(rows: BookRows, frame: LapFrame): PlaceReader {
  const landmarks = new Map(rows.landmarks.map((landmark) => [landmark.id, landmark]))
  const findings = groupBy(rows.findings, (finding) => `${finding.mark} ${finding.ground}`)
  const lap = { length: frame.length, reversed: frame.reversed, carLength: rows.car.length }
  return (mark, ground, datum) => {
    const place: Place | null = mark[ground]
    if (!place) return null
    const tiedTo = place.tie?.landmarkId ? landmarks.get(place.tie.landmarkId) : undefined
    const at = resolveTie(place, tiedTo?.[ground] ?? null, lap)
    const station = frame.toStation(along(at.along))
    const found: readonly FindingRow[] = findings.get(`${mark.id} ${ground}`) ?? []
    return {
      station,
      offset: frame.toOffset(across(at.across)),
      toDatum: frame.gap(datum, station),
      stored: place,
      proof: proofOf(at, found, frame.length),
    }
  }
}

function markView(row: MarkRow, datum: Station, readPlace: PlaceReader): MarkView {
  const { card: _card, sim: _sim, real: _real, ...mark } = row
  return { ...mark, sim: readPlace(row, 'sim', datum), real: readPlace(row, 'real', datum) }
}

/** Where a mark stands for ordering: its real place, else the simulator's. */
export const placeOf = (mark: MarkView): PlaceView | null => mark.real ?? mark.sim

/** Road order by metres to the datum; at one place in the order in which a driver does things; then by id, so that it is stable. */
export function inRoadOrder(a: MarkView, b: MarkView): number {
  const apart = (placeOf(a)?.toDatum ?? 0) - (placeOf(b)?.toDatum ?? 0)
  if (apart !== 0) return apart
  const kinds = MARK_KINDS.indexOf(a.kind) - MARK_KINDS.indexOf(b.kind)
  return kinds !== 0 ? kinds : a.id < b.id ? -1 : 1
}

function bothPlacements(row: { real: Placement | null; sim: Placement | null }, frame: LapFrame) {
  const [sim, real] = GROUNDS.map((ground) => placementView(row[ground], frame))
  return { sim: sim ?? null, real: real ?? null }
}

function placementView(placement: Placement | null, frame: LapFrame): PlacementView | null {
  if (!placement) return null
  const { along: first, until: last, across: near, acrossTo: far, ...rest } = placement
  const swap = frame.reversed && last !== null
  const start = frame.toStation(along(swap ? last : first))
  const end = last === null ? null : frame.toStation(along(swap ? first : last))
  return {
    ...rest,
    station: start,
    until: end,
    offset: near === null ? null : frame.toOffset(across(near)),
    offsetTo: far === null ? null : frame.toOffset(across(far)),
  }
}

function groupBy<Item, Key>(items: readonly Item[], keyOf: (item: Item) => Key): Map<Key, Item[]> {
  const groups = new Map<Key, Item[]>()
  for (const item of items) {
    const group = groups.get(keyOf(item))
    if (group) group.push(item)
    else groups.set(keyOf(item), [item])
  }
  return groups
}

import type { CardId, ConditionId, CornerId, LandmarkId, MarkId, PersonId } from '~/book/ids'
import type { Place, Placement } from '~/book/place'
import type { BookRows, CardRow, CornerRow, LandmarkRow, MarkRow } from '~/book/rows'
import { across, along, metres } from '~/track/units'

/** A small invented book for tests of the pure modules: two corners on a 2,000 m lap. */

export const ids = {
  driver: 'person-driver' as PersonId,
  coach: 'person-coach' as PersonId,
  dry: 'condition-dry' as ConditionId,
  wet: 'condition-wet' as ConditionId,
  first: 'corner-first' as CornerId,
  second: 'corner-second' as CornerId,
  firstCard: 'card-first' as CardId,
  secondCard: 'card-second' as CardId,
  kerb: 'landmark-kerb' as LandmarkId,
}

export const place = (alongMetres: number, acrossMetres: number, tie: Place['tie'] = null): Place => ({
  along: along(alongMetres),
  across: across(acrossMetres),
  tie,
})

export function placement(from: number, until: number | null, more: Partial<Placement> = {}): Placement {
  return {
    along: along(from),
    until: until === null ? null : along(until),
    across: null,
    acrossTo: null,
    edgeLength: null,
    blockLength: null,
    width: null,
    words: null,
    ...more,
  }
}

export function corner(more: Partial<CornerRow> & Pick<CornerRow, 'id' | 'number'>): CornerRow {
  return {
    name: `Corner ${more.number}`,
    direction: 'right',
    turnDegrees: 90,
    leastRadius: metres(40),
    entry: 460,
    apex: 500,
    exit: 540,
    datum: { along: along(505), words: 'from the middle of the apex kerb' },
    ...more,
  }
}

export function card(id: CardId, cornerId: CornerId): CardRow {
  return {
    id,
    corner: cornerId,
    gearIn: null,
    gearOut: null,
    speedIn: null,
    leastSpeed: null,
    flat: false,
    noReference: false,
    line: '',
    kerbs: [],
    surface: '',
    water: '',
    car: '',
    mistake: '',
    traffic: '',
    limits: '',
    backup: '',
    next: '',
    setsUp: null,
    compromisedFor: null,
  }
}

export function mark(more: Omit<Partial<MarkRow>, 'id'> & { id: string }): MarkRow {
  return {
    card: ids.firstCard,
    kind: 'turnin',
    role: null,
    manner: null,
    condition: ids.dry,
    forPerson: null,
    madeBy: ids.driver,
    gear: null,
    downshifts: null,
    speed: null,
    sim: null,
    real: null,
    ...more,
    id: more.id as MarkId,
  }
}

export const kerb: LandmarkRow = {
  id: ids.kerb,
  kind: 'kerb',
  name: 'Apex kerb',
  text: null,
  corner: ids.first,
  height: null,
  real: placement(490, 520, { edgeLength: metres(27), blockLength: metres(3) }),
  sim: null,
}

/** Corner 1 at 500 m and corner 2 at 1,950 m whose datum lies across the start line from some of its marks. */
export function bookRows(more: Partial<BookRows> = {}): BookRows {
  return {
    book: { id: 'book' as BookRows['book']['id'], slug: 'sandbar', name: 'Sandbar', archived: false, rev: 3 },
    circuit: {
      id: 'circuit' as BookRows['circuit']['id'],
      slug: 'sandbar',
      name: 'Sandbar Loop',
      timeZone: 'Atlantic/Reykjavik',
    },
    layout: {
      id: 'layout' as BookRows['layout']['id'],
      name: 'Full circuit',
      rev: 2,
      length: metres(2000),
      roadWidth: metres(12),
      startAlong: 0,
      reversed: false,
      centreline: 'c' as BookRows['layout']['centreline'],
      ground: null,
    },
    car: {
      id: 'car' as BookRows['car']['id'],
      name: 'Car 41',
      length: metres(4.6),
      width: metres(2),
      eyeHeight: metres(1.12),
    },
    conditions: [
      { id: ids.dry, kind: 'dry', name: 'Dry' },
      { id: ids.wet, kind: 'wet', name: 'Wet' },
    ],
    corners: [
      corner({
        id: ids.second,
        number: '2',
        direction: 'left',
        entry: 1940,
        apex: 1960,
        exit: 30,
        datum: { along: along(1990), words: 'from the tightest point' },
      }),
      corner({ id: ids.first, number: '1' }),
    ],
    landmarks: [kerb],
    stretches: [],
    cards: [card(ids.firstCard, ids.first), card(ids.secondCard, ids.second)],
    marks: [],
    findings: [],
    ...more,
  }
}

import type { BookId, CarId, CircuitId, CornerId, LayoutId, MarkId } from '~/book/ids'
import type { Scope } from '~/book/operation'
import { newId } from '~/db/apply/new-id'
import { makeBook } from '~/db/books.server'
import { addCar } from '~/db/cars.server'
import { importCircuit, type NewCircuit } from '~/db/circuits.server'
import type { Db } from '~/db/database'
import { readBook } from '~/db/read-book.server'
import { makeCentreline } from '~/track/centreline'
import { makePlane } from '~/track/plane'
import type { Position } from '~/track/units'
import { type Actors, actorNamed } from '../actors'
import { applyTogether, made, making } from '../writing'

/** A second team with a circuit of its own: whoever is not in it must not see any of this. */

const MANAGER = 'Nils'
/** Open sea. */
const ANCHOR: Position = [-20, 52]
const STRAIGHT = 420
const RADIUS = 90
const HALF_TURN = Math.PI * RADIUS

/** Two straights and two half-turns, anticlockwise from the start line in the middle of the southern straight. */
function localPoint(along: number): [x: number, y: number] {
  const lap = 2 * (STRAIGHT + HALF_TURN)
  const s = (along + STRAIGHT / 2) % lap
  if (s < STRAIGHT) return [s - STRAIGHT / 2, -RADIUS]
  if (s < STRAIGHT + HALF_TURN) {
    const angle = (s - STRAIGHT) / RADIUS - Math.PI / 2
    return [STRAIGHT / 2 + RADIUS * Math.cos(angle), RADIUS * Math.sin(angle)]
  }
  if (s < 2 * STRAIGHT + HALF_TURN) return [STRAIGHT / 2 - (s - STRAIGHT - HALF_TURN), RADIUS]
  const angle = (s - 2 * STRAIGHT - HALF_TURN) / RADIUS + Math.PI / 2
  return [-STRAIGHT / 2 + RADIUS * Math.cos(angle), RADIUS * Math.sin(angle)]
}

function ternPoint(): NewCircuit {
  const plane = makePlane([ANCHOR])
  const count = 240
  const step = (2 * (STRAIGHT + HALF_TURN)) / count
  const positions = Array.from({ length: count }, (_, at): Position => {
    const [x, y] = localPoint(at * step)
    return [...plane.toLngLat({ x, y }), 4]
  })
  const scale = makeCentreline(positions).length / (2 * (STRAIGHT + HALF_TURN))
  const corner = (number: string, name: string, from: number) => ({
    id: newId<CornerId>(),
    number,
    name,
    direction: 'left' as const,
    turnDegrees: 180,
    leastRadius: RADIUS,
    entry: from * scale,
    apex: (from + HALF_TURN / 2) * scale,
    exit: (from + HALF_TURN) * scale,
    datum: { along: ((from + HALF_TURN / 2) * scale) as never, words: 'from the tightest point' },
  })
  return {
    circuit: { id: newId<CircuitId>(), name: 'Tern Point', timeZone: 'Atlantic/Azores' },
    layout: { id: newId<LayoutId>(), name: 'Full circuit', startAlong: 0, reversed: false, roadWidth: 10 },
    positions,
    ground: null,
    corners: [corner('1', 'Causeway', STRAIGHT / 2), corner('2', 'Landing', (3 * STRAIGHT) / 2 + HALF_TURN)],
  }
}

/** Writes the second team's circuit and book. */
export async function writeTernPoint(db: Db, actors: Actors): Promise<void> {
  const manager = actorNamed(actors, MANAGER)
  const { layout } = made(await importCircuit(db, manager, ternPoint()))
  const car = newId<CarId>()
  made(await addCar(db, manager, { id: car, name: 'Car 7', length: 4.4, width: 1.9, eyeHeight: 1.1 }))
  const book = { id: newId<BookId>(), name: 'Tern Point', layout, car }
  const { slug } = made(await makeBook(db, manager, book))
  const view = await readBook(db, manager, slug)
  const first = view?.corners[0]
  const dry = view?.conditions[0]
  if (!first || !dry) throw new Error('the second team has no book')
  const scope: Scope = { kind: 'book', id: book.id }
  const fields = {
    cardId: first.card.id,
    conditionId: dry.id,
    kind: 'brake',
    role: 'target',
    gear: 3,
    sim: { along: 150, across: -3.5, tie: null },
  }
  const target = { kind: 'mark', id: newId<MarkId>() } as const
  await applyTogether(db, manager, [making(scope, target, fields, new Date().toISOString())])
}

import type { BookId, CarId, FindingId, LandmarkId, LayoutId, MarkId, StretchId } from '~/book/ids'
import type { Json, Operation, Scope } from '~/book/operation'
import type { BookView } from '~/book/view'
import { newId } from '~/db/apply/new-id'
import { makeBook } from '~/db/books.server'
import { addCar } from '~/db/cars.server'
import { importCircuit, type NewCircuit } from '~/db/circuits.server'
import type { Db } from '~/db/database'
import { addFindings } from '~/db/journal.server'
import { readBook } from '~/db/read-book.server'
import { type Actors, actorNamed } from '../actors'
import { applyTogether, groupsBy, made, making, setting } from '../writing'
import { instantOf } from './dates'
import type { DemoMark, DemoPlace } from './marks'
import { type DemoScenario, marramHead } from './scenario'
import { source } from './source'

/** Who brings the circuit in and writes the cards. */
const COACH = 'Teodora'

/**
 * Writes the demo circuit and its book for a team, each thing as the person who made it: circuit, landmarks and cards by the
 * coach, marks and findings by whoever made and found them.
 * @param today YYYY-MM-DD
 */
export async function writeMarramHead(db: Db, actors: Actors, today: string): Promise<void> {
  const scenario = marramHead(today)
  const coach = actorNamed(actors, COACH)
  const start = instantOf(source.dates.drivenTest, today, '09:00')
  const { layout } = made(await importCircuit(db, coach, scenario.circuit))
  const landmarks = await writeGround(db, actors, scenario, layout, start)
  const car = newId<CarId>()
  const { name, length, width, eyeHeight } = scenario.car
  made(await addCar(db, coach, { id: car, name, length, width, eyeHeight }))
  const book = { id: newId<BookId>(), name: 'Marram Head', layout, car }
  const { slug } = made(await makeBook(db, coach, book))
  const view = await readBook(db, coach, slug)
  if (!view) throw new Error('the demo book is not there')
  const scope: Scope = { kind: 'book', id: book.id }
  await applyTogether(db, coach, cardOperations(scenario, scope, view, start))
  await writeMarks(db, actors, scenario.marks, scope, view, landmarks)
}

const cornerIds = (circuit: NewCircuit) => new Map(circuit.corners.map(({ number, id }) => [number, id]))

/** Landmarks and stretches; answers the landmarks' ids by name. */
async function writeGround(db: Db, actors: Actors, scenario: DemoScenario, layout: LayoutId, madeAt: string) {
  const scope: Scope = { kind: 'layout', id: layout }
  const corners = cornerIds(scenario.circuit)
  const ids = new Map(scenario.landmarks.map(({ name }) => [name, newId<LandmarkId>()]))
  const landmarks = scenario.landmarks.map(({ corner, ...fields }) => {
    const cornerId = corner === null ? null : (corners.get(corner) ?? null)
    const target = { kind: 'landmark', id: ids.get(fields.name)! } as const
    return making(scope, target, { ...(fields as unknown as Record<string, Json>), cornerId }, madeAt)
  })
  const stretches = scenario.stretches.map((fields) =>
    making(scope, { kind: 'stretch', id: newId<StretchId>() }, fields as unknown as Record<string, Json>, madeAt),
  )
  await applyTogether(db, actorNamed(actors, COACH), [...landmarks, ...stretches])
  return ids
}

function cardOperations({ cards, circuit }: DemoScenario, scope: Scope, view: BookView, madeAt: string): Operation[] {
  const corners = cornerIds(circuit)
  const cardOf = new Map(view.corners.map(({ number, card }) => [number, card.id]))
  return cards.map(({ corner, fields, setsUp, compromisedFor }) => {
    const set = {
      ...(fields as unknown as Record<string, Json>),
      setsUp: setsUp && corners.get(setsUp)!,
      compromisedFor: compromisedFor && corners.get(compromisedFor)!,
    }
    return setting(scope, { kind: 'card', id: cardOf.get(corner)! }, set, madeAt)
  })
}

type Landmarks = ReadonlyMap<string, LandmarkId>

async function writeMarks(
  db: Db,
  actors: Actors,
  marks: readonly DemoMark[],
  scope: Scope,
  view: BookView,
  landmarks: Landmarks,
) {
  const withIds = marks.map((mark) => ({ mark, id: newId<MarkId>() }))
  const cardOf = new Map(view.corners.map(({ number, card }) => [number, card.id]))
  const conditionOf = new Map<string, string>(view.conditions.map(({ kind, id }) => [kind, id]))
  // One sitting, one batch: what a person wrote down at one time.
  const sittings = groupsBy(withIds, ({ mark }) => `${mark.madeAt} ${mark.by}`)
  for (const [, sitting] of [...sittings].sort(([a], [b]) => (a < b ? -1 : 1))) {
    const operations = sitting.map(({ mark, id }) => {
      const fields = {
        ...mark.fields,
        cardId: cardOf.get(mark.corner)!,
        conditionId: conditionOf.get(mark.condition)!,
        real: placeJson(mark.real, landmarks),
        sim: mark.sim && placeJson(mark.sim, landmarks),
      }
      return making(scope, { kind: 'mark', id }, fields, mark.madeAt)
    })
    await applyTogether(db, actorNamed(actors, sitting[0]!.mark.by), operations)
  }
  await writeFindings(db, actors, withIds, conditionOf)
}

function placeJson({ along, across, tie }: DemoPlace, landmarks: Landmarks): Json {
  if (!tie) return { along, across, tie: null }
  const { landmark, ...rest } = tie
  return { along, across, tie: { ...rest, landmarkId: landmark === null ? null : (landmarks.get(landmark) ?? null) } }
}

async function writeFindings(
  db: Db,
  actors: Actors,
  marks: readonly { mark: DemoMark; id: MarkId }[],
  conditionOf: ReadonlyMap<string, string>,
) {
  const all = marks.flatMap(({ mark, id }) =>
    mark.findings.map((finding) => ({
      by: finding.by,
      entry: {
        id: newId<FindingId>(),
        mark: id,
        ground: 'real',
        person: actorNamed(actors, finding.person).person,
        condition: conditionOf.get(finding.condition)!,
        verdict: 'kept',
        proof: finding.proof,
        method: 'eye',
        accuracy: null,
        along: mark.real.along,
        across: mark.real.across,
        foundAt: finding.foundAt,
        note: '',
      },
    })),
  )
  for (const [by, found] of groupsBy(all, (finding) => finding.by)) {
    const outcome = await addFindings(
      db,
      actorNamed(actors, by),
      found.map(({ entry }) => entry),
    )
    if (outcome.kind !== 'added') throw new Error(`the demo's findings were refused: ${JSON.stringify(outcome)}`)
  }
}

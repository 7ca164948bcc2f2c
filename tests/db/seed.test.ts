import { type Actors, actorNamed } from 'seed/actors'
import { seedDemo } from 'seed/demo'
import { type SourceMark, source } from 'seed/demo/source'
import { writeMarramHead } from 'seed/demo/write'
import { beforeAll, describe, expect, test } from 'vitest'
import type { PersonId, TeamId } from '~/book/ids'
import type { Role } from '~/book/kinds'
import { MARK_KINDS } from '~/book/kinds'
import type { BookView, MarkView } from '~/book/view'
import { readBook } from '~/db/read-book.server'
import { readChanges } from '~/db/read-changes.server'
import { readCentreline, readGround } from '~/db/read-geometry.server'
import { memberships, people, teams } from '~/db/schema'
import { db, newId, pool } from './support'

const TODAY = '2026-11-29'

/** The demo's people in a team of this test's own. */
async function demoTeam(): Promise<Actors> {
  const team = newId<TeamId>()
  await db.insert(teams).values({ id: team, slug: `demo-${team}`, name: 'Demo' })
  const roles: Record<string, Role> = { Mona: 'manager', Teodora: 'coach', Ilse: 'driver', Rafi: 'driver' }
  const actors = new Map()
  for (const [name, role] of Object.entries(roles)) {
    const person = newId<PersonId>()
    await db.insert(people).values({ id: person, name, email: `${person}@example.test` })
    await db.insert(memberships).values({ teamId: team, personId: person, role })
    actors.set(name, { kind: 'person', person, team, role })
  }
  return actors
}

let actors: Actors
let view: BookView
beforeAll(async () => {
  actors = await demoTeam()
  await writeMarramHead(db, actors, TODAY)
  view = (await readBook(db, actorNamed(actors, 'Rafi'), 'marram-head'))!
}, 120_000)

/** The marks of a corner in the source's own order: along the road, then as a driver meets them. */
const inOrder = (marks: readonly SourceMark[]) =>
  [...marks].sort((a, b) => a.toDatum - b.toDatum || MARK_KINDS.indexOf(a.kind) - MARK_KINDS.indexOf(b.kind))

const pairs = (): [SourceMark, MarkView][] =>
  source.corners.flatMap((corner, at) =>
    inOrder(corner.marks).map((mark, place): [SourceMark, MarkView] => [mark, view.corners[at]!.marks[place]!]),
  )

describe('the demo book', () => {
  test('has a lap as long as the circuit was drawn', () => {
    expect(Math.abs(view.layout.length - source.length)).toBeLessThan(1)
  })

  test('has every corner under its number and name, and every mark in its place within 0.3 m', () => {
    expect(view.corners.map(({ number, name }) => [number, name])).toEqual(
      source.corners.map(({ number, name }) => [number, name]),
    )
    const marks = pairs()
    expect(marks).toHaveLength(106)
    const errors = marks.map(([drawn, read]) => {
      expect([read.kind, read.role ?? undefined, read.gear]).toEqual([drawn.kind, drawn.role, drawn.gear])
      const sim = drawn.sim ? Math.abs(read.sim!.toDatum - drawn.sim.toDatum) : 0
      expect(read.sim === null).toBe(drawn.sim === undefined)
      expect(read.real?.offset).toBeCloseTo(drawn.offset, 6)
      return Math.max(sim, Math.abs(read.real!.toDatum - drawn.toDatum))
    })
    expect(Math.max(...errors)).toBeLessThan(0.3)
  })

  test('knows who made each mark and what proves it', () => {
    const proofs = { told: 'told', foot: 'seen', driven: 'driven' }
    for (const [drawn, read] of pairs()) {
      const expected = drawn.proof.map(({ driver, by, state, condition }) => [
        actorNamed(actors, driver).person,
        actorNamed(actors, by).person,
        proofs[state],
        view.conditions.find(({ kind }) => kind === condition)!.id,
      ])
      const found = read.real!.proof.map(({ person, by, proof, condition }) => [person, by, proof, condition])
      expect(found.sort()).toEqual(expected.sort())
      expect(drawn.proof.map(({ by }) => actorNamed(actors, by).person)).toContain(read.madeBy)
    }
  })

  test('was found before today, the walk yesterday', () => {
    const days = pairs().flatMap(([, read]) => read.real!.proof.map(({ at }) => at.slice(0, 10)))
    expect(days.sort().at(-1)).toBe('2026-11-28')
    expect(days[0]).toBe('2026-11-01')
  })

  test('ties marks to landmarks on the ground where they stand', () => {
    const landmarks = new Map(view.landmarks.map((landmark) => [landmark.id, landmark]))
    const panel = pairs().find(([drawn]) => drawn.tie.landmark === 'Light panel 5')![1]
    expect(landmarks.get(panel.real!.stored.tie!.landmarkId!)).toMatchObject({ name: 'Light panel 5', height: 1.4 })
    const tarmac = pairs().find(([drawn]) => drawn.tie.landmark === 'new tarmac')![1]
    expect(landmarks.get(tarmac.real!.stored.tie!.landmarkId!)).toMatchObject({ name: 'New tarmac', sim: null })
    expect(tarmac.sim?.stored.tie).toBeNull()
  })

  test('has the landmarks of the circuit; what exists in one only has one place', () => {
    const kept = source.landmarks.filter(({ kind }) => kind !== 'gravel' && kind !== 'start line')
    expect(view.landmarks).toHaveLength(kept.length)
    for (const ground of ['real', 'sim'] as const) {
      const alone = view.landmarks.filter((landmark) => landmark.real === null || landmark.sim === null)
      const names = alone.filter((landmark) => landmark[ground]).map(({ name }) => name.toLowerCase())
      const expected = kept.filter(({ existsIn }) => existsIn === ground).map(({ name }) => name.toLowerCase())
      expect(names.sort()).toEqual(expected.sort())
    }
  })

  test('has its heights, and ground whose rings are closed and anticlockwise', async () => {
    const rafi = actorNamed(actors, 'Rafi')
    const centreline = await readCentreline(db, rafi, view.layout.centreline)
    const heights = [...centreline!.heights]
    expect(heights.every(Number.isFinite)).toBe(true)
    expect([Math.min(...heights) > 2, Math.max(...heights)]).toEqual([true, 55])
    const ground = await readGround(db, rafi, view.layout.ground!)
    const rings = ground!.features.flatMap(({ geometry }) => (geometry.type === 'Polygon' ? geometry.coordinates : []))
    expect(rings.length).toBe(11 + 7 + 4)
    for (const ring of rings) {
      expect(ring.at(-1)).toEqual(ring[0])
      const turn = ring.slice(1).reduce((sum, [x, y], at) => sum + ring[at]![0]! * y! - x! * ring[at]![1]!, 0)
      expect(turn).toBeGreaterThan(0)
    }
    expect(new Set(ground!.features.map(({ properties }) => properties?.kind)).size).toBe(14)
  })

  test('stands in the change log under the names of those who made it', async () => {
    const log = await readChanges(db, actorNamed(actors, 'Mona'), { limit: 1000 })
    const makers = new Set(log.map(({ by }) => by))
    const expected = ['Teodora', 'Ilse', 'Rafi'].map((name) => actorNamed(actors, name).person)
    expect([...makers].sort()).toEqual(expected.sort())
  })
})

test('the demo can be made again: nothing is added', async () => {
  const count = async () => {
    const tables = ['teams', 'people', 'memberships', 'circuits', 'books', 'marks', 'landmarks', 'findings', 'changes']
    const counts = tables.map((table) => `(select count(*)::int from ${table}) as ${table}`)
    return (await pool.query(`select ${counts.join(', ')}`)).rows[0]
  }
  const seed = () => db.transaction((tx) => seedDemo(tx, 'Groyne-and-kelp-4', TODAY))
  await seed()
  const first = await count()
  await seed()
  expect(await count()).toEqual(first)
}, 120_000)

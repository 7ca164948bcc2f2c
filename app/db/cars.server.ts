import { and, asc, eq } from 'drizzle-orm'
import type { Actor } from '~/book/actions'
import type { CarId } from '~/book/ids'
import { CAR_LENGTH, CAR_WIDTH, EYE_HEIGHT } from '~/book/limits'
import { nameProblems, type Problem, rangeProblems } from './checks'
import { commander, type Declined } from './command'
import type { Db } from './database'
import { ownTeam } from './own-team'
import { cars } from './schema'

/** A car's measures in metres. */
export interface Car {
  id: CarId
  name: string
  length: number
  width: number
  /** Height of the driver's eye over the road. */
  eyeHeight: number
}

/** The team's cars, by name. */
export function readCars(db: Db, actor: Actor): Promise<Car[]> {
  return db
    .select({ id: cars.id, name: cars.name, length: cars.length, width: cars.width, eyeHeight: cars.eyeHeight })
    .from(cars)
    .where(and(ownTeam(actor, cars.teamId), eq(cars.state, 'live')))
    .orderBy(asc(cars.name), asc(cars.id))
}

function problemsOf(car: Car): Problem[] {
  return [
    ...nameProblems('name', car.name),
    ...rangeProblems('length', car.length, CAR_LENGTH),
    ...rangeProblems('width', car.width, CAR_WIDTH),
    ...rangeProblems('eyeHeight', car.eyeHeight, EYE_HEIGHT),
  ]
}

/** Adds a car. Sending the same id again changes nothing. */
export async function addCar(db: Db, actor: Actor, car: Car): Promise<{ kind: 'made'; car: CarId } | Declined> {
  const asked = await commander(db, actor, 'car.change')
  if (asked.kind !== 'member') return asked
  const problems = problemsOf(car)
  if (problems.length > 0) return { kind: 'invalid', problems }
  const { team, person } = asked.member
  const { id, length, width, eyeHeight } = car
  const name = car.name.trim()
  await db
    .insert(cars)
    .values({ teamId: team, id, name, length, width, eyeHeight, madeBy: person })
    .onConflictDoNothing()
  return { kind: 'made', car: id }
}

/** Changes a car's name and measures. Books keep the length they were made with. */
export async function changeCar(db: Db, actor: Actor, car: Car): Promise<{ kind: 'changed' } | Declined> {
  const asked = await commander(db, actor, 'car.change')
  if (asked.kind !== 'member') return asked
  const problems = problemsOf(car)
  if (problems.length > 0) return { kind: 'invalid', problems }
  const { id, ...fields } = car
  const changed = await db
    .update(cars)
    .set({ name: fields.name.trim(), length: fields.length, width: fields.width, eyeHeight: fields.eyeHeight })
    .where(and(ownTeam(actor, cars.teamId), eq(cars.id, id), eq(cars.state, 'live')))
    .returning({ id: cars.id })
  return changed.length > 0 ? { kind: 'changed' } : { kind: 'not-found' }
}

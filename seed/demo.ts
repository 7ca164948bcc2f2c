import type { Db } from '~/db/database'
import { readBooks } from '~/db/read-books.server'
import { type Actors, actorsOf } from './actors'
import { writeMarramHead } from './demo/write'
import people from './demo-people.json'
import { writeTernPoint } from './other/write'
import { type DemoTeam, seedPeople } from './people'

/**
 * Puts the demo into a database: teams and people always, with this password; their circuits and books where they have none yet.
 * Safe to repeat.
 * @param today YYYY-MM-DD
 */
export async function seedDemo(db: Db, password: string, today: string): Promise<void> {
  await seedPeople(db, people.teams as DemoTeam[], password)
  const demo = await actorsOf(db, 'lanternside')
  if (await isEmpty(db, demo)) await writeMarramHead(db, demo, today)
  const other = await actorsOf(db, 'greyholm')
  if (await isEmpty(db, other)) await writeTernPoint(db, other)
}

async function isEmpty(db: Db, actors: Actors): Promise<boolean> {
  const [anyone] = actors.values()
  return anyone !== undefined && (await readBooks(db, anyone)).length === 0
}

import { cornerPage } from './corner-page'
import { run as locateAgainstTurf } from './locate'
import { queries } from './queries'
import { type BenchRow, tableOf } from './row'
import { signedIn } from './visitor'
import { serveApp } from './web-server'

/** A database with the demo, and who signs in to it. */
export interface DemoDatabase {
  databaseUrl: string
  email: string
  password: string
}

const where = { team: 'lanternside', book: 'marram-head', corner: '3' }

async function pageTimes({ databaseUrl, email, password }: DemoDatabase): Promise<BenchRow[]> {
  const server = await serveApp(databaseUrl)
  const visitor = await signedIn(server.url, email, password)
  try {
    return await cornerPage(visitor, `/teams/${where.team}/books/${where.book}/corners/${where.corner}`)
  } finally {
    visitor.leave()
    await server.stop()
  }
}

/** Runs every bench, prints their rows as one table, and tells whether all aims were met. */
export async function benchAll(demo: DemoDatabase): Promise<boolean> {
  const rows = [...(await locateAgainstTurf()), ...(await pageTimes(demo)), ...(await queries({ ...demo, ...where }))]
  console.log(`\n${tableOf(rows)}`)
  return rows.every((row) => row.met)
}

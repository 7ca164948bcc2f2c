import { makeBigBook } from './big-book'
import { countQueries } from './query-counter'
import type { BenchRow } from './row'
import { signedIn } from './visitor'
import { serveApp } from './web-server'

const FEW = 10
const MANY = 500

interface Demo {
  databaseUrl: string
  email: string
  password: string
  team: string
  book: string
  corner: string
}

/**
 * Statements that a page sends to the database, the session's and the transaction's own among them, with 10 marks in the book
 * and with 500: the same number. Counted on the way to the database by reading its protocol along, with a server of its own,
 * after each page was asked for once (geometry that never changes is read once a process).
 */
export async function queries(demo: Demo): Promise<BenchRow[]> {
  const [few, many] = [await makeBigBook(demo.databaseUrl, demo, FEW), await makeBigBook(demo.databaseUrl, demo, MANY)]
  const counter = await countQueries(demo.databaseUrl)
  const server = await serveApp(counter.url)
  const visitor = await signedIn(server.url, demo.email, demo.password)
  const countOf = async (path: string) => {
    await visitor.page(path)
    counter.take()
    await visitor.page(path)
    return counter.take().length
  }
  try {
    const pages: [name: string, path: (book: string) => string][] = [
      ['overview', (book) => `/teams/${demo.team}/books/${book}`],
      ['corner page', (book) => `/teams/${demo.team}/books/${book}/corners/${demo.corner}`],
      ['list of circuits', () => `/teams/${demo.team}/circuits`],
    ]
    const rows: BenchRow[] = []
    for (const [name, path] of pages) {
      const [ours, reference] = [await countOf(path(many)), await countOf(path(few))]
      rows.push({
        name: `${name}, statements with ${MANY} marks against ${FEW}`,
        ours,
        reference,
        ratio: ours / reference,
        aim: '= 1',
        met: ours === reference,
      })
    }
    return rows
  } finally {
    visitor.leave()
    await server.stop()
    counter.close()
  }
}

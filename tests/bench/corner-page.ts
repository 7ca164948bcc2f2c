import { build } from 'vite'
import { type BenchRow, median } from './row'
import { stranger, type Visitor } from './visitor'
import { serveProgram } from './web-server'

/** Times each page is asked for, after as many to warm up. */
const TIMES = 150
const AIM = 1.5
const reference = '.local/bench/reference-server.js'

/**
 * Server time of a corner's page against a page of the framework with as many plain SVG nodes, and nothing else on it: no
 * database, no session, no words. Both are production builds in processes of their own; the two are asked for in turn over
 * HTTP on one connection each, uncompressed, from the request to the last byte of the answer.
 */
export async function cornerPage(visitor: Visitor, path: string): Promise<BenchRow[]> {
  await build({
    configFile: false,
    logLevel: 'warn',
    build: { ssr: 'tests/bench/reference-server.tsx', outDir: '.local/bench', copyPublicDir: false },
  })
  const server = await serveProgram(reference)
  const plain = stranger(server.url)
  try {
    const nodes = countSvgNodes(await visitor.page(path))
    const drawn = countSvgNodes(await plain.page(`/?nodes=${nodes}`))
    if (drawn !== nodes + 1) throw new Error(`the reference drew ${drawn} nodes, not ${nodes} in one svg`)
    const ours: number[] = []
    const theirs: number[] = []
    for (let i = 0; i < 2 * TIMES; i++) {
      const mine = await timed(() => visitor.page(path))
      const other = await timed(() => plain.page(`/?nodes=${nodes}`))
      if (i < TIMES) continue
      ours.push(mine)
      theirs.push(other)
    }
    const ratio = median(ours) / median(theirs)
    return [
      {
        name: `corner page, ms, against ${nodes} plain SVG nodes`,
        ours: median(ours),
        reference: median(theirs),
        ratio,
        aim: `≤ ${AIM}`,
        met: ratio <= AIM,
      },
    ]
  } finally {
    plain.leave()
    await server.stop()
  }
}

async function timed(what: () => Promise<unknown>): Promise<number> {
  const from = performance.now()
  await what()
  return performance.now() - from
}

/** Elements of all drawings of a document, the drawings themselves among them. */
function countSvgNodes(html: string): number {
  const drawings = html.match(/<svg[\s>].*?<\/svg>/gs) ?? []
  return drawings.reduce((sum, drawing) => sum + (drawing.match(/<[a-z]/gi) ?? []).length, 0)
}

/** Files made to exhaust the reader, each in a process of its own: an answer, and at most 300 MB more memory at its peak. */
import { execFile } from 'node:child_process'
import { mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { promisify } from 'node:util'
import { build } from 'vite'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { hostileFiles } from './hostile-files'

const run = promisify(execFile)
const root = fileURLToPath(new URL('../..', import.meta.url))
const most = { megabytes: 300, bytes: 20 * 1024 * 1024 }

interface Measured {
  seconds: number
  megabytes: number
  answer: string
}

let folder = ''
const measured = new Map<string, Measured>()

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'reading-'))
  await build({
    root,
    configFile: false,
    logLevel: 'silent',
    resolve: { tsconfigPaths: true },
    ssr: { noExternal: true },
    build: {
      ssr: 'app/track/read-layout.ts',
      outDir: folder,
      rollupOptions: { output: { entryFileNames: 'reader.mjs' } },
    },
  })
}, 60_000)

afterAll(async () => {
  await rm(folder, { recursive: true, force: true })
  const [slowest] = [...measured].sort(([, a], [, b]) => b.seconds - a.seconds)
  const [largest] = [...measured].sort(([, a], [, b]) => b.megabytes - a.megabytes)
  if (!slowest || !largest) return
  console.info(
    `Slowest answer: ${slowest[0]}, ${slowest[1].seconds.toFixed(2)} s. Most memory: ${largest[0]}, ${largest[1].megabytes.toFixed(0)} MB.`,
  )
})

it.each(Object.keys(hostileFiles))(
  '%s',
  async (name) => {
    const content = hostileFiles[name]!()
    const file = join(folder, name)
    await writeFile(file, content)
    const script = fileURLToPath(new URL('measure-reading.mjs', import.meta.url))
    const { stdout } = await run(process.execPath, [script, join(folder, 'reader.mjs'), file, name])
    await rm(file)
    const found = JSON.parse(stdout) as Measured
    measured.set(name, found)
    expect(content.length).toBeLessThanOrEqual(most.bytes)
    expect(found.answer).not.toBe('')
    expect(found.megabytes).toBeLessThanOrEqual(most.megabytes)
  },
  120_000,
)

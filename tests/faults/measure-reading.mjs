// Reads one file with the built reader in a process of its own and prints what that took:
// node measure-reading.mjs <built reader> <file> <name>
import { readFileSync } from 'node:fs'
import { pathToFileURL } from 'node:url'

const [, , reader, file, name] = process.argv
const { readLayout } = await import(pathToFileURL(reader).href)
const bytes = new Uint8Array(readFileSync(file))
const before = process.resourceUsage().maxRSS
const start = performance.now()
const reading = readLayout(bytes, name, { anchor: [-14, 55] })
const seconds = (performance.now() - start) / 1000
const megabytes = (process.resourceUsage().maxRSS - before) / 1024
const answer = reading.ok ? `${reading.layout.positions.length} positions` : reading.problems[0].code
console.log(JSON.stringify({ seconds, megabytes, answer }))

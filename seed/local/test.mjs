import './node-version.mjs'

const { main } = await import('./lifetime.mjs')
const { testAll } = await import('./test-all.mjs')

await main(() => testAll(process.argv.slice(2)))

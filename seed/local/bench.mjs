import './node-version.mjs'

const { alone, main } = await import('./lifetime.mjs')
const { prepareFolders, prepareTools } = await import('./prepare.mjs')
const { step } = await import('./steps.mjs')

await main(async () => {
  prepareFolders()
  await alone(() => prepareTools(['postgresql']))
  const { demoPassword, testHouse } = await import('./test-house.mjs')
  const { demo } = testHouse()
  let databaseUrl
  await step('Database with the demo', async () => {
    databaseUrl = (await demo()).appUrl
  })
  Object.assign(process.env, { NODE_ENV: 'production', DATABASE_URL: databaseUrl, LOG_LEVEL: 'warn' })
  const { runnerImport } = await import('vite')
  const { module } = await runnerImport('./tests/bench/all.ts', { resolve: { tsconfigPaths: true }, logLevel: 'error' })
  const met = await module.benchAll({ databaseUrl, email: 'mona@lanternside.example', password: demoPassword })
  return met ? 0 : 1
})

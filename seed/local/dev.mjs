import './node-version.mjs'

const { serveDemo } = await import('./serve-demo.mjs')

await serveDemo({
  command: 'npm run dev',
  server: ['seed/local/dev-server.mjs'],
  env: { NODE_ENV: 'development', LOG_LEVEL: process.env.LOG_LEVEL || 'info' },
})

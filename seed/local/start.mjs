import './node-version.mjs'

const { serveDemo } = await import('./serve-demo.mjs')

await serveDemo({
  command: 'npm start',
  server: ['build/server/index.js'],
  env: { NODE_ENV: 'production', LOG_LEVEL: process.env.LOG_LEVEL || 'warn' },
})

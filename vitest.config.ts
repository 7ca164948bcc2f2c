import { defineConfig } from 'vitest/config'

// Anything that only works where clocks show UTC must fail here.
process.env.TZ = 'Pacific/Auckland'

/** A database that no test without one may reach. */
const nowhere = 'postgres://nobody@127.0.0.1:9/none'

type Suite = { name: string; include: string[]; databaseUrl?: string | undefined; oneAtATime?: boolean }

const suite = ({ name, include, databaseUrl, oneAtATime = false }: Suite) => ({
  extends: true as const,
  test: {
    name,
    include,
    fileParallelism: !oneAtATime,
    env: { DATABASE_URL: databaseUrl ?? nowhere, LOG_LEVEL: 'silent' },
  },
})

export default defineConfig({
  resolve: { tsconfigPaths: true },
  test: {
    environment: 'node',
    testTimeout: 20_000,
    projects: [
      suite({ name: 'unit', include: ['app/**/*.test.{ts,tsx}', 'seed/**/*.test.{ts,tsx}'] }),
      suite({ name: 'published', include: ['tests/published/**/*.test.ts'] }),
      suite({ name: 'house', include: ['tests/house/**/*.test.ts'] }),
      suite({ name: 'faults', include: ['tests/faults/**/*.test.ts'] }),
      suite({
        name: 'db',
        include: ['tests/db/**/*.test.ts'],
        databaseUrl: process.env.TEST_DATABASE_URL,
        oneAtATime: true,
      }),
      suite({ name: 'http', include: ['tests/http/**/*.test.{ts,tsx}'], oneAtATime: true }),
    ],
  },
})

import { z } from 'zod'

const publicUrl = z.url({ protocol: /^https?$/ }).transform((text) => new URL(text).origin)

const schema = z
  .object({
    HOST: z.string().min(1).optional(),
    PORT: z.coerce.number().int().min(1).max(65_535).default(3000),
    PUBLIC_URL: publicUrl.optional(),
    DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }),
    OWNER_DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }).optional(),
    TRUST_PROXY_HOPS: z.coerce.number().int().min(0).max(10).default(0),
    LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('info'),
    DEMO_PASSWORD: z.string().min(1).optional(),
  })
  .transform((env) => ({
    ...env,
    /** Origin under which people reach the server, without a path. */
    PUBLIC_URL: env.PUBLIC_URL ?? `http://localhost:${env.PORT}`,
    /** Connection of the role that owns the tables; only migrations and the demo use it. */
    OWNER_DATABASE_URL: env.OWNER_DATABASE_URL ?? env.DATABASE_URL,
  }))

/** Settings of the process. */
export type Env = Readonly<z.output<typeof schema>>

/**
 * Reads the settings from a set of environment variables. An empty variable counts as absent.
 *
 * @throws Error naming every variable that is missing or wrong, never its value.
 */
export function readEnv(variables: Record<string, string | undefined>): Env {
  const given = Object.fromEntries(Object.entries(variables).filter(([, value]) => value !== undefined && value !== ''))
  const result = schema.safeParse(given)
  if (result.success) return Object.freeze(result.data)
  const names = [...new Set(result.error.issues.map((issue) => issue.path.join('.')))]
  throw new Error(`Environment variables missing or wrong: ${names.join(', ')}`)
}

/** The settings of this process, read once. This module alone reads the environment. */
export const env: Env = readEnv(process.env)

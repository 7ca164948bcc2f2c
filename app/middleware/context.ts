import { createContext } from 'react-router'
import type { Db } from '~/db/database'

/** The database, for the reads and writes that a route calls: a route gets it here and imports none. */
export const dbContext = createContext<Db>()

/** Nonce of the request's Content-Security-Policy. */
export const nonceContext = createContext<string>()

/** Id under which the request stands in the log; also in the answer's `X-Request-Id`. */
export const requestIdContext = createContext<string>()

/** Address the request came from, after the trusted proxies. */
export const clientAddressContext = createContext<string>()

/** Takes the pattern of the matched route (`/teams/:team`) for the log. */
export const reportPatternContext = createContext<(pattern: string) => void>(() => undefined)

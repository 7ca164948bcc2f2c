import pino from 'pino'
import { env } from '~/env.server'

/** The process's log: one JSON line an entry on standard output. */
export const log = pino({ level: env.LOG_LEVEL, base: null, timestamp: pino.stdTimeFunctions.isoTime })

import { TimeSpan } from 'lucia'

/** How many wrong tries at signing in are let through, and within how long. */
export const TRIES_WITHIN = new TimeSpan(15, 'm')
/** For one e-mail address from one client. */
export const TRIES_PER_ADDRESS = 10
/** From one client for any address: a whole paddock may share one. */
export const TRIES_PER_CLIENT = 100
/** For one e-mail address from all clients together: above what its owner mistypes, far below what guessing needs. */
export const TRIES_PER_ACCOUNT = 100

import type { Reason } from '~/book/actions'
import type { RefusalCode } from '~/book/operation'
import type { Seconds } from '~/track/units'
import { count } from './measures'

/**
 * The one map from a code of failure to its HTTP status and to what people read: what happened, and what to do about it.
 * Codes that carry a figure take it as `wait`, `limit` or `file`.
 */
export type ProblemCode =
  | Reason
  | RefusalCode
  | 'form'
  | 'broken-form'
  | 'wrong-sign-in'
  | 'too-many-tries'
  | 'not-found'
  | 'conflict'
  | 'taken'
  | 'in-use'
  | 'too-large'
  | 'too-much'
  | 'no-file'
  | 'broken-upload'
  | 'unreadable-file'
  | 'method'
  | 'other-site'
  | 'address'
  | 'closed'
  | 'failed'

export interface Params {
  wait?: Seconds
  file?: string
  megabytes?: number
  name?: string
}

export interface Problem {
  code: ProblemCode
  status: number
  title: string
  text: string
}

type Entry = readonly [status: number, title: string, text: string | ((params: Params) => string)]

const waitFor = (wait: Seconds) => (wait < 90 ? count(wait, 'second') : count(Math.ceil(wait / 60), 'minute'))
const theFile = (file: string | undefined) => (file ? `“${file}”` : 'The file')

const ENTRIES: Record<ProblemCode, Entry> = {
  form: [400, 'Some of this does not fit.', 'Look at the fields marked below. What you typed is kept.'],
  'broken-form': [400, 'The form did not arrive whole.', 'Go back and send it once more.'],
  'wrong-sign-in': [
    400,
    'That did not let you in.',
    'Address and password do not go together. Check both and try again.',
  ],
  'too-many-tries': [
    429,
    'Too many wrong tries from here.',
    ({ wait }) =>
      `Wait ${wait === undefined ? 'a few minutes' : waitFor(wait)}, then try again. Your account is not locked.`,
  ],
  'not-found': [404, 'Nothing here.', 'This page does not exist, or it belongs to a team you are not in.'],
  'not-a-member': [404, 'Nothing here.', 'This page does not exist, or it belongs to a team you are not in.'],
  role: [403, 'Not with your role.', 'A coach or a manager of the team can do this.'],
  'another-persons': [403, 'Someone else made this.', 'A coach or a manager can change it, or its maker.'],
  'read-only': [403, 'This book is archived.', 'It can be read, not changed.'],
  conflict: [409, 'Two people changed this.', 'Both versions are below. Keep one.'],
  taken: [
    409,
    'That name is taken.',
    ({ name }) => `${name ? `“${name}”` : 'It'} is in use in this team. Give it another name.`,
  ],
  'in-use': [409, 'It is in use.', 'Something else hangs on it, so it stays.'],
  'id-in-use': [409, 'This was sent before with other content.', 'Load the page again and repeat the change.'],
  'newer-version': [400, 'This came from a newer version.', 'Load the page again and repeat the change.'],
  'unknown-target': [404, 'It is not there any more.', 'Someone removed it meanwhile. Load the page again.'],
  'too-large': [
    413,
    'The file is too large.',
    ({ file, megabytes }) =>
      `${theFile(file)} is larger than ${megabytes ?? 20}\u00a0MB. Export one lap or the centreline alone, then bring that in.`,
  ],
  'too-much': [
    413,
    'Too much was sent.',
    ({ megabytes }) => `More than ${megabytes ?? 1}\u00a0MB. Nothing of it was kept.`,
  ],
  'no-file': [400, 'No file was chosen.', 'Choose the circuit’s file: GeoJSON, GPX, KML or CSV.'],
  'broken-upload': [400, 'The file did not arrive whole.', 'Choose it again and send it once more.'],
  'unreadable-file': [
    400,
    'No circuit in this file.',
    ({ file }) => `${theFile(file)} could not be read as a circuit.`,
  ],
  method: [405, 'That cannot be done this way.', 'Go back and use the button on the page.'],
  'other-site': [403, 'This came from another site.', 'Open the page here and send it again.'],
  address: [400, 'That address makes no sense.', 'Part of it is missing or misspelt. Go back and follow a link.'],
  closed: [503, 'The book is closed for a moment.', 'The server does not reach its database. Try again in a minute.'],
  failed: [500, 'Something broke on our side.', 'Nothing you typed was stored half. Go back and try again.'],
}

/** A failure in words, with its status. */
export function problem(code: ProblemCode, params: Params = {}): Problem {
  const [status, title, text] = ENTRIES[code]
  return { code, status, title, text: typeof text === 'function' ? text(params) : text }
}

const OF_STATUS: Record<number, ProblemCode> = {
  400: 'address',
  403: 'role',
  404: 'not-found',
  405: 'method',
  409: 'conflict',
  413: 'too-large',
  429: 'too-many-tries',
  503: 'closed',
}

/** The failure that a bare HTTP status stands for. */
export function problemOfStatus(status: number): Problem {
  return problem(OF_STATUS[status] ?? 'failed')
}

/** Whether what an answer carries is a `Problem`. */
export function isProblem(value: unknown): value is Problem {
  return typeof value === 'object' && value !== null && 'code' in value && String(value.code) in ENTRIES
}

import { type Answer, baseUrl, send } from './send'

/** The demo's people by what they may. The outsider is of the other team. */
export const PEOPLE = {
  driver: 'ilse@lanternside.example',
  coach: 'teodora@lanternside.example',
  manager: 'mona@lanternside.example',
  outsider: 'nils@greyholm.example',
} as const
export type Role = keyof typeof PEOPLE

export const demoPassword = process.env.DEMO_PASSWORD ?? ''

const browser = { 'User-Agent': 'Mozilla/5.0 (X11; Linux x86_64) Chrome/150.0.0.0', Accept: 'text/html' }
const formType = { 'Content-Type': 'application/x-www-form-urlencoded' }

/** Someone with a browser on a page of this server: signed in with a cookie, or a stranger without. */
export class Visitor {
  constructor(readonly cookie = '') {}

  get(path: string): Promise<Answer> {
    return send(path, { headers: { ...browser, Cookie: this.cookie } })
  }

  post(path: string, fields: Record<string, string> = {}): Promise<Answer> {
    const headers = { ...browser, ...formType, Origin: baseUrl, Cookie: this.cookie }
    return send(path, { method: 'POST', headers, body: new URLSearchParams(fields).toString() })
  }

  /** Sends a multipart form with one file. */
  upload(
    path: string,
    file: { name: string; bytes: Uint8Array },
    fields: Record<string, string> = {},
  ): Promise<Answer> {
    const boundary = 'turnstone-test-boundary'
    const parts = [
      ...Object.entries(fields).map(([name, value]) =>
        Buffer.from(`--${boundary}\r\nContent-Disposition: form-data; name="${name}"\r\n\r\n${value}\r\n`),
      ),
      Buffer.from(
        `--${boundary}\r\nContent-Disposition: form-data; name="file"; filename="${file.name}"\r\n` +
          'Content-Type: application/octet-stream\r\n\r\n',
      ),
      file.bytes,
      Buffer.from(`\r\n--${boundary}--\r\n`),
    ]
    const headers = {
      ...browser,
      Origin: baseUrl,
      Cookie: this.cookie,
      'Content-Type': `multipart/form-data; boundary=${boundary}`,
    }
    return send(path, { method: 'POST', headers, body: Buffer.concat(parts) })
  }
}

export const stranger = new Visitor()

/** The session cookie that an answer sets, as a browser sends it back; empty where it sets none. */
export function sessionIn({ headers }: Answer): string {
  const set = headers['set-cookie']
  const cookies = (Array.isArray(set) ? set : [set ?? '']).map((cookie) => cookie.split(';')[0] ?? '')
  return cookies.find((cookie) => /turnstone=./.test(cookie)) ?? ''
}

/** Signs one of the demo's people in. */
export async function signIn(role: Role): Promise<Visitor> {
  const answer = await stranger.post('/sign-in', { email: PEOPLE[role], password: demoPassword })
  const cookie = sessionIn(answer)
  if (answer.status !== 302 || cookie === '') throw new Error(`${role} could not sign in: ${answer.status}`)
  return new Visitor(cookie)
}

/** The words of a page, without its tags and scripts. */
export const wordsOf = ({ text }: Answer): string =>
  text
    .replace(/<script[\s\S]*?<\/script>/g, ' ')
    .replace(/<[^>]+>/g, ' ')
    .replace(/&[a-z#0-9]+;/g, (entity) => ({ '&amp;': '&', '&#x27;': '’', '&quot;': '"' })[entity] ?? ' ')
    .replace(/\s+/g, ' ')

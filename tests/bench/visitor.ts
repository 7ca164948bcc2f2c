import { Agent, get, type IncomingMessage, request } from 'node:http'

/** Someone signed in, who asks for pages one after another on one connection. */
export interface Visitor {
  page(path: string): Promise<string>
  leave(): void
}

/** A visitor of a server without sign-in. */
export function stranger(url: string, cookie = ''): Visitor {
  const agent = new Agent({ keepAlive: true, maxSockets: 1 })
  return {
    page: (path) =>
      new Promise((resolve, reject) => {
        const headers = { cookie, 'user-agent': 'Mozilla/5.0 bench' }
        get(url + path, { agent, headers }, (response) => {
          bodyOf(response).then((body) => {
            if (response.statusCode === 200) resolve(body)
            else reject(new Error(`${path} answered ${response.statusCode}`))
          }, reject)
        }).on('error', reject)
      }),
    leave: () => agent.destroy(),
  }
}

/** A visitor of the app, signed in. */
export async function signedIn(url: string, email: string, password: string): Promise<Visitor> {
  const form = new URLSearchParams({ email, password }).toString()
  const cookie = await new Promise<string>((resolve, reject) => {
    const headers = {
      'content-type': 'application/x-www-form-urlencoded',
      'content-length': Buffer.byteLength(form),
      origin: url,
    }
    const sent = request(`${url}/sign-in`, { method: 'POST', headers }, (response) => {
      response.resume()
      const set = response.headers['set-cookie']?.map((line) => line.split(';')[0]).join('; ')
      if (response.statusCode === 302 && set) resolve(set)
      else reject(new Error(`sign-in answered ${response.statusCode}`))
    })
    sent.on('error', reject)
    sent.end(form)
  })
  return stranger(url, cookie)
}

async function bodyOf(response: IncomingMessage): Promise<string> {
  const parts: Buffer[] = []
  for await (const part of response) parts.push(part as Buffer)
  return Buffer.concat(parts).toString('utf8')
}

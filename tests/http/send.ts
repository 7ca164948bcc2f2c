import { type Agent, request } from 'node:http'

/** Where the server under test answers. */
export const baseUrl = process.env.TEST_BASE_URL ?? 'http://localhost:3000'

export type Answer = { status: number; headers: Record<string, string | string[] | undefined>; text: string }

type Request = {
  method?: string
  headers?: Record<string, string>
  /** Sent with its length. */
  body?: string | Buffer
  /** Sent piece by piece, without a length. */
  pieces?: Buffer[]
  /** The connections to send on. */
  agent?: Agent
}

/** Sends a request just as it is given: no header is added but `Host`, nothing is followed. */
export function send(
  path: string,
  { method = 'GET', headers = {}, body, pieces = [], agent }: Request = {},
  base = baseUrl,
) {
  return new Promise<Answer>((resolve, reject) => {
    const length = body === undefined ? {} : { 'Content-Length': String(Buffer.byteLength(body)) }
    const sent = request(new URL(path, base), { method, agent, headers: { ...length, ...headers } }, (response) => {
      let text = ''
      response.setEncoding('utf8')
      response.on('data', (piece: string) => {
        text += piece
      })
      response.on('end', () => resolve({ status: response.statusCode ?? 0, headers: response.headers, text }))
    })
    sent.on('error', reject)
    for (const piece of pieces) sent.write(piece)
    sent.end(body)
  })
}

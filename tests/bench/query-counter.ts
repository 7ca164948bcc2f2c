import { connect, createServer, type Socket } from 'node:net'

/** A way to a database that counts the statements that pass. */
export interface QueryCounter {
  /** Address of the database through this counter. */
  url: string
  /** Statements since the last call, in their order. */
  take(): string[]
  close(): void
}

/**
 * Listens on loopback and passes everything on to the database, reading along: a simple query (Q) is one statement, and so is
 * each execution (E) of a parsed one (P). Source: PostgreSQL, Frontend/Backend Protocol, "Message Formats".
 */
export async function countQueries(databaseUrl: string): Promise<QueryCounter> {
  const target = new URL(databaseUrl)
  let seen: string[] = []
  const sockets = new Set<Socket>()
  const server = createServer((client) => {
    const database = connect(Number(target.port || 5432), target.hostname)
    const read = frontendReader((statement) => seen.push(statement))
    client.on('data', (bytes: Buffer) => {
      read(bytes)
      database.write(bytes)
    })
    database.pipe(client)
    for (const [socket, other] of [
      [client, database],
      [database, client],
    ] as const) {
      sockets.add(socket)
      socket.on('error', () => other.destroy())
      socket.on('close', () => other.destroy())
    }
  })
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const address = server.address()
  if (typeof address !== 'object' || !address) throw new Error('the counter has no port')
  const url = new URL(databaseUrl)
  url.hostname = '127.0.0.1'
  url.port = String(address.port)
  return {
    url: url.href,
    take() {
      const taken = seen
      seen = []
      return taken
    },
    close() {
      server.close()
      for (const socket of sockets) socket.destroy()
    },
  }
}

/** Reads what a client sends, in pieces of any size. The first message has no type: it opens the connection. */
function frontendReader(onStatement: (statement: string) => void) {
  let rest = Buffer.alloc(0)
  let opened = false
  let parsed = ''
  return (bytes: Buffer) => {
    rest = Buffer.concat([rest, bytes])
    for (;;) {
      const head = opened ? 1 : 0
      if (rest.length < head + 4) return
      const length = rest.readUInt32BE(head)
      if (rest.length < head + length) return
      const type = opened ? String.fromCharCode(rest[0]!) : ''
      const body = rest.subarray(head + 4, head + length)
      opened = true
      if (type === 'Q') onStatement(textFrom(body, 0))
      if (type === 'P') parsed = textFrom(body, body.indexOf(0) + 1)
      if (type === 'E') onStatement(parsed)
      rest = rest.subarray(head + length)
    }
  }
}

const textFrom = (body: Buffer, start: number) => body.toString('utf8', start, body.indexOf(0, start))

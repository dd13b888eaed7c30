import { createServer, request, type IncomingMessage, type Server, type ServerResponse } from 'node:http'
import type { AddressInfo } from 'node:net'

/** What stands between a browser and the server, and what it does there. */
export interface FrontDoor {
  baseUrl: string
  /** `open` passes everything on, `silent` takes requests and does not answer, `cut` ends the connection; of those that wait too. */
  state: 'open' | 'silent' | 'cut'
  /** Texts that are handed out changed, by their path: what another build would serve. Null is not found. */
  changed: Map<string, ((text: string) => string) | null>
  close: () => Promise<void>
}

/** Opens a way to a server that can be blocked, and behind which another build may seem to stand. */
export async function openFrontDoor(to: string): Promise<FrontDoor> {
  let state: FrontDoor['state'] = 'open'
  const unanswered = new Set<IncomingMessage>()
  const server: Server = createServer((asked, answer) => {
    if (state === 'cut') asked.socket.destroy()
    else if (state === 'open') pass(asked, answer)
    else unanswered.add(asked)
  })
  const door: FrontDoor = {
    baseUrl: '',
    get state() {
      return state
    },
    set state(next) {
      state = next
      for (const asked of unanswered) asked.socket.destroy()
      unanswered.clear()
    },
    changed: new Map(),
    close: () => new Promise((done) => {
      server.close(() => done())
      server.closeAllConnections()
    }),
  }

  function pass(asked: IncomingMessage, answer: ServerResponse) {
    const change = door.changed.get(asked.url ?? '')
    if (change === null) return void answer.writeHead(404).end()
    const { 'if-none-match': _match, 'if-modified-since': _since, ...anew } = asked.headers
    // A text that is to be changed must come whole and as it is.
    const headers = change ? { ...anew, 'accept-encoding': 'identity' } : asked.headers
    const onward = request(`${to}${asked.url}`, { method: asked.method, headers }, (response) => {
      if (!change) {
        answer.writeHead(response.statusCode ?? 502, response.headers)
        return void response.pipe(answer)
      }
      const { 'content-length': _length, 'etag': _tag, 'last-modified': _modified, ...kept } = response.headers
      const parts: Buffer[] = []
      response.on('data', (part: Buffer) => parts.push(part))
      response.on('end', () => answer.writeHead(response.statusCode ?? 502, kept).end(change(Buffer.concat(parts).toString('utf8'))))
    })
    onward.on('error', () => asked.socket.destroy())
    asked.pipe(onward)
  }

  await new Promise<void>(done => server.listen(0, 'localhost', done))
  door.baseUrl = `http://localhost:${(server.address() as AddressInfo).port}`
  return door
}

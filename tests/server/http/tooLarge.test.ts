import { once } from 'node:events'
import { createServer, type Server } from 'node:http'
import { connect, type AddressInfo } from 'node:net'
import { createApp, defineEventHandler, toNodeListener } from 'h3'
import { afterAll, beforeAll, expect, it } from 'vitest'
import gate from '../../../server/middleware/10.gate'
import { boundedBody } from '../../../server/utils/http/boundedBody'
import { sendProblem, type Problem } from '../../../server/utils/http/problem'

const MIB = 1024 * 1024

let server: Server
beforeAll(async () => {
  const app = createApp().use(gate).use(defineEventHandler(async event => boundedBody(event, MIB).then(({ length }) => ({ length }), (error: Problem) => sendProblem(event, error))))
  server = createServer(toNodeListener(app))
  await new Promise<void>(done => server.listen(0, '127.0.0.1', done))
})
afterAll(() => server.close())

/** Sends so many bytes and only then looks at the answer, as a slow phone does; answers the status. */
async function sent(mebibytes: number, length: string, isChunked = false): Promise<number> {
  const socket = connect((server.address() as AddressInfo).port, '127.0.0.1').pause()
  const write = (bytes: Buffer | string) => new Promise<void>((done, failed) => socket.write(bytes, error => error ? failed(error) : done()))
  await write(`POST /api/uploads HTTP/1.1\r\nHost: localhost\r\nSec-Fetch-Site: same-origin\r\nContent-Type: multipart/form-data; boundary=x\r\n${length}\r\n\r\n`)
  for (let sent = 0; sent < mebibytes; sent++) await write(isChunked ? Buffer.concat([Buffer.from('100000\r\n'), Buffer.alloc(MIB), Buffer.from('\r\n')]) : Buffer.alloc(MIB))
  if (isChunked) await write('0\r\n\r\n')
  const [answer] = await once(socket.resume(), 'data') as [Buffer]
  socket.destroy()
  return Number(/^HTTP\/1\.1 (\d{3}) /.exec(answer.toString('latin1'))?.[1])
}

it('is told to a sender who goes on sending, whether the length was declared or only counted', async () => {
  expect(await sent(24, `Content-Length: ${24 * MIB}`)).toBe(413)
  expect(await sent(24, 'Transfer-Encoding: chunked', true)).toBe(413)
  expect(await sent(1, `Content-Length: ${MIB}`)).toBe(200)
})

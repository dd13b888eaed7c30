import { once } from 'node:events'
import { createServer, get, type IncomingMessage } from 'node:http'
import type { AddressInfo } from 'node:net'
import { createApp, defineEventHandler, toNodeListener } from 'h3'
import { expect, it } from 'vitest'
import { csvStream, type CsvLine } from '../../../server/utils/csv/csvStream'
import { endWithAnswer } from '../../../server/utils/csv/endWithAnswer'

/** Asks for a table of so many blocks, and answers once it is closed: how many of them were made. */
async function blocksMade(of: number, read: (answer: IncomingMessage) => void): Promise<number> {
  let made = 0
  async function* blocks(): AsyncGenerator<CsvLine[]> {
    for (; made < of; made++) yield [['x'.repeat(100_000)]]
  }
  const table = csvStream(['Column'], blocks())
  const app = createApp().use(defineEventHandler((event) => {
    endWithAnswer(event, table)
    return table
  }))
  const server = createServer(toNodeListener(app)).listen(0, '127.0.0.1')
  await once(server, 'listening')
  const closed = once(table, 'close')
  get({ port: (server.address() as AddressInfo).port, host: '127.0.0.1' }, read).on('error', () => undefined)
  await closed
  server.closeAllConnections()
  server.close()
  return made
}

it('closes a table of values whose reader has gone away', async () => {
  expect(await blocksMade(100_000, answer => void answer.once('data', () => answer.destroy()))).toBeLessThan(1_000)
}, 10_000)

it('leaves one alone until it is read to its end', async () => {
  let bytes = 0
  expect(await blocksMade(50, answer => void answer.on('data', (piece: Buffer) => (bytes += piece.length)))).toBe(50)
  // The head and a line end, then 50 lines with theirs.
  await expect.poll(() => bytes).toBe(8 + 50 * 100_002)
})

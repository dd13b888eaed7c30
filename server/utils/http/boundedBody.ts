import type { IncomingMessage } from 'node:http'
import { getRequestHeader, type H3Event } from 'h3'
import { problem } from './problem'

/**
 * The bytes of a request, counted while they arrive, so that a false length does not get past the limit.
 *
 * Errors: 413 too large, 400 where they broke off.
 */
export async function boundedBody(event: H3Event, largest: number): Promise<Buffer> {
  if (isTooLarge(getRequestHeader(event, 'content-length'), largest)) throw tooLarge(largest)
  return readBytes(event.node.req, largest)
}

/** Whether a declared length is above a limit in bytes. */
export function isTooLarge(contentLength: string | undefined, largest: number): boolean {
  return contentLength !== undefined && Number(contentLength) > largest
}

/**
 * The refusal of a body above a limit in bytes.
 *
 * It does not end the connection: what is still being sent is let run off unread, until the server's time for a request
 * is over. Were it ended, its sender would learn that it broke, and not why.
 */
export function tooLarge(largest: number) {
  const most = largest < 1024 * 1024 ? `${largest / 1024} KiB` : `${Math.floor(largest / 1024 / 1024)} MiB`
  return problem(413, 'Too large', `A body may have at most ${most}.`)
}

function readBytes(request: IncomingMessage, largest: number): Promise<Buffer> {
  return new Promise((done, failed) => {
    const chunks: Buffer[] = []
    let size = 0
    request.on('data', (chunk: Buffer) => {
      size += chunk.length
      if (size <= largest) chunks.push(chunk)
      else if (size - chunk.length <= largest) failed(tooLarge(largest))
    })
    request.once('end', () => done(Buffer.concat(chunks)))
    request.once('error', failed)
    request.once('close', () => {
      if (!request.readableEnded) failed(problem(400, 'Malformed', 'The body broke off.'))
    })
  })
}

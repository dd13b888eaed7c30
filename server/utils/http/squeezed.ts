import { promisify } from 'node:util'
import { gzip } from 'node:zlib'
import { appendResponseHeader, getRequestHeader, setResponseHeader, type H3Event } from 'h3'

const gzipped = promisify(gzip)

/**
 * JSON as it goes over the network: by gzip where the asker takes that, made beside the server's own thread.
 *
 * Only for answers that hold nothing that is secret beside what their asker chose: the length of a squeezed one tells of both.
 */
export async function squeezed(event: H3Event, answer: unknown): Promise<Buffer | string> {
  setResponseHeader(event, 'Content-Type', 'application/json')
  appendResponseHeader(event, 'Vary', 'Accept-Encoding')
  const text = JSON.stringify(answer)
  if (!takesGzip(getRequestHeader(event, 'accept-encoding') ?? '')) return text
  setResponseHeader(event, 'Content-Encoding', 'gzip')
  return gzipped(text)
}

/** Whether gzip is among what is accepted and is not refused by a weight of 0 (RFC 9110, 12.5.3). */
function takesGzip(accepted: string): boolean {
  return accepted.split(',').some((part) => {
    const [name = '', ...rest] = part.split(';').map(each => each.trim().toLowerCase())
    return name === 'gzip' && !rest.some(each => /^q=0(\.0*)?$/.test(each))
  })
}

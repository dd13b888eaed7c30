import { finished, type Readable } from 'node:stream'
import type { H3Event } from 'h3'

/**
 * Closes a stream that is answered as soon as nobody takes it any more: at its end, or where its reader has gone away. The
 * framework leaves it open there.
 */
export function endWithAnswer(event: H3Event, stream: Readable): void {
  finished(event.node.res, () => void stream.destroy())
}

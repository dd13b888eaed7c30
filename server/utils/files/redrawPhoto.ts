import { once } from 'node:events'
import { existsSync } from 'node:fs'
import { dirname, resolve } from 'node:path'
import { Worker } from 'node:worker_threads'
import { LONGEST_SIDE, LONGEST_SIDE_TAKEN, MOST_PIXELS, THUMB_SIDE } from '../../../utils/photo/limits'
import type { PictureKind } from '../../../utils/photo/pictureKind'
import { problem } from '../http/problem'

/** A photo as it is kept: JPEG, upright, in sRGB, with nothing in it but the picture. */
export interface RedrawnPhoto { picture: Uint8Array, thumb: Uint8Array, width: number, height: number }

type Answer = RedrawnPhoto | { fault: 'size' | 'broken' }
type Job = { bytes: Uint8Array, kind: PictureKind }

/** Each holds a file in memory. */
const MOST_WAITING = 16
/** A photo takes a second on a slow machine; what takes longer was made to. */
const PATIENCE_MS = 20_000
/** The decoder's memory grows with the largest picture and is given back only with the decoder. */
const KEPT_IDLE_MS = 60_000

let worker: Worker | null = null
let idle: ReturnType<typeof setTimeout> | undefined
let waiting = 0
let tail: Promise<unknown> = Promise.resolve()

/**
 * Decodes a photo and draws it anew, so that place, camera and whatever else was in the file stay behind. It happens
 * outside of the server's thread, one photo at a time, by decoders that cannot reach beyond their own memory.
 *
 * Errors: 413 for more pixels than are decoded, 422 for what is no whole picture, 503 where too many are waiting.
 */
export async function redrawPhoto(job: Job): Promise<RedrawnPhoto> {
  if (waiting >= MOST_WAITING) {
    throw problem(503, 'Many photos at once', 'The server is busy with other photos. It will be sent again.', undefined, { headers: { 'Retry-After': '10' } })
  }
  waiting++
  const turn = tail.then(() => askWorker(job))
  tail = turn.catch(() => undefined)
  try {
    const answer = await turn
    if (!('fault' in answer)) return answer
    throw answer.fault === 'size'
      ? problem(413, 'Too many pixels', `A photo may have at most ${MOST_PIXELS / 1_000_000} million pixels, and ${LONGEST_SIDE_TAKEN.toLocaleString('en')} along a side.`, undefined, { type: 'too-many-pixels' })
      : problem(422, 'No whole picture', 'The file is damaged or ends too early. Take the photo again.', undefined, { type: 'broken-picture' })
  }
  finally {
    waiting--
  }
}

async function askWorker({ bytes, kind }: Job): Promise<Answer> {
  clearTimeout(idle)
  worker ??= new Worker(workerFile())
  const asked = worker
  asked.ref()
  try {
    asked.postMessage({ bytes, kind, limits: { mostPixels: MOST_PIXELS, longestSideTaken: LONGEST_SIDE_TAKEN, longestSide: LONGEST_SIDE, thumbSide: THUMB_SIDE } })
    // Rejects where the decoder itself fails, and where it is busy beyond all patience.
    const [answer] = await once(asked, 'message', { signal: AbortSignal.timeout(PATIENCE_MS) }) as [Answer]
    return answer
  }
  catch (error) {
    endWorker(asked)
    if ((error as Error).name === 'AbortError') return { fault: 'broken' }
    throw error
  }
  finally {
    asked.unref()
    idle = setTimeout(() => endWorker(asked), KEPT_IDLE_MS)
    idle.unref()
  }
}

function endWorker(ended: Worker): void {
  if (worker === ended) worker = null
  void ended.terminate()
}

/** Beside the built server, else that of the project. */
function workerFile(): string {
  const built = resolve(dirname(process.argv[1] ?? '.'), 'workers/photo.mjs')
  return existsSync(built) ? built : resolve('server/workers/photo.mjs')
}

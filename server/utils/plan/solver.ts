import { once } from 'node:events'
import { existsSync } from 'node:fs'
import { dirname, resolve } from 'node:path'
import { Worker } from 'node:worker_threads'
import type { Solution, Solve } from '../../../utils/plan/linearProgram'
import { problem } from '../http/problem'

/** Beyond its own limit a solver is only busy with its last step; what takes longer hangs. */
const PATIENCE_MS = 3_000
/** Its memory grows with the largest program and is given back only with the thread. */
const KEPT_IDLE_MS = 60_000

let worker: Worker | null = null
let idle: ReturnType<typeof setTimeout> | undefined
let tail: Promise<unknown> = Promise.resolve()

/**
 * Solves a program outside of the server's thread, one at a time, within its seconds.
 *
 * Errors: 503 where the solver failed, ran out of memory or hung. The next one finds a fresh solver.
 */
export const solveApart: Solve = (program, limits) => {
  const turn = tail.then(() => askWorker(program, limits.seconds))
  tail = turn.catch(() => undefined)
  return turn
}

/** Ends whatever the solver is at: what was asked of it fails. For the end of the server. */
export async function stopSolver(): Promise<void> {
  await worker?.terminate()
}

async function askWorker(program: string, seconds: number): Promise<Solution> {
  clearTimeout(idle)
  worker ??= new Worker(workerFile())
  const asked = worker
  asked.ref()
  const answered = new AbortController()
  const signal = AbortSignal.any([AbortSignal.timeout(Math.ceil(seconds * 1000) + PATIENCE_MS), answered.signal])
  try {
    asked.postMessage({ program, seconds })
    // Rejects where the solver itself fails, or is busy beyond all patience; a thread that is ended says no more.
    const [answer] = await Promise.race([once(asked, 'message', { signal }), once(asked, 'exit', { signal }).then(ended)]) as [Solution]
    return answer
  }
  catch (error) {
    endWorker(asked)
    console.error('a plan was not worked out', { error: String(error) })
    throw problem(503, 'No plan was worked out', 'The solver failed or took too long. Try again, or with fewer cylinders.', undefined, { type: 'solver-failed' })
  }
  finally {
    answered.abort()
    asked.unref()
    idle = setTimeout(() => endWorker(asked), KEPT_IDLE_MS)
    idle.unref()
  }
}

function ended(): never {
  throw new Error('the solver\'s thread ended')
}

function endWorker(done: Worker): void {
  if (worker === done) worker = null
  void done.terminate()
}

/** Beside the built server, else that of the project. */
function workerFile(): string {
  const built = resolve(dirname(process.argv[1] ?? '.'), 'workers/solver.mjs')
  return existsSync(built) ? built : resolve('server/workers/solver.mjs')
}

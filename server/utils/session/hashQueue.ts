/** More hashes are asked for than can be done in a bearable time. */
export class TooManyHashes extends Error {}

/**
 * Lets only a few of the costly jobs run at once and a bounded number wait.
 *
 * Errors: the job is refused with {@link TooManyHashes} when too many wait already.
 */
export function createHashQueue({ atOnce, mostWaiting }: { atOnce: number, mostWaiting: number }) {
  let running = 0
  const waiting: (() => void)[] = []

  return async function run<T>(job: () => Promise<T>): Promise<T> {
    if (running < atOnce) running++
    else if (waiting.length >= mostWaiting) throw new TooManyHashes('Too many passwords to check at once')
    // The one that ends hands its place on, so that nobody slips in between.
    else await new Promise<void>(resolve => waiting.push(resolve))
    try {
      return await job()
    }
    finally {
      const next = waiting.shift()
      if (next) next()
      else running--
    }
  }
}

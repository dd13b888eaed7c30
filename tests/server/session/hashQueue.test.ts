import { describe, expect, it } from 'vitest'
import { createHashQueue, TooManyHashes } from '../../../server/utils/session/hashQueue'

/** A job that ends when told to, and counts how many run beside it. */
function jobs() {
  let running = 0
  let most = 0
  const ends: (() => void)[] = []
  return {
    job: async () => {
      most = Math.max(most, ++running)
      await new Promise<void>(done => ends.push(done))
      running--
    },
    async endAll() {
      for (let turns = 0; turns < 50; turns++) {
        ends.splice(0).forEach(end => end())
        await Promise.resolve()
      }
    },
    most: () => most,
  }
}

describe('hashing passwords in turn', () => {
  it('never runs more than two at once, and every one that waits gets its turn', async () => {
    const run = createHashQueue({ atOnce: 2, mostWaiting: 10 })
    const { job, endAll, most } = jobs()
    const all = Array.from({ length: 8 }, () => run(job))
    await endAll()
    expect(await Promise.all(all)).toHaveLength(8)
    expect(most()).toBe(2)
  })

  it('refuses when the bound of those that wait is reached, and takes more once they are done', async () => {
    const run = createHashQueue({ atOnce: 1, mostWaiting: 1 })
    const { job, endAll } = jobs()
    const taken = [run(job), run(job)]
    await expect(run(job)).rejects.toBeInstanceOf(TooManyHashes)
    await endAll()
    await Promise.all(taken)
    expect(await run(async () => 'done')).toBe('done')
  })

  it('goes on after a job that failed', async () => {
    const run = createHashQueue({ atOnce: 1, mostWaiting: 1 })
    await expect(run(() => Promise.reject(new Error('out of memory')))).rejects.toThrow('out of memory')
    expect(await run(async () => 'done')).toBe('done')
  })
})

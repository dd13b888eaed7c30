import { afterAll, describe, expect, it } from 'vitest'
import { solveApart, stopSolver } from '~~/server/utils/plan/solver'

afterAll(stopSolver)

const SMALL = 'Maximize\n aim: + 1 a + 1 b\nSubject To\n r0: + 1 a + 1 b <= 1\nBinary\n a\n b\nEnd\n'

/** Whole numbers that share two: no sum of theirs is odd, and it takes a solver without end to see that. */
function endless(count: number): string {
  const rows = Array.from({ length: 6 }, (_, row) => ` r${row}: ${Array.from({ length: count }, (_, column) => `+ ${(row * 37 + column * 53) % 97 + 1} x${column}`).join('\n  ')} = ${25 * count - row}`)
  return ['Minimize', ' aim: + 1 x0', 'Subject To', ...rows, 'Binary', ...Array.from({ length: count }, (_, column) => ` x${column}`), 'End', ''].join('\n')
}

describe('the solver in its own thread', () => {
  it('answers with the best, and that there is none', async () => {
    const best = await solveApart(SMALL, { seconds: 5 })
    expect(best.status).toBe('optimal')
    expect(best.values['a']! + best.values['b']!).toBe(1)
    expect((await solveApart(SMALL.replace('<= 1', '>= 3'), { seconds: 5 })).status).toBe('infeasible')
  })

  it('stops when its time is over', async () => {
    const begun = performance.now()
    expect((await solveApart(endless(60), { seconds: 0.3 })).status).toBe('stopped')
    expect(performance.now() - begun).toBeLessThan(2_000)
  })

  it('fails with words on what it cannot read, and the next plan finds it fresh', async () => {
    await expect(solveApart('Minimize nothing at all ((', { seconds: 1 })).rejects.toMatchObject({ details: { status: 503, type: 'solver-failed' } })
    expect((await solveApart(SMALL, { seconds: 5 })).status).toBe('optimal')
  })

  it('is cut short by the end of the server', async () => {
    const asked = solveApart(endless(60), { seconds: 20 })
    const failed = expect(asked).rejects.toMatchObject({ details: { status: 503 } })
    await new Promise(resolve => setTimeout(resolve, 100))
    await stopSolver()
    await failed
    expect((await solveApart(SMALL, { seconds: 5 })).status).toBe('optimal')
  })
})

import { afterAll, describe, expect, it } from 'vitest'
import { solveApart, stopSolver } from '~~/server/utils/plan/solver'

afterAll(stopSolver)

const SMALL = 'Maximize\n aim: + 1 a + 1 b\nSubject To\n r0: + 1 a + 1 b <= 1\nBinary\n a\n b\nEnd\n'

/**
 * Whether forty sets of five figures can be parted into halves that are alike in each: no branch rules another out, so
 * that a solver tries for hours. Source: Cornuéjols and Dawande, "A class of hard small 0-1 programs", 1998 (from memory).
 */
function endless(): string {
  const columns = Array.from({ length: 40 }, (_, column) => `x${column}`)
  let drawn = 1
  const draw = () => (drawn = drawn * 48_271 % 2_147_483_647) % 100
  const rows = Array.from({ length: 5 }, (_, row) => {
    const figures = columns.map(draw)
    const half = Math.floor(figures.reduce((sum, figure) => sum + figure, 0) / 2)
    return ` r${row}: ${columns.map((column, at) => `+ ${figures[at]} ${column}`).join('\n  ')} = ${half}`
  })
  return ['Minimize', ' aim: + 1 x0', 'Subject To', ...rows, 'Binary', ...columns.map(column => ` ${column}`), 'End', ''].join('\n')
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
    expect((await solveApart(endless(), { seconds: 0.3 })).status).toBe('stopped')
    expect(performance.now() - begun).toBeLessThan(2_000)
  })

  it('fails with words on what it cannot read, and the next plan finds it fresh', async () => {
    await expect(solveApart('Minimize nothing at all ((', { seconds: 1 })).rejects.toMatchObject({ details: { status: 503, type: 'solver-failed' } })
    expect((await solveApart(SMALL, { seconds: 5 })).status).toBe('optimal')
  })

  it('is cut short by the end of the server', async () => {
    const asked = solveApart(endless(), { seconds: 20 })
    const failed = expect(asked).rejects.toMatchObject({ details: { status: 503 } })
    await new Promise(resolve => setTimeout(resolve, 100))
    await stopSolver()
    await failed
    expect((await solveApart(SMALL, { seconds: 5 })).status).toBe('optimal')
  })
})

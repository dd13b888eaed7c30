import { describe, expect, it } from 'vitest'
import { codes, contentsAfter, did, filled, kg, lastMovements, registered, REQUALIFIER, viewAfter } from '~~/tests/helpers/custody'

const full = [registered(), filled('R-22', 20)]

describe('refrigerant lost', () => {
  it('is the difference where the cylinder was weighed after', () => {
    expect(lastMovements(...full, did('lost', { cause: 'hose', grossAfter: kg(19.5) }))).toEqual(['lost R-22 -500'])
  })

  it('without a weight leaves a net that nobody knows', () => {
    expect(contentsAfter(...full, did('lost', { cause: 'hose' }))).toMatchObject({ netGrams: null, refrigerant: 'R-22', basis: 'unknown' })
    expect(lastMovements(...full, did('lost', { cause: 'hose' }))).toEqual(['lost R-22 -8000'])
  })

  it('by a leak or an accident asks for a test before the next fill, by hose, relief or nobody knows how it does not', () => {
    const after = (cause: 'leak' | 'accident' | 'hose' | 'relief' | 'unknown') => viewAfter([...full, did('lost', { cause, grossAfter: kg(19) })])
    for (const cause of ['leak', 'accident'] as const) {
      expect(after(cause)).toMatchObject({ holds: ['damaged'], lifecycle: 'in-service', capacity: { stopWeightGrams: null, roomGrams: null } })
      expect(after(cause).capacity.refusals.map(({ code }) => code)).toEqual(['early-test'])
    }
    for (const cause of ['hose', 'relief', 'unknown'] as const) expect(after(cause)).toMatchObject({ holds: [], capacity: { stopWeightGrams: 28_000 } })
  })

  it('keeps its hold until a test has passed', () => {
    const leaking = [...full, did('lost', { cause: 'leak', grossAfter: kg(19) })]
    const retested = (result: 'passed' | 'rejected') => did('retested', { month: '2026-07', method: 'volumetric', result, requalifierId: REQUALIFIER })
    expect(viewAfter([...leaking, retested('rejected')]).holds).toEqual(['damaged', 'wet', 'rejected'])
    expect(viewAfter([...leaking, retested('passed')]).holds).toEqual(['wet'])
    expect(codes(viewAfter([...leaking, retested('passed')]))).toEqual(['wet'])
  })

  it('from a cylinder with nothing in it loses nothing, but it does not count as evacuated', () => {
    expect(contentsAfter(registered(), did('lost', { cause: 'leak' }))).toMatchObject({ nothingInIt: true, evacuated: false, netGrams: 0 })
  })
})

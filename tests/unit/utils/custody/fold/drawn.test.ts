import { describe, expect, it } from 'vitest'
import { contentsAfter, CUSTOMER, did, filled, kg, lastFindings, lastMovements, registered, STAMP } from '~~/tests/helpers/custody'
import type { DetailsOf } from '~~/utils/custody/schema'

const drawn = (grossAfterKg: number, details: Partial<DetailsOf<'drawn'>> = {}) => did('drawn', { grossAfter: kg(grossAfterKg), purpose: 'same-system', ...details })
const full = [registered(), filled('R-22', 20)]

describe('refrigerant drawn', () => {
  it('goes out by its purpose', () => {
    const causes = (['same-system', 'same-owner', 'sampling', 'other'] as const).flatMap(purpose => lastMovements(...full, drawn(18, { purpose })))
    expect(causes).toEqual(['drawn-same-system R-22 -2000', 'drawn-same-owner R-22 -2000', 'sampled R-22 -2000', 'drawn-other R-22 -2000'])
  })

  it('leaves a heel by name, not an empty cylinder', () => {
    expect(contentsAfter(...full, drawn(12))).toMatchObject({ refrigerant: 'R-22', netGrams: 0, nothingInIt: false, evacuated: false })
  })

  it('of two owners goes out by share, the last gram from the larger', () => {
    const shared = [registered(), filled('R-22', 14), filled('R-22', 15, { ownerOfRefrigerantId: CUSTOMER })]
    // 2000 and 1000 g; 100 g are 66.7 and 33.3.
    expect(lastMovements(...shared, drawn(14.9))).toEqual(['drawn-same-system R-22 -67', 'drawn-same-system R-22 -33 f1'])
  })

  it('is not known where nobody knows the weight before', () => {
    const story = [registered({ contents: { refrigerant: 'R-22', condition: 'clean' } }), drawn(15)]
    expect(lastFindings(...story)).toEqual(['weight-not-known'])
    expect(lastMovements(...story)).toEqual(['opening R-22 3000'])
  })

  it('cannot make a cylinder heavier', () => {
    expect(lastMovements(...full, drawn(21))).toEqual(['weighing R-22 1000'])
    expect(lastFindings(...full, drawn(21))).toEqual(['weigh-again'])
  })

  it('as vapour makes a blend suspect whose parts boil 1.5 K apart or more', () => {
    const after = (refrigerant: string, phase: 'liquid' | 'vapour') => contentsAfter(
      registered({ stamp: { ...STAMP, servicePressurePsig: 500 } }), filled(refrigerant, 20), drawn(18, { phase }),
    ).condition
    // Glides: R-407C 7.0 K, R-454B 1.21 K.
    expect(after('R-407C', 'vapour')).toBe('suspect')
    expect(after('R-407C', 'liquid')).toBe('clean')
    expect(after('R-454B', 'vapour')).toBe('clean')
  })
})

import { describe, expect, it } from 'vitest'
import { certificationWords, isCertified, type Certification } from '../../../../utils/access/certification'

const NONE: Certification = { certificationType: null, certificationNumber: null, certification: null }

describe('a certification on record', () => {
  it.each<[Partial<Certification>, string | null]>([
    [{}, null],
    [{ certificationType: 'I' }, 'Type I'],
    [{ certificationType: 'II', certificationNumber: '4411' }, 'Type II, no. 4411'],
    [{ certificationType: 'III', certification: 'state licence 8' }, 'Type III, state licence 8'],
    [{ certificationType: 'universal', certificationNumber: '20-77' }, 'Universal, no. 20-77'],
    [{ certification: 'Universal, 40 CFR 82.161' }, 'Universal, 40 CFR 82.161'],
  ])('reads %o as %s', (given, words) => {
    expect(certificationWords({ ...NONE, ...given })).toBe(words)
  })

  it('counts by its type, and as it was written before types were asked for', () => {
    expect(isCertified({ certificationType: 'I', certification: null })).toBe(true)
    expect(isCertified({ certificationType: null, certification: 'an older card' })).toBe(true)
    expect(isCertified(NONE)).toBe(false)
  })
})

import { describe, expect, it } from 'vitest'
import { changedInWords, differencesInWords } from '../../../../utils/picture/changedLine'
import type { SaidAfter } from '../../../../utils/custody/laterLines'

const SAID: SaidAfter = { netGrams: 6_000, refrigerant: 'R-22', condition: 'clean', findings: [] }

describe('what a line says since another was recorded', () => {
  it('names each difference with what it was before', () => {
    expect(changedInWords({
      eventId: 'x', version: 2, kind: 'weighed', before: { ...SAID, findings: ['weigh-again'] },
      now: { netGrams: null, refrigerant: null, condition: 'mixed', findings: ['overfill'] },
    }, 'kg')).toBe('weighed: net 6.00\u00A0kg, now not known; R-22, now not known; clean, now mixed; now “overfilled”; no longer “weigh again”')
  })

  it('is nothing where nothing differs, and tells 0 from not known', () => {
    expect(differencesInWords(SAID, SAID, 'kg')).toEqual([])
    expect(differencesInWords({ ...SAID, netGrams: 0 }, { ...SAID, netGrams: null }, 'kg')).toEqual(['net 0.00\u00A0kg, now not known'])
  })
})

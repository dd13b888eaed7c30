import { describe, expect, it } from 'vitest'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import type { FirmRule } from '~~/utils/contract/policy'
import { densityNote, policyNote, stampNote, workingFacts } from '~~/utils/picture/workingNotes'

const NOON = Date.UTC(2026, 2, 4, 18)
const ZONE = 'America/Chicago'

const SET: FirmRule = {
  id: 'a', kind: 'fill-policy', value: DEFAULT_FILL_POLICY, fromAt: NOON, reason: 'hot vans', setAt: NOON, setBy: { id: 'p', name: 'M. Sorrel' }, withdrawn: null,
}

function noteOf(rules: FirmRule[], nowMs: number) {
  return policyNote({ fillPolicy: { ...DEFAULT_FILL_POLICY, shareThousandths: 750 }, rules, timeZone: ZONE }, nowMs)
}

describe('what follows from a sum', () => {
  const of = { exactStopWeightGrams: 29_950, waterCapacity: { unit: 'lb' as const, value: 47.7 }, liquidFull: { aboveC: 60 }, nothingInIt: true }

  it('is the stop weight in the other units, the volume and the liquid-full temperature', () => {
    expect(workingFacts(of, 'lb').map(({ value }) => value)).toEqual(['66\u00A0lb\u00A00\u00A0oz, 29.95\u00A0kg', '21.66\u00A0L', 'above\u00A0140\u00A0°F'])
  })

  it('is said for what is in it, or for a fill to the limit', () => {
    expect(workingFacts(of, 'lb')[2]!.term).toContain('when filled to the limit')
    expect(workingFacts({ ...of, nothingInIt: false }, 'lb')[2]!.term).toContain('in it now')
  })

  it('has a reason where there is nothing to say', () => {
    expect(workingFacts({ ...of, exactStopWeightGrams: null, waterCapacity: null, liquidFull: null }, 'kg').map(({ value }) => value)).toEqual([null, null, null])
  })
})

describe('what the figures rest on', () => {
  const refrigerant = { designation: 'R-0', accuracyGroup: 'B' as const, relativeErrorDensity: 0.005, source: 'an equation' }

  it('is the accuracy of the densities, as an estimate, with its doubt', () => {
    expect(densityNote(refrigerant)).toBe('Densities of R-0: accuracy group B, about 0.5 % (an estimate). Computed by an equation.')
    expect(densityNote({ ...refrigerant, doubt: 'one mixing rule is guessed.' })).toContain('In doubt: one mixing rule is guessed. ')
  })

  it('is whoever read the stamp', () => {
    expect(stampNote({ atMs: NOON, by: 'T. Averly' }, ZONE)).toBe('Stamp read 4 Mar 2026 12:00 by T. Averly.')
  })

  it('is the rule that the firm set, from its very instant on, with its reason', () => {
    expect(noteOf([SET], NOON)).toBe('Fill rule of 4 Mar 2026 12:00, set by M. Sorrel: share 0.75, ceiling 0.95 of liquid-full at 131 °F. Reason: hot vans.')
    expect(noteOf([SET], NOON - 1)).toContain('the default')
  })

  it('is not a rule that was withdrawn, and of several the latest that has begun', () => {
    expect(noteOf([{ ...SET, withdrawn: { by: SET.setBy, at: NOON, reason: 'a slip' } }], NOON + 1)).toContain('the default')
    expect(noteOf([{ ...SET, fromAt: NOON + 10, reason: 'later' }, { ...SET, fromAt: NOON + 5, reason: 'between' }, SET], NOON + 7)).toContain('between')
  })
})

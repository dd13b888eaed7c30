import { describe, expect, it } from 'vitest'
import { amountText, readAmount } from '~~/utils/reclaim/amountEntry'
import { readPrice, type PriceTyped } from '~~/utils/reclaim/priceTyped'
import type { ReclaimerTerms } from '~~/utils/reclaim/terms'
import { readTerms, takenRow, typedTerms, type TermsTyped } from '~~/utils/reclaim/termsTyped'

const TERMS: ReclaimerTerms = {
  refrigerants: [{ designation: 'R-22', conditions: ['clean', 'burnt'] }], takesMixed: true, takesUnknown: false, takesOverdue: true,
  specs: ['DOT-4BA', 'DOT-4BW'], pressuresPsig: [260, 400], mostContaminationPercent: 2.5, minimum: { unit: 'lb', value: 500 },
  minimumCylinders: 10, pickUpCents: 7550, note: 'Ring the dock the day before.',
}

function faults(more: Partial<TermsTyped>): string[] {
  return readTerms({ ...typedTerms(TERMS, '2026-06-01'), ...more }).faults.map(({ path }) => path)
}

describe('an amount as it is typed', () => {
  it('is kept to its last decimal, and refused where it has more', () => {
    expect(readAmount('2.125', 3)).toEqual({ parts: 2125 })
    expect(readAmount('75', 2)).toEqual({ parts: 7500 })
    expect(readAmount('75,5', 2)).toEqual({ parts: 7550 })
    // A floating point number times a hundred would give 114.99999999999999.
    expect(readAmount('1.15', 2)).toEqual({ parts: 115 })
    expect(readAmount('0', 2)).toEqual({ parts: 0 })
    expect(readAmount('2.125', 2)).toEqual({ reason: 'At most two decimals.', isEmpty: false })
  })

  it('is never nothing for an empty box, and never guessed', () => {
    expect(readAmount(' ', 2)).toMatchObject({ isEmpty: true })
    expect(readAmount('1,250', 2)).toMatchObject({ isEmpty: false })
    expect(readAmount('-5', 2)).toMatchObject({ isEmpty: false })
    expect(readAmount('five', 2)).toMatchObject({ isEmpty: false })
  })

  it('stands in its box as it was recorded', () => {
    expect(amountText(7550, 2)).toBe('75.50')
    expect(amountText(2125, 3)).toBe('2.125')
    expect(amountText(5250, 3)).toBe('5.25')
    expect(amountText(5000, 3)).toBe('5.00')
  })
})

describe('terms as they are typed', () => {
  it('begin from those that stand, and read back the same', () => {
    expect(readTerms(typedTerms(TERMS, '2026-06-01'))).toEqual({ fromDay: '2026-06-01', terms: TERMS, faults: [] })
  })

  it('are nothing where nothing is typed', () => {
    expect(readTerms(typedTerms(null, '2026-06-01'))).toMatchObject({
      terms: { refrigerants: [], takesMixed: false, specs: null, pressuresPsig: null, mostContaminationPercent: null, minimum: null, minimumCylinders: null, pickUpCents: null, note: null },
    })
    expect(readTerms({ ...typedTerms(null, '2026-06-01'), pickUp: '0' })).toMatchObject({ terms: { pickUpCents: 0 } })
  })

  it('want a day, a condition for each refrigerant, and figures that can be read', () => {
    expect(faults({ fromDay: '2026-02-30' })).toEqual(['fromDay'])
    expect(faults({ refrigerants: [takenRow('R-22', [])] })).toEqual(['terms.refrigerants'])
    expect(faults({ specs: 'DOT-4BA, DOT-5' })).toEqual(['terms.specs'])
    expect(faults({ specs: 'dot-4ba dot-4ba' })).toEqual([])
    expect(faults({ pressures: '400 psi' })).toEqual(['terms.pressuresPsig'])
    expect(faults({ contamination: '100' })).toEqual([])
    expect(faults({ contamination: '100.1' })).toEqual(['terms.mostContaminationPercent'])
    expect(faults({ minimum: '0' })).toEqual(['terms.minimum'])
    expect(faults({ minimum: '1,250' })).toEqual(['terms.minimum'])
    expect(faults({ minimumCylinders: '0' })).toEqual(['terms.minimumCylinders'])
    expect(faults({ minimumCylinders: '2.5' })).toEqual(['terms.minimumCylinders'])
    expect(faults({ pickUp: '75.005' })).toEqual(['terms.pickUpCents'])
  })
})

describe('a price as it is typed', () => {
  const typed: PriceTyped = { refrigerant: 'R-22', condition: 'clean', pays: 'they', amount: '5.25', per: 'lb', fromDay: '2026-06-01', untilDay: '' }
  const paths = (more: Partial<PriceTyped>) => readPrice({ ...typed, ...more }).faults.map(({ path }) => path)

  it('is below zero where we pay', () => {
    expect(readPrice(typed).draft).toEqual({ refrigerant: 'R-22', condition: 'clean', mills: 5250, per: 'lb', fromDay: '2026-06-01', untilDay: null })
    expect(readPrice({ ...typed, refrigerant: '', condition: 'mixed', pays: 'we', amount: '1.5' }).draft).toMatchObject({ refrigerant: null, mills: -1500 })
    expect(Object.is(readPrice({ ...typed, pays: 'we', amount: '0' }).draft?.mills, 0)).toBe(true)
  })

  it('wants a condition, an amount and days in their order', () => {
    expect(paths({ condition: '' })).toEqual(['condition'])
    expect(paths({ refrigerant: '' })).toEqual(['condition'])
    expect(paths({ amount: '' })).toEqual(['mills'])
    expect(paths({ amount: '10000' })).toEqual([])
    expect(paths({ amount: '10000.001' })).toEqual(['mills'])
    expect(paths({ fromDay: '' })).toEqual(['fromDay'])
    expect(paths({ untilDay: '2026-06-01' })).toEqual([])
    expect(paths({ untilDay: '2026-05-31' })).toEqual(['untilDay'])
  })
})

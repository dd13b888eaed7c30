import { describe, expect, it } from 'vitest'
import { differencesOf, disputeChanges, type DisputeState } from '../../../../utils/settlement/dispute'
import { NOTHING_SAID, type LineFigures, type SettlementFigures } from '../../../../utils/settlement/figures'

// 18,144 g gross: both scales together 182 g where theirs stands at the same weight.
const SENT = { grossGrams: 18_144, netGrams: 5_670, refrigerant: 'R-22', condition: 'clean' }
const NO_STATEMENT = { number: null, day: null, others: [], totalCents: null }

function settlement(figures: Partial<LineFigures>, more: Partial<SettlementFigures> = {}): SettlementFigures {
  return { lines: [{ cylinderId: 'a', sent: SENT, figures: { ...NOTHING_SAID, outcome: 'taken-over', ...figures } }], statement: NO_STATEMENT, unexpected: [], ...more }
}

const about = (figures: SettlementFigures) => differencesOf(figures).map(one => one.about)

describe('what opens a dispute by itself', () => {
  it('is a weight beyond both scales, and none within', () => {
    expect(about(settlement({ theirGross: { unit: 'kg', value: 17.963 }, acceptedNet: { unit: 'kg', value: 5.489 } }))).toEqual([])
    expect(about(settlement({ theirGross: { unit: 'kg', value: 17.962 } }))).toEqual(['gross'])
    expect(about(settlement({ acceptedNet: { unit: 'kg', value: 5.487 } }))).toEqual(['net'])
  })

  it('is a line that did not arrive, and cylinders that nobody sent', () => {
    expect(differencesOf(settlement({ outcome: 'not-arrived' }))).toEqual([{ about: 'missing', cylinderId: 'a', measure: '' }])
    expect(differencesOf(settlement({}, { unexpected: ['Z2', 'A1'] }))).toEqual([{ about: 'unexpected', cylinderId: null, measure: 'A1, Z2' }])
  })

  it('is every cent between what is stated and what its figures give, by line and in total', () => {
    const priced = { acceptedNet: { unit: 'kg' as const, value: 5.67 }, rate: { mills: 1_000, per: 'kg' as const } }
    expect(about(settlement({ ...priced, statedCents: 567 }, { statement: { ...NO_STATEMENT, totalCents: 567 } }))).toEqual([])
    expect(differencesOf(settlement({ ...priced, statedCents: 566 }, { statement: { ...NO_STATEMENT, totalCents: 568 } }))).toEqual([
      { about: 'credit', cylinderId: 'a', measure: '-1' }, { about: 'total', cylinderId: null, measure: '1' },
    ])
  })

  it('is nothing that is not known', () => {
    expect(about(settlement({ statedCents: 500, outcome: null }, { statement: { ...NO_STATEMENT, totalCents: 500 } }))).toEqual([])
  })
})

describe('what the figures do to the disputes', () => {
  const gross = (measure: string) => ({ about: 'gross' as const, cylinderId: 'a', measure })
  const dispute = (more: Partial<DisputeState>): DisputeState => ({ id: '1', about: 'gross', cylinderId: 'a', isByFigures: true, isOpen: true, endedMeasure: null, ...more })

  it('opens a new one once', () => {
    expect(disputeChanges([], [gross('-200')]).open).toEqual([gross('-200')])
    expect(disputeChanges([dispute({})], [gross('-300')])).toEqual({ open: [], reopen: [], end: [] })
  })

  it('opens an ended one again where the difference is another, and lets it rest where it is the same', () => {
    const ended = dispute({ isOpen: false, endedMeasure: '-200' })
    expect(disputeChanges([ended], [gross('-200')])).toEqual({ open: [], reopen: [], end: [] })
    expect(disputeChanges([ended], [gross('-201')]).reopen).toEqual([{ id: '1', difference: gross('-201') }])
    expect(disputeChanges([dispute({ isOpen: false })], [gross('-200')]).reopen).toHaveLength(1)
  })

  it('ends with its difference, unless a person opened it', () => {
    expect(disputeChanges([dispute({})], []).end).toEqual(['1'])
    expect(disputeChanges([dispute({ isByFigures: false })], []).end).toEqual([])
    expect(disputeChanges([dispute({ isOpen: false })], []).end).toEqual([])
  })

  it('does not open a second one beside an open one about the same', () => {
    const both = [dispute({ id: '1' }), dispute({ id: '2', isOpen: false, endedMeasure: '-100' })]
    expect(disputeChanges(both, [gross('-200')])).toEqual({ open: [], reopen: [], end: [] })
  })
})

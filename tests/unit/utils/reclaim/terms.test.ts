import { describe, expect, it } from 'vitest'
import { DAY, did, filled, registered, SHOP, STAMP, START, viewAfter, type Told } from '~~/tests/helpers/custody'
import { refusals, refusedBy, type Offered, type ReclaimerTerms } from '~~/utils/reclaim/terms'

const TERMS: ReclaimerTerms = {
  refrigerants: [{ designation: 'R-22', conditions: ['clean', 'suspect'] }, { designation: 'R-134a', conditions: ['clean', 'suspect', 'burnt'] }],
  takesMixed: false, takesUnknown: false, takesOverdue: false, specs: null, pressuresPsig: null,
  mostContaminationPercent: null, minimum: null, minimumCylinders: null, pickUpCents: null, note: null,
}
const CLEAN: Offered = { refrigerant: 'R-22', condition: 'clean', nothingInIt: false, spec: 'DOT-4BA', servicePressurePsig: 400, retest: 'in-date' }

function texts(offered: Partial<Offered>, terms: Partial<ReclaimerTerms> = {}): string[] {
  return refusals({ ...TERMS, ...terms }, { ...CLEAN, ...offered }).map(({ text }) => text)
}

describe('a reclaimer takes', () => {
  it('what is on its list, in the conditions that stand there', () => {
    expect(texts({})).toEqual([])
    expect(texts({ condition: 'suspect' })).toEqual([])
    expect(texts({ condition: 'burnt' })).toEqual(['The reclaimer takes R-22 only clean or suspect; by the log this is burnt (oil, acid).'])
    expect(texts({ refrigerant: 'R-134a', condition: 'burnt' })).toEqual([])
    expect(texts({ refrigerant: 'R-410A' })).toEqual(['The reclaimer does not take R-410A.'])
  })

  it('mixed contents only where it says so, whatever is on its list', () => {
    expect(texts({ condition: 'mixed' })).toEqual(['The reclaimer does not take mixed contents.'])
    expect(texts({ refrigerant: null, condition: 'mixed' }, { takesMixed: true })).toEqual([])
    expect(texts({ refrigerant: 'R-410A', condition: 'mixed' }, { takesMixed: true })).toEqual([])
  })

  it('what nobody has named only where it says so', () => {
    expect(texts({ refrigerant: null, condition: 'unknown' })).toHaveLength(1)
    expect(texts({ refrigerant: null, condition: 'unknown' }, { takesUnknown: true })).toEqual([])
    expect(texts({ refrigerant: null, condition: 'unknown' }, { takesMixed: true })).toHaveLength(1)
  })

  it('cylinders past their date, or without one, only where it says so', () => {
    expect(texts({ retest: 'due-soon' })).toEqual([])
    expect(texts({ retest: 'not-required' })).toEqual([])
    expect(texts({ retest: 'overdue' })).toEqual(['The reclaimer does not take cylinders past their retest date.'])
    expect(texts({ retest: 'unknown' })).toHaveLength(1)
    expect(texts({ retest: 'overdue' }, { takesOverdue: true })).toEqual([])
  })

  it('the specifications and service pressures that it names, any where it names none', () => {
    expect(texts({}, { specs: ['DOT-4BA', 'DOT-4BW'] })).toEqual([])
    expect(texts({ spec: 'DOT-3AA' }, { specs: ['DOT-4BA', 'DOT-4BW'] })).toEqual(['The reclaimer takes DOT-4BA or DOT-4BW only; this is a DOT-3AA.'])
    expect(texts({ spec: null }, { specs: ['DOT-4BA'] })).toHaveLength(1)
    expect(texts({}, { pressuresPsig: [260, 350] })).toEqual(['The reclaimer takes service pressures of 260 or 350 psig only; this one has 400 psig.'])
    expect(texts({}, { pressuresPsig: [400] })).toEqual([])
    expect(texts({ servicePressurePsig: null }, { pressuresPsig: [400] })).toHaveLength(1)
  })

  it('contamination up to its share, not above; a mixed one that was never analysed is refused', () => {
    const five = { mostContaminationPercent: 5, takesMixed: true }
    expect(texts({ contaminationPercent: 5 }, five)).toEqual([])
    expect(texts({ contaminationPercent: 5.1 }, five)).toEqual(['The reclaimer takes at most 5 % of other refrigerants; by its last analysis this holds 5.1 %.'])
    expect(texts({ contaminationPercent: 0 }, { mostContaminationPercent: 0 })).toEqual([])
    expect(texts({ contaminationPercent: null }, five)).toEqual([])
    expect(texts({ condition: 'mixed', contaminationPercent: null }, five)).toHaveLength(1)
    expect(texts({ condition: 'mixed' }, five)).toEqual([])
    expect(texts({ contaminationPercent: 99 })).toEqual([])
  })

  it('an empty cylinder whatever was in it, if the steel suits it', () => {
    expect(texts({ nothingInIt: true, refrigerant: null, condition: 'unknown', contaminationPercent: 40 }, { mostContaminationPercent: 5 })).toEqual([])
    expect(texts({ nothingInIt: true, retest: 'overdue' })).toHaveLength(1)
  })

  it('for several reasons at once gives each of them', () => {
    expect(texts({ condition: 'mixed', retest: 'overdue', spec: 'DOT-39' }, { specs: ['DOT-4BA'] })).toHaveLength(3)
  })
})

describe('by its log a cylinder', () => {
  const story: Told[] = [registered(), did('labelled', { code: '7K3M9Q2TX' }), filled('R-22', 20)]

  it('is taken, or refused as something not to be shipped with the terms as its source', () => {
    expect(refusedBy(TERMS, viewAfter(story))).toEqual([])
    expect(refusedBy({ ...TERMS, refrigerants: [] }, viewAfter(story))).toEqual([{
      code: 'not-shippable', severity: 'stop', text: 'The reclaimer does not take R-22.', source: 'what the reclaimer takes, as recorded', since: null,
    }])
  })

  it('past its date is told as past its date', () => {
    const old = [registered({ stamp: { ...STAMP, madeMonth: '2019-03' } }, { placeId: SHOP, occurredAt: START - DAY }), ...story.slice(1)]
    expect(refusedBy(TERMS, viewAfter(old)).map(({ text }) => text)).toEqual(['The reclaimer does not take cylinders past their retest date.'])
  })

  it('is refused by a reclaimer whose terms nobody recorded', () => {
    expect(refusedBy(null, viewAfter(story)).map(({ text }) => text)).toEqual(['What this reclaimer takes is not recorded. Ask it, and record its terms first.'])
  })
})

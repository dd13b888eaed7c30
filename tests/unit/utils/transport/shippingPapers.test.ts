import { describe, expect, it } from 'vitest'
import { madePapers, papersLine } from '~~/tests/helpers/shipmentPapers'
import type { PapersLine } from '~~/utils/transport/shippingPapers'

const holding = (refrigerant: string, given: Partial<PapersLine> = {}) => papersLine({ contents: { refrigerant, condition: 'clean', knownParts: [refrigerant], nothingInIt: false }, ...given })
const EMPTIED = { isResidue: true, gross: { unit: 'lb' as const, value: 24.3 }, netGrams: 0 }

describe('what a shipment\'s papers say', () => {
  it('counts cylinders by description, residue apart, hazardous ones first', () => {
    const { groups, totals } = madePapers([
      papersLine({ contents: { refrigerant: null, condition: 'clean', knownParts: [], nothingInIt: true }, ...EMPTIED }), holding('R-32'), holding('R-22'), holding('R-22', EMPTIED), holding('R-22'),
    ])
    expect(groups.map(({ description, isResidue, cylinders }) => [description.text, isResidue, cylinders])).toEqual([
      ['UN1018, Refrigerant gas R 22, 2.2', false, 2], ['UN1018, Refrigerant gas R 22, 2.2', true, 1], ['UN3252, Refrigerant gas R 32, 2.1', false, 1], ['Nothing in it', false, 1],
    ])
    // Three of 44.3 lb and two of 24.3 lb: 181.5 lb = 82,327 g.
    expect(totals).toEqual({ cylinders: 5, grossGrams: 82_327, netGrams: 3 * 9072 })
  })

  it('gives no sum where one of its parts is not known', () => {
    const { groups, totals } = madePapers([holding('R-22'), holding('R-22', { gross: null, netGrams: null })])
    expect(groups[0]).toMatchObject({ cylinders: 2, grossGrams: null, netGrams: null })
    expect(totals).toMatchObject({ cylinders: 2, grossGrams: null, netGrams: null })
  })

  // 49 CFR 172.604 asks for the telephone; 173.22 has the shipper classify.
  it('lacks an emergency telephone wherever something hazardous or not classified travels', () => {
    const nobody = { emergency: { telephone: ' ', contract: null } }
    expect(madePapers([holding('R-22')], nobody).missing.map(({ code }) => code)).toEqual(['emergency-telephone'])
    expect(madePapers([holding('R-22')]).missing).toEqual([])
    expect(madePapers([papersLine({ contents: { refrigerant: null, condition: 'clean', knownParts: [], nothingInIt: true } })], nobody).missing).toEqual([])
  })

  it('lacks the shipper\'s word on each line that it cannot classify', () => {
    const unknown = papersLine({ cylinderId: 'u', contents: { refrigerant: null, condition: 'unknown', knownParts: [], nothingInIt: false } })
    expect(madePapers([holding('R-22'), unknown]).missing).toMatchObject([{ code: 'not-classified', cylinderId: 'u', source: '49 CFR 173.22' }])
  })

  // 49 CFR 173.29(c)(2) and (b): no paper for collected residue; out altogether below 200 kPa gauge at 20 °C, Division 2.2 only, not ammonia.
  it('tells the reliefs for residue with their conditions, and describes the residue all the same', () => {
    const { reliefs, groups } = madePapers([holding('R-22', EMPTIED), holding('R-290', EMPTIED), holding('R-717', EMPTIED), holding('R-22')])
    expect(reliefs.map(({ source, cylinders }) => [source, cylinders])).toEqual([['49 CFR 173.29(c)(2)', 2], ['49 CFR 173.29(b)', 1]])
    expect(reliefs[1]!.conditions).toContain('under 200 kPa (29.0 psig)')
    expect(groups).toHaveLength(4)
    expect(madePapers([holding('R-22')]).reliefs).toEqual([])
  })

  // 49 CFR 172.204(b)(1): not where the shipper carries it; never eased for hazardous waste.
  it('asks for the certification unless the firm carries it on its own vehicle', () => {
    expect(madePapers([holding('R-22')]).certification.isAsked).toBe(true)
    expect(madePapers([holding('R-22')], { carriage: { by: 'not-said' } }).certification.isAsked).toBe(true)
    const own = madePapers([holding('R-22')], { carriage: { by: 'own-vehicle' } })
    expect(own.certification.isAsked).toBe(false)
    expect(own.certification.because).toContain('hazardous waste')
    expect(own.tradeException.state).toBe('may')
  })

  it('is plain data, the same after it was kept as JSON', () => {
    const papers = madePapers([holding('R-22'), holding('R-410A', { gross: null })])
    expect(JSON.parse(JSON.stringify(papers))).toEqual(papers)
  })
})

import { describe, expect, it } from 'vitest'
import { billOfLading } from '~~/utils/document/billOfLading'
import { paperPages, type Paper } from '~~/utils/document/paper'
import { madePapers, papersLine } from '~~/tests/helpers/shipmentPapers'

const pagesOf = (paper: Paper) => paperPages(paper).map(page => page.texts.map(({ text }) => text.replaceAll('\u00A0', ' ')))
/** Wrapped lines read on as one. */
const readOn = (pages: string[][]) => pages.flat().join(' ')

describe('a bill of lading', () => {
  const R22 = papersLine()

  it('carries the certification of the regulation, to be signed, and says when it need not be', () => {
    const text = readOn(pagesOf(billOfLading(madePapers([R22]), false)))
    // 49 CFR 172.204(a)(1).
    expect(text).toContain('This is to certify that the above-named materials are properly classified, described, packaged, marked and labeled, and are in proper condition for transportation according to the applicable regulations of the Department of Transportation.')
    expect(text).toContain('Accepted by the carrier')
    expect(text).toContain('2 years')
    const own = readOn(pagesOf(billOfLading(madePapers([R22], { carriage: { by: 'own-vehicle' } }), false)))
    expect(own).toContain('172.204(b)(1)')
    expect(own).toContain('hazardous waste')
  })

  it('calls residue what it is, and tells its reliefs with their conditions', () => {
    const text = readOn(pagesOf(billOfLading(madePapers([R22, papersLine({ cylinderId: 'e', isResidue: true, gross: { unit: 'lb', value: 24.3 }, netGrams: 0 })]), false)))
    expect(text).toContain('UN1018, Refrigerant gas R 22, 2.2. RESIDUE: Last Contained')
    expect(text).toContain('49 CFR 173.29(c)(2)')
    expect(text).toContain('200 kPa (29.0 psig)')
  })

  it('says whose judgement a description is and what is from memory', () => {
    const blend = papersLine({ contents: { refrigerant: 'R-410A', condition: 'clean', knownParts: ['R-410A'], nothingInIt: false } })
    const mixed = papersLine({ cylinderId: 'f', contents: { refrigerant: null, condition: 'mixed', knownParts: ['R-22', 'R-290'], nothingInIt: false }, classification: { identification: 'UN3161', technicalNames: ['chlorodifluoromethane', 'propane'], reason: null } })
    const text = readOn(pagesOf(billOfLading(madePapers([blend, mixed]), false)))
    expect(text).toContain('What is judgement, or from memory')
    expect(text).toMatch(/UN1078, Refrigerant gases, n\.o\.s\. \(difluoromethane, pentafluoroethane\), 2\.2: .*from memory/)
    expect(text).toContain('UN3161, Liquefied gas, flammable, n.o.s. (chlorodifluoromethane, propane), 2.1: The shipper has confirmed what was proposed.')
  })

  it('is marked as a draft on every page, with what is missing, until the shipment leaves', () => {
    const papers = madePapers([...Array.from({ length: 30 }, (_, index) => papersLine({ cylinderId: String(index), contents: { refrigerant: null, condition: 'unknown', knownParts: [], nothingInIt: false } }))], { emergency: { telephone: null, contract: null } })
    const draft = pagesOf(billOfLading(papers, true))
    expect(draft.length).toBeGreaterThan(1)
    for (const page of draft) expect(page[0]).toBe('DRAFT, not for the road')
    expect(readOn(draft)).toContain('No emergency telephone is set.')
    expect(readOn(pagesOf(billOfLading(papers, false)))).not.toContain('DRAFT')
  })

  it('keeps the certification on the page on which it is signed, however long the list above it is', () => {
    for (let descriptions = 1; descriptions < 30; descriptions++) {
      const lines = Array.from({ length: descriptions }, (_, index) => papersLine({
        cylinderId: String(index), contents: { refrigerant: null, condition: 'mixed', knownParts: [], nothingInIt: false },
        classification: { identification: 'UN1078', technicalNames: [`part ${index}`, 'difluoromethane'], reason: 'as analysed' },
      }))
      const page = pagesOf(billOfLading(madePapers(lines), false)).find(texts => texts.includes('For Quillfen Cooling'))!
      expect(page, `${descriptions} descriptions`).toEqual(expect.arrayContaining(['Shipper’s certification', 'Accepted by the carrier', 'Day of acceptance']))
    }
  })
})

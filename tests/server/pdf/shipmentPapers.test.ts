import { describe, expect, it } from 'vitest'
import { labelSheetPdf } from '../../../server/utils/pdf/labelSheetPdf'
import { billOfLading } from '../../../utils/document/billOfLading'
import { packingList } from '../../../utils/document/packingList'
import { PAPER_MM, paperPages, type Paper } from '../../../utils/document/paper'
import { fonts } from '../../helpers/labelPdf'
import { drawnGlyphs, pdfTexts } from '../../helpers/pdfText'
import { madePapers, papersLine } from '../../helpers/shipmentPapers'

const printed = (paper: Paper) => labelSheetPdf({ page: PAPER_MM, pages: paperPages(paper).map(label => [{ position: 1, x: 0, y: 0, symbol: null, label }]) }, fonts)
const pagesOf = async (paper: Paper) => pdfTexts(await printed(paper)).map(page => page.replaceAll('\u00A0', ' ').split('\n'))
/** Wrapped lines read on as one. */
const readOn = (pages: string[][]) => pages.flat().join(' ')

describe('a bill of lading', () => {
  const R22 = papersLine()
  const R32 = papersLine({ cylinderId: 'b', serial: 'B-2', contents: { refrigerant: 'R-32', condition: 'clean', knownParts: ['R-32'], nothingInIt: false }, gross: { unit: 'lb', value: 61.2 }, netGrams: 16_738 })
  const evacuated = papersLine({ cylinderId: 'c', serial: 'C-3', contents: { refrigerant: null, condition: 'clean', knownParts: [], nothingInIt: true }, isResidue: true, gross: { unit: 'lb', value: 24.3 }, netGrams: 0 })

  it('names the parties, the emergency telephone and each description with its packages and weights, hazardous ones first and crossed', async () => {
    const pages = await pagesOf(billOfLading(madePapers([evacuated, R22, { ...R22, cylinderId: 'd' }, R32]), false))
    const text = readOn(pages)
    for (const said of ['Quillfen Cooling', '12 Mill Lane', 'Tarnbeck Reclaim', '9 Dock Road', 'Northway Freight', '555-0199, contract QF-88', 'Bill of lading, shipment 0004']) expect(text).toContain(said)
    // Two of 44.3 lb, 88.6 lb gross and twice 9,072 g = 40.0 lb net; one of 61.2 lb with 16,738 g = 36.9 lb; with the evacuated one 174.1 lb and 76.9 lb.
    const from = pages[0]!.indexOf('HM')
    expect(pages[0]!.slice(from, from + 24)).toEqual([
      'HM', 'Packages', 'Description', 'Gross', 'Net',
      'X', '2 cyl.', 'UN1018, Refrigerant gas R 22, 2.2', '88.6 lb', '40.0 lb',
      'X', '1 cyl.', 'UN3252, Refrigerant gas R 32, 2.1', '61.2 lb', '36.9 lb',
      '1 cyl.', 'Nothing in it', '24.3 lb', '0.0 lb',
      '4 cyl.', 'All together', '174.1 lb', '76.9 lb', 'Shipper’s certification',
    ])
    expect(text).toContain('None is needed for this load by itself.')
  })

  it('carries the certification of the regulation, to be signed, and says when it need not be', async () => {
    const text = readOn(await pagesOf(billOfLading(madePapers([R22]), false)))
    // 49 CFR 172.204(a)(1).
    expect(text).toContain('This is to certify that the above-named materials are properly classified, described, packaged, marked and labeled, and are in proper condition for transportation according to the applicable regulations of the Department of Transportation.')
    expect(text).toContain('Accepted by the carrier')
    expect(text).toContain('2 years')
    const own = readOn(await pagesOf(billOfLading(madePapers([R22], { carriage: { by: 'own-vehicle' } }), false)))
    expect(own).toContain('172.204(b)(1)')
    expect(own).toContain('hazardous waste')
  })

  it('calls residue what it is, and tells its reliefs with their conditions', async () => {
    const text = readOn(await pagesOf(billOfLading(madePapers([R22, papersLine({ cylinderId: 'e', isResidue: true, gross: { unit: 'lb', value: 24.3 }, netGrams: 0 })]), false)))
    expect(text).toContain('UN1018, Refrigerant gas R 22, 2.2. RESIDUE: Last Contained')
    expect(text).toContain('49 CFR 173.29(c)(2)')
    expect(text).toContain('200 kPa (29.0 psig)')
  })

  it('says whose judgement a description is and what is from memory', async () => {
    const blend = papersLine({ contents: { refrigerant: 'R-410A', condition: 'clean', knownParts: ['R-410A'], nothingInIt: false } })
    const mixed = papersLine({ cylinderId: 'f', contents: { refrigerant: null, condition: 'mixed', knownParts: ['R-22', 'R-290'], nothingInIt: false }, classification: { identification: 'UN3161', technicalNames: ['chlorodifluoromethane', 'propane'], reason: null } })
    const text = readOn(await pagesOf(billOfLading(madePapers([blend, mixed]), false)))
    expect(text).toContain('What is judgement, or from memory')
    expect(text).toMatch(/UN1078, Refrigerant gases, n\.o\.s\. \(difluoromethane, pentafluoroethane\), 2\.2: .*from memory/)
    expect(text).toContain('UN3161, Liquefied gas, flammable, n.o.s. (chlorodifluoromethane, propane), 2.1: The shipper has confirmed what was proposed.')
  })

  it('is marked as a draft on every page, with what is missing, until the shipment leaves', async () => {
    const papers = madePapers([...Array.from({ length: 30 }, (_, index) => papersLine({ cylinderId: String(index), contents: { refrigerant: null, condition: 'unknown', knownParts: [], nothingInIt: false } }))], { emergency: { telephone: null, contract: null } })
    const draft = await pagesOf(billOfLading(papers, true))
    expect(draft.length).toBeGreaterThan(1)
    for (const page of draft) expect(page[0]).toBe('DRAFT, not for the road')
    expect(readOn(draft)).toContain('No emergency telephone is set.')
    expect(readOn(await pagesOf(billOfLading(papers, false)))).not.toContain('DRAFT')
  })
})

describe('a packing list', () => {
  it('has 200 cylinders over several pages, each once, under a head that every page repeats', async () => {
    const lines = Array.from({ length: 200 }, (_, index) => papersLine({ cylinderId: String(index), serial: `S-${1000 + index}` }))
    const pages = await pagesOf(packingList(madePapers(lines), false))
    expect(pages.length).toBeGreaterThan(3)
    expect(pages.flat().filter(text => /^S-1\d\d\d$/.test(text))).toEqual(lines.map(({ serial }) => serial))
    const listing = pages.filter(page => page.some(text => text.startsWith('S-1')))
    for (const page of listing) expect(page.filter(text => text === 'Serial')).toHaveLength(1)
    pages.forEach((page, index) => expect(page).toContain(`Page ${index + 1} of ${pages.length}`))
    // 200 of 44.3 lb; 200 times 9,072 g = 1,814.4 kg = 4,000.1 lb.
    expect(pages.flat()).toEqual(expect.arrayContaining(['200 cyl.', '8860.0 lb', '4000.1 lb']))
  })

  it.each([
    ['lb', { unit: 'lb', value: 44.3 }, '44.3 lb', '20.0 lb'],
    ['lb-oz', { unit: 'lb-oz', lb: 44, oz: 5 }, '44 lb 5 oz', '20 lb 0 oz'],
    ['kg', { unit: 'kg', value: 20.09 }, '20.09 kg', '9.07 kg'],
  ] as const)('gives gross as it was read, and nets in %s', async (unit, gross, grossText, netText) => {
    const texts = (await pagesOf(packingList(madePapers([papersLine({ gross })], { unit }), false))).flat()
    expect(texts).toEqual(expect.arrayContaining(['24.3 lb', grossText, netText]))
  })

  it('says what the dock has to know, and what nobody knows', async () => {
    const line = papersLine({ contents: { refrigerant: null, condition: 'mixed', knownParts: [], nothingInIt: false }, notes: ['mixed', 'retest overdue'], netGrams: null, gross: null, serial: null })
    const text = readOn(await pagesOf(packingList(madePapers([line]), true)))
    for (const said of ['mixed, retest overdue', 'not weighed', 'not known', 'March 2027', 'DRAFT, not for the road', 'Loaded by', 'Received by']) expect(text).toContain(said)
  })

  it('prints long names and names in other letters whole, never as empty boxes', async () => {
    const party = { name: 'Świeży Chłód Київ Холод '.repeat(8).trim(), address: 'Οδός Ψύξης 4, Αθήνα', telephone: '555-0142' }
    const pdf = await printed(packingList(madePapers([papersLine({ serial: 'ЖД-0000000000000000000000000000000042' })], { consignee: party, shipper: party }), false))
    // Each letter by a font that has it: a name is drawn in several runs.
    const text = pdfTexts(pdf).join('').replaceAll(/\s/g, '')
    expect(text.split('ŚwieżyChłódКиївХолод'.repeat(8))).toHaveLength(3)
    expect(text).toContain('ЖД-0000000000000000000000000000000042')
    expect(text).toContain('ΟδόςΨύξης4,Αθήνα')
    expect(drawnGlyphs(pdf).filter(glyph => glyph === '0000')).toEqual([])
  })
})

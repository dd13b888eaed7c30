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

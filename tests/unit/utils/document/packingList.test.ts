import { describe, expect, it } from 'vitest'
import { packingList } from '~~/utils/document/packingList'
import { paperPages, type Paper } from '~~/utils/document/paper'
import { madePapers, papersLine } from '~~/tests/helpers/shipmentPapers'

const pagesOf = (paper: Paper) => paperPages(paper).map(page => page.texts.map(({ text }) => text.replaceAll('\u00A0', ' ')))
/** Wrapped lines read on as one. */
const readOn = (pages: string[][]) => pages.flat().join(' ')

describe('a packing list', () => {
  it.each([
    ['lb', { unit: 'lb', value: 44.3 }, '44.3 lb', '20.0 lb'],
    ['lb-oz', { unit: 'lb-oz', lb: 44, oz: 5 }, '44 lb 5 oz', '20 lb 0 oz'],
    ['kg', { unit: 'kg', value: 20.09 }, '20.09 kg', '9.07 kg'],
  ] as const)('gives gross as it was read, and nets in %s', (unit, gross, grossText, netText) => {
    const texts = (pagesOf(packingList(madePapers([papersLine({ gross })], { unit }), false))).flat()
    expect(texts).toEqual(expect.arrayContaining(['24.3 lb', grossText, netText]))
  })

  it('says what the dock has to know, and what nobody knows', () => {
    const line = papersLine({ contents: { refrigerant: null, condition: 'mixed', knownParts: [], nothingInIt: false }, notes: ['mixed', 'retest overdue'], netGrams: null, gross: null, serial: null })
    const text = readOn(pagesOf(packingList(madePapers([line]), true)))
    for (const said of ['mixed, retest overdue', 'not weighed', 'not known', 'March 2027', 'DRAFT, not for the road', 'Loaded by', 'Received by']) expect(text).toContain(said)
  })
})

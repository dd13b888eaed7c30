import { describe, expect, it } from 'vitest'
import { PAPER_MM, paperPages, type Paper, type PaperBlock } from '../../../../utils/document/paper'

const paper = (...blocks: PaperBlock[]): Paper => ({ sender: ['Quillfen Cooling', 'Telephone 555-0100'], foot: 'A paper', blocks })
const items = (count: number): PaperBlock[] => Array.from({ length: count }, (_, index) => ({ kind: 'item', text: `Point ${index + 1}` }))
const textsOf = (sheet: Paper) => paperPages(sheet).map(page => page.texts.map(({ text }) => text))

describe('a paper', () => {
  it('says on each page which it is and of how many', () => {
    expect(textsOf(paper({ kind: 'text', text: 'Short' }))[0]!.slice(-2)).toEqual(['A paper', 'Page 1 of 1'])
    const pages = textsOf(paper(...items(80)))
    expect(pages.map(texts => texts.at(-1))).toEqual(pages.map((_, index) => `Page ${index + 1} of ${pages.length}`))
    expect(pages.length).toBeGreaterThan(1)
  })

  it('leaves nothing out and says nothing twice, however many pages it takes', () => {
    const points = textsOf(paper(...items(200))).flat().filter(text => text.startsWith('Point '))
    expect(points).toEqual(Array.from({ length: 200 }, (_, index) => `Point ${index + 1}`))
  })

  it('stays inside its margins of 20 mm, and above its foot', () => {
    const long = 'Cylinders that came back from the test station last week. '.repeat(40)
    for (const page of paperPages(paper({ kind: 'title', text: long }, { kind: 'text', text: long }, { kind: 'facts', rows: [{ term: 'What', value: long }] }, ...items(90)))) {
      expect([page.width, page.height]).toEqual([PAPER_MM.width, PAPER_MM.height])
      for (const { x, y, size, align, maxWidth } of page.texts) {
        const left = align === 'right' ? x - maxWidth : x
        expect(left).toBeGreaterThanOrEqual(20)
        expect(left + maxWidth).toBeLessThanOrEqual(215.9 - 20 + 1e-9)
        expect(y - size).toBeGreaterThanOrEqual(20 - size * 0.2)
      }
      const foot = page.rules.at(-1)!.y
      for (const { y } of page.texts.slice(0, -2)) expect(y).toBeLessThan(foot)
    }
  })

  it('never leaves a heading alone at the end of a page', () => {
    for (let before = 20; before < 60; before++) {
      const pages = textsOf(paper(...items(before), { kind: 'heading', text: 'A heading' }, { kind: 'text', text: 'Its text' }))
      const page = pages.find(texts => texts.includes('A heading'))!
      expect(page, `${before} points before it`).toContain('Its text')
    }
  })

  it('repeats the head of a table on each page that goes on with it, and keeps its totals with its last line', () => {
    const columns = [{ head: 'No.', share: 1, align: 'right' as const }, { head: 'What', share: 5 }]
    for (let lines = 40; lines < 60; lines++) {
      const rows = Array.from({ length: lines }, (_, index) => [`${index + 1}`, `Line ${index + 1}`])
      const pages = textsOf(paper({ kind: 'table', columns, rows, totals: [`${lines}`, 'All of them'] }))
      expect(pages.flat().filter(text => text.startsWith('Line '))).toEqual(rows.map(row => row[1]))
      for (const page of pages) expect(page.filter(text => text === 'What'), `${lines} lines`).toHaveLength(1)
      expect(pages.find(texts => texts.includes('All of them')), `${lines} lines`).toContain(`Line ${lines}`)
    }
  })

  it('wraps what is longer than its column, and right-aligns figures at the column’s edge', () => {
    const long = 'Refrigerant gases, n.o.s. (difluoromethane, pentafluoroethane), 2.2'
    const [page] = paperPages(paper({ kind: 'table', columns: [{ head: 'Description', share: 1 }, { head: 'Gross', share: 1, align: 'right' }], rows: [[long.repeat(2), '9.0 lb'], ['x', '100.0 lb']] }))
    const [nine, hundred] = ['9.0 lb', '100.0 lb'].map(text => page!.texts.find(one => one.text === text)!)
    expect(nine!.x).toBe(hundred!.x)
    expect([nine!.align, hundred!.align]).toEqual(['right', 'right'])
    expect(page!.texts.filter(({ text, x }) => x === 20 && long.repeat(2).includes(text) && text.length > 3).length).toBeGreaterThan(1)
  })

  it('keeps the lines to sign together on one page', () => {
    for (let before = 20; before < 60; before++) {
      const pages = textsOf(paper(...items(before), { kind: 'signatures', lines: ['Loaded by', 'Day of it', 'Received by'] }))
      expect(pages.find(texts => texts.includes('Loaded by')), `${before} points before them`).toEqual(expect.arrayContaining(['Day of it', 'Received by']))
    }
  })

  it('keeps the breaks of an address', () => {
    expect(textsOf(paper({ kind: 'text', text: 'Dunmarrow Dairy\n1 Creamery Road' }))[0]).toEqual(expect.arrayContaining(['Dunmarrow Dairy', '1 Creamery Road']))
  })
})

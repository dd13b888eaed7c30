import { describe, expect, it } from 'vitest'
import { contentsTagQuery, labelsQuery, printerOf, testPageQuery } from '~~/utils/contract/labels'
import { contentsTagPath, labelsPdfPath, testPagePath, type PrintSetting } from '~~/utils/contract/printing'
import { usualPrinter } from '~~/utils/label/printer'
import { LABEL_STOCKS } from '~~/utils/label/stock'

const USUAL: PrintSetting = { stock: 'roll-4x2', start: 1, printer: usualPrinter(LABEL_STOCKS['roll-4x2']), diameterMm: null, withAdvice: false }

function queryOf(path: string): Record<string, string> {
  return Object.fromEntries(new URL(path, 'https://cylinders.example').searchParams)
}

describe('the address of printed labels', () => {
  it('is short where nothing is set', () => {
    expect(labelsPdfPath(['7K3M9Q2TX', '10100000E'], USUAL)).toBe('/api/labels.pdf?codes=7K3M9Q2TX%2C10100000E&stock=roll-4x2')
  })

  it('carries everything that was chosen to the server', () => {
    const printer = { dotsPerInch: 300, offset: { x: -1.5, y: 0.5 } }
    const asked = labelsQuery.parse(queryOf(labelsPdfPath(['7K3M9Q2TX'], { stock: 'roll-2x1', start: 1, printer, diameterMm: 152.4, withAdvice: true })))
    expect(asked).toEqual({ codes: ['7K3M9Q2TX'], stock: 'roll-2x1', start: 1, dpi: 300, x: -1.5, y: 0.5, diameter: 152.4, advice: '1' })
    expect(printerOf(asked)).toEqual(printer)
    expect(labelsQuery.parse(queryOf(labelsPdfPath(['7K3M9Q2TX'], { ...USUAL, stock: 'a4-21', start: 21, printer: usualPrinter(LABEL_STOCKS['a4-21']) })))).toMatchObject({ stock: 'a4-21', start: 21 })
  })

  it('of the test page and of a contents tag carry stock and printer too', () => {
    const printer = { dotsPerInch: 300, offset: { x: 0, y: -2 } }
    expect(testPageQuery.parse(queryOf(testPagePath('roll-4x6', printer)))).toEqual({ stock: 'roll-4x6', dpi: 300, x: 0, y: -2 })
    expect(contentsTagQuery.parse(queryOf(contentsTagPath('7K3M9Q2TX', 'letter-6', 3, usualPrinter(LABEL_STOCKS['letter-6']))))).toEqual({ stock: 'letter-6', start: 3, x: 0, y: 0 })
  })
})

describe('what is asked of a printer', () => {
  const ask = (changes: object) => labelsQuery.safeParse({ codes: '7K3M9Q2TX', ...changes }).success

  it('is a stock, a place, an offset and a fineness that there are', () => {
    expect([ask({ stock: 'a4-21', start: '21' }), ask({ stock: 'a4-21', start: '22' })]).toEqual([true, false])
    expect([ask({ x: '2' }), ask({ x: '2.5' }), ask({ y: '-2' }), ask({ y: '0.25' })]).toEqual([true, false, true, false])
    expect([ask({ dpi: '203.2' }), ask({ dpi: '300' }), ask({ dpi: '600' }), ask({ stock: 'a4-8', dpi: '203.2' })]).toEqual([true, true, false, false])
    expect([ask({ diameter: '50' }), ask({ diameter: '49' }), ask({ diameter: '2001' })]).toEqual([true, false, false])
    expect([ask({ stock: 'a4' }), ask({ stock: 'toString' })]).toEqual([false, false])
  })

  it('for a contents tag is a stock of its size', () => {
    expect([contentsTagQuery.safeParse({ stock: 'roll-4x2' }).success, contentsTagQuery.safeParse({ stock: 'a4-14' }).success]).toEqual([true, false])
  })
})

import { describe, expect, it } from 'vitest'
import type { ContentsTag } from '~~/utils/document/contentsTag'
import { contentsTagDrawing } from '~~/utils/document/contentsTagDrawing'
import { LABEL_STOCKS, takesTag } from '~~/utils/label/stock'

const LONGEST = 'Dichlorodifluoromethane and difluoroethane azeotropic mixture or Refrigerant gas R 500'

const TAG: ContentsTag = {
  code: '7K3M9Q2TX', refrigerant: 'R-500', kind: 'Recovered', net: '14.31 lb (6.49 kg)', on: '2026-11-02T12:00:00.000Z', technician: 'Tina', numberHeightMm: 6,
  entry: { un: 'UN2602', properShippingName: LONGEST, judgement: null, source: '49 CFR 172.101' },
}

const stocks = Object.values(LABEL_STOCKS).filter(takesTag)

function drawn(changes: Partial<ContentsTag>, stock: typeof stocks[number]) {
  return contentsTagDrawing({ tag: { ...TAG, ...changes }, payload: 'HTTPS://CYLINDERS.EXAMPLE/C/7K3M9Q2TX', day: '2 Nov 2026' }, stock, stock.dotsPerInch)
}

describe('the stocks of contents tags', () => {
  it('are those of 4 x 2 in and more', () => {
    expect(stocks.map(({ id }) => id)).toEqual(['roll-4x2', 'roll-4x6', 'letter-10', 'letter-6', 'a4-8'])
    expect(() => drawn({}, LABEL_STOCKS['roll-2x1'] as unknown as typeof stocks[number])).toThrow(RangeError)
  })
})

describe.each(stocks)('a contents tag on $id', (stock) => {
  it.each([6, 12] as const)('has its identification number at least %d mm high where that is asked', (numberHeightMm) => {
    const { texts } = drawn({ numberHeightMm }, stock)
    const number = texts.find(({ text }) => text === 'UN2602')!
    // Six characters, each 0.6 of the size wide; capitals are 0.714 of it high.
    const size = Math.min(number.size, number.maxWidth / 6 / 0.6002)
    expect(size * 0.714).toBeGreaterThanOrEqual(numberHeightMm)
    expect(size * 0.714).toBeLessThan(numberHeightMm + 0.3)
  })

  it('says everything of the longest name inside its outline, with its symbol free', () => {
    for (const numberHeightMm of [6, 12] as const) {
      const { texts, rules, qr, width, height } = drawn({ numberHeightMm }, stock)
      const words = texts.map(({ text }) => text).join(' ')
      for (const said of ['R-500', 'Recovered', LONGEST, 'Net 14.31 lb (6.49 kg)', '2 Nov 2026  Tina']) expect(words).toContain(said)
      expect(words.replaceAll(' ', '')).toContain('7K3M9Q2TX')

      const quiet = 4 * qr!.moduleMm
      const side = qr!.modules * qr!.moduleMm
      const zone = { left: qr!.x - quiet, right: qr!.x + side + quiet, top: qr!.y - quiet, bottom: qr!.y + side + quiet }
      // Figures and capitals stand on their baseline; words reach a quarter of their size below.
      const lines = texts.map(({ face, x, y, size, align, maxWidth }) => ({
        left: align === 'left' ? x : x - maxWidth, right: align === 'left' ? x + maxWidth : x,
        top: y - size * 0.75, bottom: y + (face.startsWith('words') ? size * 0.25 : 0),
      }))
      const boxes = [
        ...lines,
        ...rules.map(({ x, y, width, thickness }) => ({ left: x, right: x + width, top: y, bottom: y + thickness })),
      ]
      for (const { left, right, top, bottom } of boxes) {
        expect(Math.min(left, top, width - right, height - bottom)).toBeGreaterThanOrEqual(2.6)
        expect(left >= zone.right - 1e-6 || right <= zone.left || top >= zone.bottom - 1e-6 || bottom <= zone.top).toBe(true)
      }
      lines.forEach((one, at) => lines.slice(at + 1).forEach((other) => {
        expect(one.right <= other.left || other.right <= one.left || one.bottom <= other.top + 0.1 || other.bottom <= one.top + 0.1).toBe(true)
      }))
    }
  })

  it('has an outline with two corners cut and an eyelet', () => {
    const [edge, eyelet] = drawn({}, stock).strokes
    expect(edge!.path.match(/[ML]/g)).toHaveLength(6)
    expect(eyelet!.path.match(/Q/g)).toHaveLength(8)
  })

  it('leaves lines to write on where no entry is known and nothing was weighed', () => {
    const open = drawn({ net: null, entry: { un: null, properShippingName: null, judgement: 'The shipper classifies it.', source: null } }, stock)
    expect(open.rules).toHaveLength(drawn({}, stock).rules.length + 3)
    expect(open.texts.map(({ text }) => text)).toContain('UN')
  })
})

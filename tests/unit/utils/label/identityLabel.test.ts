import { describe, expect, it } from 'vitest'
import type { IdentityLabelContent, LabelledStamp } from '../../../../utils/label/identityContent'
import { identityLabel, symbolFit, type Fitting } from '../../../../utils/label/identityLabel'
import { printerChoices } from '../../../../utils/label/printer'
import { LABEL_STOCKS, type LabelStockId } from '../../../../utils/label/stock'

const roll = on('roll-4x2')
const stocks = Object.keys(LABEL_STOCKS) as LabelStockId[]

function on(id: LabelStockId, changes: Partial<Fitting> = {}): Fitting {
  return { stock: LABEL_STOCKS[id], dotsPerInch: LABEL_STOCKS[id].dotsPerInch, diameterMm: null, ...changes }
}

/** Left, top, right and bottom of what is drawn, symbol excepted; type reaches 0.75 of its size above its baseline and 0.25 below. */
function drawn({ texts, rules, strokes }: ReturnType<typeof identityLabel>): number[][] {
  return [
    ...texts.map(({ x, y, size, align, maxWidth }) => align === 'left' ? [x, y - size * 0.75, x + maxWidth, y + size * 0.25] : [x - maxWidth, y - size * 0.75, x, y + size * 0.25]),
    ...rules.map(({ x, y, width, thickness }) => [x, y, x + width, y + thickness]),
    ...strokes.map(({ path, thickness }) => {
      const numbers = path.match(/[\d.]+/g)!.map(Number)
      const [xs, ys] = [numbers.filter((_, at) => at % 2 === 0), numbers.filter((_, at) => at % 2 === 1)]
      return [Math.min(...xs) - thickness / 2, Math.min(...ys) - thickness / 2, Math.max(...xs) + thickness / 2, Math.max(...ys) + thickness / 2]
    }),
  ]
}

const STAMP: LabelledStamp = { serial: 'K48213', spec: 'DOT-4BA', servicePressurePsig: 400, tareWeight: '27.9 lb', waterCapacity: '47.7 lb' }

const CONTENT: IdentityLabelContent = {
  code: '7K3M9Q2TX',
  payload: 'HTTPS://CYLINDERS.EXAMPLE/C/7K3M9Q2TX',
  owner: 'Acme Cooling',
  telephone: '555 0142',
  copy: 1,
  stamp: STAMP,
}

function textsOf(changes: Partial<IdentityLabelContent> = {}): string[] {
  return identityLabel({ ...CONTENT, ...changes }, roll).texts.map(({ text }) => text)
}

describe('the identity label', () => {
  it('says whose the cylinder is and what its collar says, and nothing else', () => {
    expect(textsOf()).toEqual([
      'Acme Cooling', '1 of 2', 'Telephone', '555 0142', '7K3 M9Q 2TX',
      'SN', 'K48213', 'Spec', 'DOT-4BA400', 'TW', '27.9 lb', 'WC', '47.7 lb',
      'Contents are on the contents tag',
    ])
  })

  it('breaks a long name between words near its middle, and leaves a shorter one whole', () => {
    const long = 'Heatherington, Montgomery and Featherstonehaugh Refrigeration of the Northwest'
    expect(textsOf({ owner: long }).slice(0, 2)).toEqual(['Heatherington, Montgomery and Featherstonehaugh', 'Refrigeration of the Northwest'])
    expect(textsOf({ owner: 'Acme Cooling of the North East' })[0]).toBe('Acme Cooling of the North East')
    expect(textsOf({ owner: 'Acme Cooling of the North-East.' }).slice(0, 2)).toEqual(['Acme Cooling of', 'the North-East.'])
    const { texts } = identityLabel({ ...CONTENT, owner: long }, roll)
    expect(texts[0]!.y - texts[0]!.size).toBeGreaterThanOrEqual(2)
    expect(texts[1]!.y - texts[1]!.size).toBeGreaterThanOrEqual(texts[0]!.y - 0.001)
  })

  it('tells the second of its pair', () => {
    expect(textsOf({ copy: 2 })).toContain('2 of 2')
  })

  it('prints a dash for each thing that is not known, never a zero', () => {
    const unknown = { serial: null, spec: null, servicePressurePsig: null, tareWeight: null, waterCapacity: null }
    expect(textsOf({ telephone: null, stamp: unknown })).toEqual([
      'Acme Cooling', '1 of 2', 'Telephone', '–', '7K3 M9Q 2TX',
      'SN', '–', 'Spec', '–', 'TW', '–', 'WC', '–',
      'Contents are on the contents tag',
    ])
  })

  it.each([
    [{ spec: 'DOT-4BA', servicePressurePsig: null }, 'DOT-4BA –'],
    [{ spec: null, servicePressurePsig: 400 }, '– 400'],
    [{ spec: 'DOT-39', servicePressurePsig: 260 }, 'DOT-39 260'],
    [{ spec: 'DOT-4BW', servicePressurePsig: 260 }, 'DOT-4BW260'],
  ])('writes specification and service pressure of %j as %s', (marks, printed) => {
    expect(textsOf({ stamp: { ...STAMP, ...marks } })).toContain(printed)
  })

  it('leaves ruled lines to write on where no cylinder is bound yet', () => {
    const blank = identityLabel({ ...CONTENT, stamp: null }, roll)
    expect(blank.texts.map(({ text }) => text)).toEqual([
      'Acme Cooling', '1 of 2', 'Telephone', '555 0142', '7K3 M9Q 2TX', 'SN', 'Spec', 'TW', 'WC', 'Contents are on the contents tag',
    ])
    expect(blank.rules).toHaveLength(identityLabel(CONTENT, roll).rules.length + 4)
    expect(blank.qr).toEqual(identityLabel(CONTENT, roll).qr)
  })

  it('draws the symbol 29 mm wide with modules of 1 mm, eight dots of the roll printer', () => {
    const { qr } = identityLabel(CONTENT, roll)
    expect(qr).toMatchObject({ payload: CONTENT.payload, version: 3, modules: 29 })
    expect(qr.moduleMm).toBeCloseTo(1, 9)
  })

  it('draws modules of 12 dots, 1.016 mm, for a printer of 300 dpi', () => {
    expect(identityLabel(CONTENT, on('letter-10')).qr.moduleMm).toBeCloseTo(1.016, 9)
  })

  it('draws a larger symbol with smaller modules in the same place: 41 across need seven dots', () => {
    const payload = `HTTPS://${'A'.repeat(28)}/C/7K3M9Q2TX`
    const { qr } = identityLabel({ ...CONTENT, payload }, roll)
    expect(qr.version).toBe(4)
    expect(qr.moduleMm).toBeCloseTo(0.875, 9)
  })

  describe.each(stocks)('on %s', (id) => {
    const { width, height } = LABEL_STOCKS[id].label
    const labels = printerChoices(LABEL_STOCKS[id]).flatMap(dotsPerInch => [STAMP, null].map(stamp => identityLabel({ ...CONTENT, stamp }, on(id, { dotsPerInch }))))

    it('keeps four modules round the symbol free of everything, and on the label', () => {
      for (const label of labels) {
        const { qr } = label
        const quiet = 4 * qr.moduleMm
        const side = qr.modules * qr.moduleMm
        const zone = [qr.x - quiet, qr.y - quiet, qr.x + side + quiet, qr.y + side + quiet] as const
        // Half a dot at most is lost in moving it to the printer's dots.
        expect(Math.min(zone[0], zone[1], width - zone[2], height - zone[3])).toBeGreaterThanOrEqual(0.063)
        for (const box of drawn(label)) expect(box[0]! >= zone[2] || box[1]! >= zone[3]).toBe(true)
      }
    })

    it('leaves 2 mm free inside its edges', () => {
      for (const label of labels) {
        for (const [left, top, right, bottom] of drawn(label)) {
          expect(Math.min(left!, top!, width - right!, height - bottom!)).toBeGreaterThanOrEqual(2 - 1e-6)
        }
      }
    })

    it('prints nothing over anything else', () => {
      for (const label of labels) {
        const texts = drawn({ ...label, strokes: [], rules: [] })
        texts.forEach((one, index) => texts.slice(index + 1).forEach(([left, top, right, bottom]) => {
          expect(one[2]! <= left! + 1e-6 || right! <= one[0]! + 1e-6 || one[3]! <= top! || bottom! <= one[1]!).toBe(true)
        }))
      }
    })

    it('names the cylinder: its code in threes and its serial, and which of the pair it is', () => {
      const texts = labels[0]!.texts.map(({ text }) => text)
      expect(texts.join(' ')).toMatch(/7K3 M9Q 2TX/)
      expect(texts).toContain('K48213')
      expect(texts).toContain('1 of 2')
    })

    it('sets nothing in type under 1.7 mm, of which the capitals are legible from 30 cm', () => {
      // 15 minutes of arc, 0.004 of the distance: 1.2 mm; capitals are 0.714 of the size.
      for (const { size, maxWidth, text, face } of labels[0]!.texts) {
        expect(Math.min(size, maxWidth / text.length / (face.startsWith('figures') ? 0.6 : 0.5))).toBeGreaterThanOrEqual(1.7)
      }
    })
  })

  it('says less the smaller it is', () => {
    const said = (id: LabelStockId) => identityLabel(CONTENT, on(id)).texts.map(({ text }) => text)
    expect(said('letter-30')).toEqual([
      'Acme Cooling', '1 of 2', '7K3 M9Q 2TX', 'SN', 'K48213', 'Spec', 'DOT-4BA400', 'TW', '27.9 lb', 'WC', '47.7 lb', 'Contents are on the contents tag',
    ])
    expect(said('roll-3x2')).toEqual([
      'Acme Cooling', '1 of 2', '7K3 M9Q', '2TX', 'SN', 'K48213', 'Spec', 'DOT-4BA400', 'TW', '27.9 lb', 'WC', '47.7 lb', '555 0142', 'Contents are on the contents tag',
    ])
    expect(said('roll-2x1')).toEqual(['7K3 M9Q', '2TX', '1 of 2', 'SN', 'K48213'])
  })

  it.each([
    // Modules in whole dots of 0.125 mm from the roll printer, of 0.0847 mm (25.4 / 300) from an office printer.
    ['roll-4x2', 1], ['roll-4x6', 1], ['roll-3x2', 1], ['roll-2x1', 0.625],
    ['letter-30', 0.677333], ['letter-10', 1.016], ['letter-6', 1.016], ['a4-21', 0.677333], ['a4-14', 1.016], ['a4-8', 1.016],
  ] as const)('draws modules on %s of %d mm', (id, moduleMm) => {
    expect(identityLabel(CONTENT, on(id)).qr.moduleMm).toBeCloseTo(moduleMm, 5)
  })

  it('draws smaller modules for a narrow cylinder, and none where the curve is too much', () => {
    expect(identityLabel(CONTENT, on('roll-4x2', { diameterMm: 152.4 })).qr.moduleMm).toBeCloseTo(0.625, 9)
    expect(symbolFit(CONTENT.payload, on('roll-4x2', { diameterMm: 80 }))).toEqual({ is: 'too-curved' })
    expect(() => identityLabel(CONTENT, on('roll-4x2', { diameterMm: 80 }))).toThrow(RangeError)
  })

  it('has no room on the small label for the symbol of a very long host', () => {
    // Version 7, 45 modules: 53 with the quiet zone, 0.475 mm each in 25.2 mm.
    const payload = `HTTPS://${'A'.repeat(89)}/C/7K3M9Q2TX`
    expect(symbolFit(payload, on('roll-2x1'))).toEqual({ is: 'no-room' })
    expect(symbolFit(payload, on('roll-4x2')).is).toBe('good')
  })
})

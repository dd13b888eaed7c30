import { describe, expect, it } from 'vitest'
import { identityLabel, type IdentityLabelContent, type LabelledStamp } from '../../../../utils/label/identityLabel'
import { LABEL_STOCKS } from '../../../../utils/label/stock'

const roll = LABEL_STOCKS['roll-4x2']

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

  it('draws modules of 24 dots, 1.016 mm, for a printer of 600 dpi', () => {
    expect(identityLabel(CONTENT, LABEL_STOCKS['letter-10']).qr.moduleMm).toBeCloseTo(1.016, 9)
  })

  it('draws a larger symbol with smaller modules in the same place: 41 across need seven dots', () => {
    const payload = `HTTPS://${'A'.repeat(28)}/C/7K3M9Q2TX`
    const { qr } = identityLabel({ ...CONTENT, payload }, roll)
    expect(qr.version).toBe(4)
    expect(qr.moduleMm).toBeCloseTo(0.875, 9)
  })

  it('keeps four modules round the symbol free of everything', () => {
    for (const stock of [roll, LABEL_STOCKS['letter-10']]) {
      const { qr, texts, rules, frame, height } = identityLabel(CONTENT, stock)
      const quiet = 4 * qr.moduleMm
      const right = qr.x + qr.modules * qr.moduleMm + quiet
      expect(Math.min(...texts.filter(({ align }) => align === 'left').map(({ x }) => x), ...rules.map(({ x }) => x), frame.x - frame.thickness)).toBeGreaterThan(right)
      expect(qr.x - quiet).toBeGreaterThanOrEqual(0)
      expect(qr.y - quiet).toBeGreaterThanOrEqual(0)
      expect(qr.y + qr.modules * qr.moduleMm + quiet).toBeLessThanOrEqual(height)
    }
  })

  it('leaves 2 mm free inside its edges', () => {
    const { texts, rules, frame, width, height } = identityLabel({ ...CONTENT, stamp: null }, roll)
    for (const { x, y, size, align, maxWidth } of texts) {
      expect(align === 'left' ? x + maxWidth : x).toBeLessThanOrEqual(width - 2)
      expect(y - size).toBeGreaterThanOrEqual(2)
      expect(y + size * 0.3).toBeLessThanOrEqual(height - 2)
    }
    for (const rule of rules) expect(rule.x + rule.width).toBeLessThanOrEqual(width - 2)
    expect(frame.x + frame.width + frame.thickness / 2).toBeLessThanOrEqual(width - 2)
  })

  it('is refused on stock of another size', () => {
    expect(() => identityLabel(CONTENT, { ...roll, label: { width: 50.8, height: 25.4 } })).toThrow(RangeError)
  })
})

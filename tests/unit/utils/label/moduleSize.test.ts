import { describe, expect, it } from 'vitest'
import { diameterOf } from '../../../../utils/label/diameter'
import { moduleSize } from '../../../../utils/label/moduleSize'

/** The usual symbol, 29 modules, in the place of a 4 x 2 in label from a 203 dpi printer: dots of 0.125 mm. */
const USUAL = { modules: 29, sideMm: 37.6, dotsPerInch: 203.2 }

function round(diameterMm: number | null, changes: Partial<typeof USUAL> = {}) {
  const size = moduleSize({ ...USUAL, ...changes, diameterMm })
  return 'moduleMm' in size ? [size.is, Math.round(size.moduleMm * 1e6) / 1e6] : [size.is]
}

describe('the modules of a symbol', () => {
  it('are 1 mm where the place is flat or the diameter is not known', () => {
    expect(round(null)).toEqual(['good', 1])
  })

  it('are as large as an arc of 0.14 of the diameter allows, in whole dots', () => {
    // 6 in: 0.14 x 152.4 = 21.34 mm, 0.736 mm a module, five dots of 0.125. 9 in: 32.0 mm, where the place itself gives eight.
    expect(round(152.4)).toEqual(['good', 0.625])
    expect(round(228.6)).toEqual(['good', 1])
    // Eight dots are 29 mm: 29 / 0.14 = 207.1 mm across.
    expect(round(207.2)).toEqual(['good', 1])
    expect(round(207.1)).toEqual(['good', 0.875])
  })

  it('are larger than 1 mm where place and diameter are known to allow it', () => {
    expect(round(762, { sideMm: 66 })).toEqual(['good', 1.75])
  })

  it('are never under half a millimetre: between 0.14 and 0.175 of the diameter the least one, beyond it none', () => {
    // 29 x 0.5 = 14.5 mm: over 0.14 it is 103.6 mm across, over 0.175 it is 82.9.
    expect(round(103.6)).toEqual(['good', 0.5])
    expect(round(103.5)).toEqual(['at-the-limit', 0.5])
    expect(round(82.9)).toEqual(['at-the-limit', 0.5])
    expect(round(82.8)).toEqual(['too-curved'])
  })

  it('do not fit a place with less than half a millimetre for each', () => {
    // 37 modules with their quiet zone: 18.5 mm.
    expect(round(null, { sideMm: 18.5 })).toEqual(['good', 0.5])
    expect(round(null, { sideMm: 18.49 })).toEqual(['no-room'])
  })

  it('keep within the arc whatever the printer', () => {
    for (const dotsPerInch of [203.2, 300]) {
      for (let diameterMm = 83; diameterMm < 400; diameterMm += 7) {
        const size = moduleSize({ ...USUAL, dotsPerInch, diameterMm })
        if ('sideMm' in size) expect(size.sideMm).toBeLessThanOrEqual((size.is === 'good' ? 0.14 : 0.175) * diameterMm + 1e-9)
      }
    }
  })
})

describe('a diameter', () => {
  it('is read in inches, with a decimal or not', () => {
    expect([diameterOf('9'), diameterOf(' 12.25 '), diameterOf('1,97')]).toEqual([228.6, 311.2, 50])
  })

  it('is none outside what cylinders are wide', () => {
    for (const typed of ['', '1.96', '79', '9 in', '-9', '0']) expect(diameterOf(typed)).toBeNull()
  })
})

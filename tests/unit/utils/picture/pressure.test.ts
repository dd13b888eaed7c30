import { describe, expect, it } from 'vitest'
import { layOutPressureBand } from '~~/utils/picture/pressureBand'
import { bandInWords, bandOf, pressureAccount, pressureVerdict, type CheckedPressure } from '~~/utils/picture/pressureWords'
import type { PressureCheck } from '~~/utils/refrigerant/pressureCheck'

const PSI = 6.894757
const kPa = (psig: number) => psig * PSI + 101.325
const spaced = (text: string) => text.replaceAll('\u00A0', ' ')

/**
 * A blend between 90 and 100 psig (104.696 and 114.696 psia) that agrees from 80 to 112 psig; a degree F is worth 2 psi
 * at its upper edge, where the figures are good to 1 %.
 */
function checkedAt(psig: number, more: Partial<PressureCheck> = {}, reading: Partial<CheckedPressure['reading']> = {}): CheckedPressure {
  const verdict = psig > 112 ? 'excess' as const : psig < 80 ? 'below' as const : 'agrees' as const
  return {
    designation: 'R-X',
    unit: 'psi',
    reading: { pressureKPa: kPa(psig), temperatureC: 26.667, gaugeErrorKPa: PSI, thermometerErrorC: 10 / 9, barometerKPa: 101.325, ...reading },
    check: {
      dewKPa: kPa(90), bubbleKPa: kPa(100), absoluteKPa: kPa(psig), excessKPa: (psig - 100) * PSI, slopeKPaPerC: 2 * PSI * 1.8, toleranceKPa: 5 * PSI,
      dataErrorKPa: 1.147 * PSI, agreesFromKPa: kPa(80), agreesToKPa: kPa(112), verdict, relativeErrorPressure: 0.01, accuracyGroup: 'B', doubt: null,
      source: '', ...more,
    },
  }
}

describe('the strip of the gauge', () => {
  it('holds the band in where it agrees, and the reading beside it, from left to right', () => {
    const { check, reading } = checkedAt(120)
    const { from, dew, bubble, to, needle } = layOutPressureBand(check, reading.barometerKPa, 'psi')
    expect([0, from, dew, bubble, to, needle, 100].sort((a, b) => a - b)).toEqual([0, from, dew, bubble, to, needle, 100])
    // 10 of the 40 psi between 80 and 120 lie between dew and bubble, as do 10 between 80 and 90.
    expect(bubble - dew).toBeCloseTo(dew - from, 6)
    expect((needle - from) / (bubble - dew)).toBeCloseTo(4, 6)
  })

  it('keeps a reading on it, however far it lies', () => {
    for (const psig of [-14.6, 0, 96, 900]) {
      const { check, reading } = checkedAt(psig)
      const { needle } = layOutPressureBand(check, reading.barometerKPa, 'psi')
      expect(needle).toBeGreaterThanOrEqual(0)
      expect(needle).toBeLessThanOrEqual(100)
    }
  })

  it('has a few round marks, each at its place', () => {
    const { check, reading } = checkedAt(120)
    const { ticks, dew, bubble, needle } = layOutPressureBand(check, reading.barometerKPa, 'psi')
    expect(ticks.map(tick => tick.label)).toEqual(['80', '90', '100', '110', '120'])
    expect(ticks[1]!.at).toBeCloseTo(dew, 3)
    expect(ticks[2]!.at).toBeCloseTo(bubble, 3)
    expect(ticks[4]!.at).toBeCloseTo(needle, 3)
  })

  it('marks what the gauge shows in the air there is', () => {
    // 17 kPa (2.5 psi) less air: what stands at 100 psig by the sea reads 102.5 here.
    const { check } = checkedAt(120)
    const { ticks, bubble } = layOutPressureBand(check, 84.325, 'psi')
    const hundred = ticks.find(tick => tick.label === '100')!
    const next = ticks.find(tick => tick.label === '110')!
    expect((bubble - hundred.at) / (next.at - hundred.at)).toBeCloseTo(0.2466, 3)
  })

  it('marks halves of a bar where the strip is that short, and a vacuum with a minus', () => {
    // 80 to 112 psig is 5.52 to 7.72 bar, and 14 % of that beyond either end: 5.21 to 8.03.
    expect(layOutPressureBand(checkedAt(96).check, 101.325, 'bar').ticks.map(tick => tick.label)).toEqual(['5.5', '6.0', '6.5', '7.0', '7.5', '8.0'])
    const low = checkedAt(-5, { agreesFromKPa: kPa(-8), dewKPa: kPa(-6), bubbleKPa: kPa(-4), agreesToKPa: kPa(2) })
    expect(layOutPressureBand(low.check, 101.325, 'psi').ticks.map(tick => tick.label)).toEqual(['\u22128', '\u22126', '\u22124', '\u22122', '0', '2'])
  })
})

describe('what a pressure says', () => {
  it('is in words, with the amount, and names no gas', () => {
    expect(pressureVerdict(checkedAt(96))).toMatchObject({ kind: 'ok', head: 'Agrees with R-X' })
    const above = pressureVerdict(checkedAt(120.3))
    expect(spaced(above.head)).toBe('20.3 psi above R-X')
    expect(above).toMatchObject({ kind: 'att', text: 'Air or another gas may be in it; a pressure cannot tell which.' })
    const below = pressureVerdict(checkedAt(75))
    expect(spaced(below.head)).toBe('15.0 psi below R-X')
    expect(below.kind).toBe('att')
  })

  it('is the same in the picture\'s words as on the gauge', () => {
    expect(spaced(bandInWords(checkedAt(120)))).toBe(
      'The gauge shows 120.0 psig. At 80.0 °F R-X with liquid left shows 90.0 to 100.0 psig; by what gauge, thermometer and figures may be off, 80.0 to 112.0 psig agrees.',
    )
    expect(spaced(bandOf({ ...checkedAt(120), unit: 'bar' }))).toBe('6.21 to 6.89 bar')
    // A single fluid has one pressure.
    expect(spaced(bandOf(checkedAt(120, { dewKPa: 100 * PSI + 101.325 })))).toBe('100.0 psig')
    expect(spaced(bandOf(checkedAt(120, {}, { barometerKPa: 84.325 })))).toBe('92.5 to 102.5 psig')
  })
})

describe('the account of what a reading may be off', () => {
  it('goes from the instruments and the figures to where a reading agrees', () => {
    expect(pressureAccount(checkedAt(120)).map(({ term, by, figure, isSum }) => [term, by, figure, isSum].map(part => typeof part === 'string' ? spaced(part) : part))).toEqual([
      ['Gauge', null, '± 1.0 psi', false],
      ['Thermometer', '2 °F × 2.0 psi to a degree', '± 4.0 psi', false],
      ['Figures of R-X', '1 % of 114.7 psi absolute', '± 1.1 psi', false],
      ['Together', 'at the bubble pressure', '± 6.1 psi', true],
      ['R-X shows', 'dew to bubble', '90.0 to 100.0 psig', false],
      ['Agrees', null, '80.0 to 112.0 psig', true],
    ])
  })

  it('is of the dew pressure where that is nearer', () => {
    const lines = pressureAccount(checkedAt(75)).map(line => spaced(line.by ?? ''))
    expect(lines[2]).toBe('1 % of 104.7 psi absolute')
    expect(lines[3]).toBe('at the dew pressure')
    const single = pressureAccount(checkedAt(120, { dewKPa: kPa(100) })).map(line => line.by)
    expect([single[3], single[4]]).toEqual([null, null])
  })
})

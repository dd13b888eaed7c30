import { describe, expect, it } from 'vitest'
import { eightyWhenHot, heatInWords, heatOf, layOutHeat, pointInWords } from '~~/utils/picture/heat'
import { celsiusFromFahrenheit } from '~~/utils/quantity/temperature'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { kg } from '../../../helpers/custody'

function heated(refrigerant: string, netGrams: number) {
  return heatOf({ refrigerant, netGrams, ofLimit: false, waterCapacity: kg(20) }, CATALOGUE)!
}

function atF(heat: ReturnType<typeof heated>, f: number) {
  return heat.points.find(point => Math.abs(point.tC - celsiusFromFahrenheit(f)) < 0.001)!
}

describe('why filling stops by the scale', () => {
  it('R-410A filled to 80 % at 77 F is about 97 % full at 130 F: 0.8 x 1058.6 less 158 of vapor, over 870.4 less 158', () => {
    expect(eightyWhenHot(CATALOGUE.refrigerants.get('R-410A')!)).toBeCloseTo(0.967, 2)
  })

  it('R-22 swells less: 0.8 x 1190.7 less 90, over 1058.7 less 90, is 89 %', () => {
    expect(eightyWhenHot(CATALOGUE.refrigerants.get('R-22')!)).toBeCloseTo(0.89, 2)
  })

  it('R-125 would have next to no vapor left: 0.8 x 1189.4 is 951.5 of 952.2', () => {
    expect(eightyWhenHot(CATALOGUE.refrigerants.get('R-125')!)).toBeCloseTo(0.999, 3)
  })

  it('is no question for a gas', () => {
    expect(eightyWhenHot(CATALOGUE.refrigerants.get('R-744')!)).toBeNull()
  })
})

describe('the picture of a cylinder as it warms', () => {
  it('has a point to each degree Fahrenheit up to the last row', () => {
    const { points } = heated('R-22', 16_000)
    expect(points.map(({ tC }) => Math.round(tC * 9 / 5 + 32))).toEqual(Array.from({ length: points.length }, (_, index) => index))
    expect(points.at(-1)?.tC).toBe(70)
  })

  it('rises with the heat and marks 77 F and 131 F', () => {
    const { marks } = layOutHeat(heated('R-22', 16_000))
    expect(marks.map(mark => mark.temperature)).toEqual(['77\u00A0°F', '131\u00A0°F'])
    expect(marks[1]!.x).toBeGreaterThan(marks[0]!.x)
    // The higher on the screen the smaller its place from the top.
    expect(marks[1]!.y).toBeLessThan(marks[0]!.y)
  })

  it('hatches what lies past liquid-full, and nothing while vapor is left', () => {
    const over = heated('R-22', 23_000)
    const { fullFrom } = layOutHeat(over)
    const firstFull = over.points.findIndex(point => point.phase === 'liquid-full')
    expect(fullFrom).toBeCloseTo(firstFull / (over.points.length - 1) * 100, 6)
    expect(pointInWords(over.points[firstFull]!)).toContain('No vapor is left')
    expect(pointInWords(over.points[firstFull - 1]!)).toContain('99\u00A0% of the volume is liquid')
    expect(layOutHeat(heated('R-22', 16_000)).fullFrom).toBeNull()
  })

  it('reads share and pressure at a temperature: 16 kg of R-22 in 20.02 L are 799 g a litre, between 1191 of liquid and 44 of vapor; 1,044 kPa absolute', () => {
    expect(pointInWords(atF(heated('R-22', 16_000), 77))).toBe('77\u00A0°F (25\u00A0°C): 66\u00A0% of the volume is liquid, 137\u00A0psig')
  })

  it('says the same in words', () => {
    const heat = heated('R-22', 16_000)
    expect(heatInWords(heat, layOutHeat(heat))).toMatch(/^R-22, as much as is in it: at 77.°F 66.% of the volume liquid, at 131.°F 73.% of the volume liquid, liquid-full above.158.°F\.$/)
  })

  it('draws a gas by its pressure, as far as its two tables go', () => {
    const heat = heated('R-744', 13_600)
    const { marks, fullFrom } = layOutHeat(heat)
    expect(heat.isGas).toBe(true)
    expect(fullFrom).toBeNull()
    expect(marks.map(mark => mark.temperature)).toEqual(['70\u00A0°F', '131\u00A0°F'])
    expect(marks[1]!.value).toMatch(/psig$/)
    expect(pointInWords(heat.points.at(-1)!)).toContain('all gas')
  })

  it('is not drawn of what the catalogue does not hold', () => {
    expect(heatOf({ refrigerant: 'R-0', netGrams: 1, ofLimit: false, waterCapacity: kg(20) }, CATALOGUE)).toBeNull()
  })
})

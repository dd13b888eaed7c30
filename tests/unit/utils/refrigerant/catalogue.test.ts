import { describe, expect, it } from 'vitest'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { buildCatalogue } from '~~/utils/refrigerant/catalogue'
import type { RefrigerantRecord } from '~~/utils/refrigerant/types'

const RECORD: RefrigerantRecord = {
  designation: 'R-0', kind: 'pure', safetyClass: 'A1', safetyClassStatus: 'read', safetyClassSource: 'made up for a test',
  molarMass: 100, composition: [{ component: 'R-0', massPercent: 100 }], compositionSource: null,
  tcK: 400, pcKPa: 4000, nbpC: -20, glideK: 0, accuracyGroup: 'A', source: 'made up for a test', accuracy: 'none',
  tableMaxC: 70, relativeErrorPressure: 0.01, relativeErrorDensity: 0.01,
  table: [[-40, 100, 100, 1300, 1], [70, 3000, 3000, 900, 50]],
}

describe('the catalogue', () => {
  it('holds 79 refrigerants and the pressures of five that are gases when warm', () => {
    expect(CATALOGUE.refrigerants.size).toBe(79)
    expect(CATALOGUE.supercritical.size).toBe(5)
  })

  it('names for each refrigerant its source, its accuracy and where its safety class was read', () => {
    for (const fluid of CATALOGUE.refrigerants.values()) {
      expect(fluid.source, fluid.designation).toMatch(/^CoolProp/)
      expect(fluid.accuracy, fluid.designation).not.toBe('')
      expect(fluid.safetyClassSource, fluid.designation).not.toBe('')
    }
  })

  it('holds tables that begin at -40 C, end where they say and never turn', () => {
    for (const { designation, table, tableMaxC } of CATALOGUE.refrigerants.values()) {
      expect(table[0]?.tC, designation).toBe(-40)
      expect(table.at(-1)?.tC, designation).toBe(tableMaxC)
      for (const [index, row] of table.slice(1).entries()) {
        const before = table[index]
        expect(row.tC, designation).toBeGreaterThan(before?.tC ?? Infinity)
        expect(row.bubblePressureKPa, designation).toBeGreaterThan(before?.bubblePressureKPa ?? Infinity)
        expect(row.dewPressureKPa, designation).toBeGreaterThan(before?.dewPressureKPa ?? Infinity)
        expect(row.liquidDensity, designation).toBeLessThan(before?.liquidDensity ?? -Infinity)
        expect(row.vapourDensity, designation).toBeGreaterThan(before?.vapourDensity ?? Infinity)
      }
    }
  })

  it('holds compositions that add up to the whole', () => {
    for (const { designation, composition } of CATALOGUE.refrigerants.values()) {
      const sum = composition.reduce((total, part) => total + part.massPercent, 0)
      expect(Math.abs(sum - 100), designation).toBeLessThan(0.11)
    }
  })

  it('refuses a designation that stands twice and a row with a column missing', () => {
    expect(() => buildCatalogue([RECORD, RECORD], [])).toThrow(RangeError)
    expect(() => buildCatalogue([{ ...RECORD, table: [[-40, 100, 100, 1300]] }], [])).toThrow(RangeError)
    expect(buildCatalogue([RECORD], []).refrigerants.get('R-0')?.table[1]?.liquidDensity).toBe(900)
  })
})

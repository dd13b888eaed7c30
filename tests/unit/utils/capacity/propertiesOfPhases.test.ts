import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { heatCurve } from '~~/utils/capacity/heat'
import { liquidFullTemperature } from '~~/utils/capacity/liquidFull'
import { twoPhase } from '~~/utils/capacity/twoPhase'
import { liquidDensityAt, saturationAt } from '~~/utils/refrigerant/saturation'
import type { Refrigerant } from '~~/utils/refrigerant/types'
import { ALL_REFRIGERANTS } from '~~/tests/helpers/capacityArbitraries'

// 10 L: 9.9904 kg of water at 60 F.
const VOLUME_LITRES = 10
const WATER_CAPACITY_GRAMS = 9990.4

const anyRefrigerant = fc.constantFrom(...ALL_REFRIGERANTS.map(({ designation }) => designation))
  .map(designation => ALL_REFRIGERANTS.find(one => one.designation === designation)!)

/** From far too thin to far too full: kg/m3, which is grams to the litre. */
const anyDensity = fc.double({ min: 0, max: 2000, noNaN: true })
const anyShare = fc.double({ min: 0, max: 1, noNaN: true })

/** A refrigerant by name, and a temperature within its table. */
const anyPlace = fc.record({ designation: anyRefrigerant.map(({ designation }) => designation), share: anyShare })
  .map(({ designation, share }) => {
    const { tableMaxC } = named(designation)
    return { designation, tC: Math.min(tableMaxC, -40 + share * (tableMaxC + 40)) }
  })

function named(designation: string): Refrigerant {
  return ALL_REFRIGERANTS.find(one => one.designation === designation)!
}

describe('the two-phase balance', () => {
  it('keeps the mass to a billionth', () => {
    fc.assert(fc.property(anyPlace, anyDensity, fc.double({ min: 0.1, max: 2000, noNaN: true }), ({ designation, tC }, density, volumeLitres) => {
      const netGrams = density * volumeLitres
      const { liquidGrams, vapourGrams, liquidShare, phase, pressureKPa } = twoPhase({ netGrams, volumeLitres, refrigerant: named(designation), tC })
      expect(Math.abs(liquidGrams + vapourGrams - netGrams)).toBeLessThanOrEqual(netGrams * 1e-9)
      expect(Math.min(liquidGrams, vapourGrams, liquidShare)).toBeGreaterThanOrEqual(0)
      expect(liquidShare).toBeLessThanOrEqual(1)
      expect(pressureKPa === null).toBe(phase !== 'two-phase')
    }), { numRuns: 3000 })
  })

  it('fills the volume with liquid and vapour of their own densities', () => {
    fc.assert(fc.property(anyPlace, anyDensity, ({ designation, tC }, density) => {
      const refrigerant = named(designation)
      const balance = twoPhase({ netGrams: density * VOLUME_LITRES, volumeLitres: VOLUME_LITRES, refrigerant, tC })
      if (balance.phase !== 'two-phase') return
      const { liquidDensity, vapourDensity, bubblePressureKPa } = saturationAt(refrigerant, tC)
      expect(balance.liquidGrams / liquidDensity + balance.vapourGrams / vapourDensity).toBeCloseTo(VOLUME_LITRES, 9)
      expect(balance.pressureKPa).toBe(bubblePressureKPa)
    }), { numRuns: 1000 })
  })

  it('agrees with trying every share of the volume, at every row of every table', () => {
    const STEPS = 2000
    for (const refrigerant of ALL_REFRIGERANTS) {
      for (const row of refrigerant.table.filter((_, index) => index % 3 === 0)) {
        for (const part of [0.03, 0.4, 0.81, 0.99]) {
          const density = row.vapourDensity + part * (row.liquidDensity - row.vapourDensity)
          let [best, least] = [Number.NaN, Infinity]
          for (let step = 0; step <= STEPS; step++) {
            const share = step / STEPS
            const off = Math.abs(share * row.liquidDensity + (1 - share) * row.vapourDensity - density)
            if (off < least) [best, least] = [share, off]
          }
          const { liquidShare, phase } = twoPhase({ netGrams: density * VOLUME_LITRES, volumeLitres: VOLUME_LITRES, refrigerant, tC: row.tC })
          expect(phase, `${refrigerant.designation} at ${row.tC} C`).toBe('two-phase')
          expect(Math.abs(liquidShare - best), `${refrigerant.designation} at ${row.tC} C`).toBeLessThanOrEqual(1 / STEPS)
        }
      }
    }
  })

  it('is all liquid from the density of a row on, all vapour up to that of its vapour', () => {
    for (const refrigerant of ALL_REFRIGERANTS) {
      for (const { tC, liquidDensity, vapourDensity } of refrigerant.table) {
        const phase = (density: number) => twoPhase({ netGrams: density * VOLUME_LITRES, volumeLitres: VOLUME_LITRES, refrigerant, tC }).phase
        expect([vapourDensity * 0.9999, vapourDensity * 1.0001, liquidDensity * 0.9999, liquidDensity * 1.0001].map(phase), `${refrigerant.designation} at ${tC} C`)
          .toEqual(['vapour', 'two-phase', 'two-phase', 'liquid-full'])
      }
    }
  })

  it('has no figure outside the table, nor for less than nothing', () => {
    fc.assert(fc.property(anyRefrigerant, (refrigerant) => {
      const at = (tC: number, netGrams = 5000, volumeLitres = VOLUME_LITRES) => () => twoPhase({ netGrams, volumeLitres, refrigerant, tC })
      expect(at(-40.001)).toThrow(RangeError)
      expect(at(refrigerant.tableMaxC + 0.001)).toThrow(RangeError)
      expect(at(Number.NaN)).toThrow(RangeError)
      expect(at(0, -1)).toThrow(RangeError)
      expect(at(0, Number.NaN)).toThrow(RangeError)
      expect(at(0, 5000, 0)).toThrow(RangeError)
    }), { numRuns: 79 })
  })
})

describe('the liquid-full temperature', () => {
  it('agrees with warming the cylinder by twentieths of a degree', () => {
    const STEP_C = 0.05
    fc.assert(fc.property(anyRefrigerant.map(({ designation }) => designation), anyShare, (designation, share) => {
      const refrigerant = named(designation)
      const [coldest, warmest] = [refrigerant.table[0]!, refrigerant.table.at(-1)!]
      const density = warmest.liquidDensity + share * (coldest.liquidDensity - warmest.liquidDensity)
      let tC = coldest.tC
      while (tC < warmest.tC && liquidDensityAt(refrigerant, Math.min(tC, warmest.tC)) > density) tC += STEP_C
      const full = liquidFullTemperature({ netGrams: density * VOLUME_LITRES, waterCapacityGrams: WATER_CAPACITY_GRAMS, refrigerant })
      const c = full && 'c' in full ? full.c : Number.NaN
      expect(c).toBeGreaterThanOrEqual(tC - STEP_C - 0.0011)
      expect(c).toBeLessThanOrEqual(tC + 1e-9)
    }), { numRuns: 300 })
  })

  it('is where the balance turns from two phases to one', () => {
    fc.assert(fc.property(anyRefrigerant.map(({ designation }) => designation), anyDensity, (designation, density) => {
      const refrigerant = named(designation)
      const netGrams = density * VOLUME_LITRES
      const full = liquidFullTemperature({ netGrams, waterCapacityGrams: WATER_CAPACITY_GRAMS, refrigerant })!
      const phase = (tC: number) => twoPhase({ netGrams, volumeLitres: WATER_CAPACITY_GRAMS / 1000 / 0.99904, refrigerant, tC }).phase
      const warmest = phase(refrigerant.tableMaxC)
      if ('never' in full) expect(warmest).toBe('vapour')
      else if ('aboveC' in full) expect([full.aboveC, warmest]).toEqual([refrigerant.tableMaxC, 'two-phase'])
      else {
        expect(warmest).toBe('liquid-full')
        if (full.c > -40) expect(phase(Math.max(-40, full.c - 0.002))).toBe('two-phase')
        expect(phase(Math.min(refrigerant.tableMaxC, full.c + 0.002))).toBe('liquid-full')
      }
    }), { numRuns: 1000 })
  })

  it('never rises with what is in it', () => {
    fc.assert(fc.property(anyRefrigerant.map(({ designation }) => designation), anyDensity, anyDensity, (designation, one, other) => {
      const refrigerant = named(designation)
      const temperature = (density: number) => {
        const full = liquidFullTemperature({ netGrams: density * VOLUME_LITRES, waterCapacityGrams: WATER_CAPACITY_GRAMS, refrigerant })!
        return 'never' in full ? Infinity : 'aboveC' in full ? 1000 : full.c
      }
      expect(temperature(Math.max(one, other))).toBeLessThanOrEqual(temperature(Math.min(one, other)))
    }), { numRuns: 1000 })
  })
})

describe('a cylinder as it warms', () => {
  it('shows at every temperature what the balance of its net gives', () => {
    fc.assert(fc.property(anyPlace, anyDensity, ({ designation, tC }, density) => {
      const refrigerant = named(designation)
      const netGrams = density * VOLUME_LITRES
      const [point] = heatCurve({ netGrams, waterCapacity: { unit: 'kg', value: WATER_CAPACITY_GRAMS / 1000 }, refrigerant, supercritical: null }, [tC])
      const { phase, liquidShare, pressureKPa } = twoPhase({ netGrams, volumeLitres: WATER_CAPACITY_GRAMS / 1000 / 0.99904, refrigerant, tC })
      expect(point).toEqual({ tC, phase, liquidShare, pressureKPa })
    }), { numRuns: 500 })
  })

  it('has a pressure that never falls while liquid and vapour share it', () => {
    fc.assert(fc.property(anyRefrigerant.map(({ designation }) => designation), anyShare, anyShare, anyDensity, (designation, one, other, density) => {
      const refrigerant = named(designation)
      const span = refrigerant.tableMaxC + 40
      const temperatures = [one, other].map(share => Math.min(refrigerant.tableMaxC, -40 + share * span)).sort((a, b) => a - b)
      const input = { netGrams: density * VOLUME_LITRES, waterCapacity: { unit: 'kg' as const, value: 9.9904 }, refrigerant, supercritical: null }
      const [cooler, warmer] = heatCurve(input, temperatures)
      if (cooler!.pressureKPa !== null && warmer!.pressureKPa !== null) expect(warmer!.pressureKPa).toBeGreaterThanOrEqual(cooler!.pressureKPa)
    }), { numRuns: 500 })
  })
})

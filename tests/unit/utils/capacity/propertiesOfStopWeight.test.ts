import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fillLimit } from '~~/utils/capacity/fillLimit'
import { stopWeight } from '~~/utils/capacity/stopWeight'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import type { MassReading, MassUnit } from '~~/utils/quantity/mass'
import {
  ceilToDivision, exactGrams, floorToDivision, formatMass, massText, nearestToDivision, parseMassText, readingGrams,
} from '~~/utils/quantity/mass'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { ALL_REFRIGERANTS, anyStamp, readingAtDivision } from '~~/tests/helpers/capacityArbitraries'
import { kg, registered, STAMP, viewAfter } from '~~/tests/helpers/custody'

const UNITS: MassUnit[] = ['lb', 'lb-oz', 'kg']

// International pound (1959); a tenth of it, a sixteenth, ten grams.
const DIVISION_GRAMS: Record<MassUnit, number> = { 'lb': 45.359237, 'lb-oz': 28.349523125, 'kg': 10 }

// What a shown stop weight may lie above the exact sum: the half gram by which whole grams may be off.
const NOISE_GRAMS = 0.5

const anyRefrigerant = fc.constantFrom(...ALL_REFRIGERANTS.map(({ designation }) => designation))

/** A mass as printed, in grams, read back by hand. */
function gramsOf(printed: string): number {
  const text = printed.replaceAll('\u00A0', ' ')
  const pair = /^(\d+) lb (\d+) oz$/.exec(text)
  if (pair) return (Number(pair[1]) * 16 + Number(pair[2])) * 28.349523125
  const [figure, symbol] = text.split(' ')
  return Number(figure) * { lb: 453.59237, oz: 28.349523125, kg: 1000 }[symbol!]!
}

describe('the stop weight', () => {
  it('is never rounded up, in any unit, and never down by more than a division', () => {
    fc.assert(fc.property(anyStamp, anyRefrigerant, (stamp, refrigerant) => {
      const { exactLimitGrams } = fillLimit({ stamp, refrigerant, condition: 'clean', burnt: false, policy: DEFAULT_FILL_POLICY, catalogue: CATALOGUE })
      if (exactLimitGrams === null) return
      const exact = exactGrams(stamp.tareWeight!) + exactLimitGrams
      const { stopWeightGrams, exactStopWeightGrams } = stopWeight(exactLimitGrams, exactGrams(stamp.tareWeight!))
      expect(stopWeightGrams).toBeLessThanOrEqual(exact)
      expect(stopWeightGrams).toBeGreaterThan(exact - 1)
      for (const unit of UNITS) {
        const shown = gramsOf(formatMass(exactStopWeightGrams, unit, 'down'))
        expect(shown, unit).toBeLessThanOrEqual(exact + NOISE_GRAMS)
        expect(shown + DIVISION_GRAMS[unit], unit).toBeGreaterThan(exact + NOISE_GRAMS - 1e-6)
        expect(exactGrams(floorToDivision(exactStopWeightGrams, unit)), unit).toBeCloseTo(shown, 6)
      }
    }), { numRuns: 1000 })
  })

  it('that is on a division of the scale is shown as that division: WC 24.0 lb and TW 15.0 lb make 34.2 lb', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 4000 }), fc.integer({ min: 0, max: 4000 }), (fifths, tareTenths) => {
      // 0.80 of a whole number of half pounds is a whole number of tenths of... 0.4 lb.
      const limit = exactGrams({ unit: 'lb', value: fifths / 2 }) * 800 / 1000
      const { exactStopWeightGrams } = stopWeight(limit, exactGrams({ unit: 'lb', value: tareTenths / 10 }))
      expect(floorToDivision(exactStopWeightGrams, 'lb')).toEqual({ unit: 'lb', value: (fifths * 4 + tareTenths) / 10 })
    }), { numRuns: 500 })
  })
})

/** What the cylinder page says of a cylinder of WC 20 kg and TW 12 kg, with room in grams. */
function capacityAt(grossGrams: number, refrigerant: string) {
  const told = registered({ stamp: { ...STAMP }, contents: { refrigerant, condition: 'clean' }, gross: kg(grossGrams / 1000) })
  return viewAfter([told]).capacity
}

describe('the room', () => {
  it('never grows with the gross weight, and the stop weight does not move', () => {
    fc.assert(fc.property(
      fc.constantFrom('R-22', 'R-410A', 'R-290', 'R-32', 'R-1234yf'), fc.integer({ min: 12_100, max: 32_000 }), fc.integer({ min: 0, max: 300 }),
      (refrigerant, gross, more) => {
        const lighter = capacityAt(gross, refrigerant)
        const heavier = capacityAt(gross + more, refrigerant)
        expect(lighter.roomGrams, 'known').not.toBeNull()
        expect(heavier.roomGrams!).toBeLessThanOrEqual(lighter.roomGrams!)
        expect(heavier.stopWeightGrams).toBe(lighter.stopWeightGrams)
      }), { numRuns: 200 })
  })

  it('falls gram by gram to nothing at the stop weight, and below nothing above it', () => {
    // 16,000 g into 12,000 g of tare.
    for (let gross = 27_990; gross <= 28_010; gross++) {
      // At half a gram of noise the last gram is nothing still.
      expect(capacityAt(gross, 'R-22').roomGrams).toBe(28_000 - gross)
    }
  })
})

describe('a reading at the division of its scale', () => {
  const anyReading = readingAtDivision(0, 3000)

  it('comes back from grams the same, rounded either way', () => {
    fc.assert(fc.property(anyReading, (reading) => {
      for (const grams of [readingGrams(reading), exactGrams(reading)]) {
        expect(nearestToDivision(grams, reading.unit)).toEqual(reading)
        expect(floorToDivision(grams, reading.unit)).toEqual(reading)
        expect(ceilToDivision(grams, reading.unit)).toEqual(reading)
      }
    }), { numRuns: 2000 })
  })

  it('comes back from its text the same', () => {
    fc.assert(fc.property(anyReading, (reading) => {
      expect(parseMassText(massText(reading))).toEqual(reading)
    }), { numRuns: 1000 })
  })

  it('is shown as it was read', () => {
    fc.assert(fc.property(anyReading, (reading) => {
      for (const rounding of ['down', 'nearest', 'up'] as const) {
        expect(gramsOf(formatMass(readingGrams(reading), reading.unit, rounding))).toBeCloseTo(exactGrams(reading), 6)
      }
    }), { numRuns: 1000 })
  })

  it('survives a way through the two other units to its own division', () => {
    fc.assert(fc.property(anyReading, fc.constantFrom(...UNITS), (reading, unit) => {
      const other: MassReading = nearestToDivision(exactGrams(reading), unit)
      const off = Math.abs(exactGrams(other) - exactGrams(reading))
      expect(off).toBeLessThanOrEqual(DIVISION_GRAMS[unit] / 2 + 1e-9)
      // A division coarser than its own cannot give it back; a finer one must, within one.
      const back = nearestToDivision(exactGrams(other), reading.unit)
      expect(Math.abs(exactGrams(back) - exactGrams(reading))).toBeLessThanOrEqual(Math.max(DIVISION_GRAMS[unit], DIVISION_GRAMS[reading.unit]))
      if (DIVISION_GRAMS[unit] < DIVISION_GRAMS[reading.unit]) expect(back).toEqual(reading)
    }), { numRuns: 2000 })
  })
})

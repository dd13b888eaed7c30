import fc from 'fast-check'
import type { Condition, FillPolicy, Stamp } from '~~/utils/capacity/types'
import type { MassReading } from '~~/utils/quantity/mass'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import type { Refrigerant } from '~~/utils/refrigerant/types'
import { stampOf } from './stamps'

/** A mass as a scale or a stamp shows it, at its division: a tenth of a pound, an ounce, ten grams. */
export function readingAtDivision(fromPounds: number, toPounds: number): fc.Arbitrary<MassReading> {
  return fc.oneof(
    fc.integer({ min: Math.ceil(fromPounds * 10), max: toPounds * 10 }).map((tenths): MassReading => ({ unit: 'lb', value: tenths / 10 })),
    fc.integer({ min: Math.ceil(fromPounds * 16), max: toPounds * 16 })
      .map((ounces): MassReading => ({ unit: 'lb-oz', lb: Math.floor(ounces / 16), oz: ounces % 16 })),
    fc.integer({ min: Math.ceil(fromPounds * 46), max: toPounds * 45 }).map((hundredths): MassReading => ({ unit: 'kg', value: hundredths / 100 })),
  )
}

/** From a bottle for samples to a ton tank. */
export const anyWaterCapacity = readingAtDivision(1, 1600)
/** A stamp never says that its steel weighs nothing. */
const anyTareWeight = readingAtDivision(1, 1500)

export const anyCondition: fc.Arbitrary<Condition> = fc.constantFrom('clean', 'suspect', 'burnt', 'mixed', 'unknown')

/** Any stamp with all that a limit needs, suitable or not. */
export const anyStamp: fc.Arbitrary<Stamp> = fc.record({
  waterCapacity: anyWaterCapacity,
  tareWeight: anyTareWeight,
  spec: fc.constantFrom('DOT-4BA', 'DOT-4BW', 'DOT-4B', 'DOT-3AA', 'DOT-3AL', 'DOT-4E', 'DOT-39', 'DOT-SP'),
  servicePressurePsig: fc.constantFrom(150, 225, 240, 260, 300, 350, 400, 500, 1000, 1800, 2015, 2400),
  flammableMarked: fc.boolean(),
}).map(stampOf)

/** A stamp of which things could not be read. */
export const anyPartialStamp: fc.Arbitrary<Stamp> = fc.record({
  stamp: anyStamp, hasTare: fc.boolean(), hasCapacity: fc.boolean(), hasPressure: fc.boolean(), tareIncludesValve: fc.boolean(),
}).map(({ stamp, hasTare, hasCapacity, hasPressure, tareIncludesValve }) => ({
  ...stamp,
  tareWeight: hasTare ? stamp.tareWeight : null,
  waterCapacity: hasCapacity ? stamp.waterCapacity : null,
  servicePressurePsig: hasPressure ? stamp.servicePressurePsig : null,
  tareIncludesValve,
}))

const anyThousandths = fc.oneof(fc.integer({ min: 1, max: 1000 }), fc.integer({ min: 790, max: 1000 }), fc.constant(1000))

/** Any rule that a firm may set, and figures above what it may, which must not count; often near the highest. */
export const anyPolicy: fc.Arbitrary<FillPolicy> = fc.record({
  shareThousandths: anyThousandths,
  ceilingThousandths: anyThousandths,
  options: fc.record({ liquid130F: fc.boolean(), unRatio: fc.boolean() }),
})

export const ALL_REFRIGERANTS: readonly Refrigerant[] = [...CATALOGUE.refrigerants.values()]

/** Those with a row at 131 F (55 C) in their table: their liquid can fill a hot cylinder. */
export const LIQUID_WHEN_HOT: readonly Refrigerant[] = ALL_REFRIGERANTS.filter(({ table }) => table.some(({ tC }) => tC === 55))

/** Those that are gases then. */
export const GAS_WHEN_HOT: readonly Refrigerant[] = ALL_REFRIGERANTS.filter(refrigerant => !LIQUID_WHEN_HOT.includes(refrigerant))

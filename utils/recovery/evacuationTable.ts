import { MMHG_PER_INHG, mmHgFromPsi } from '../quantity/vacuum'
import type { PressureClass } from '../refrigerant/pressureClass'
import type { ChargeBand, EvacuationLevel, MachineMade } from './types'

/** The air that the table's vacuums count from. Units: inHg. Source: 40 CFR 82.156 Table 1. */
export const STANDARD_ATMOSPHERE_INHG = 29.9

/** A charge that the table takes as large: 200 lb, as whole grams read it. Source: 40 CFR 82.156 Table 1. */
export const LARGE_CHARGE_GRAMS = 90_718

/** The most that a small appliance may hold: 5 lb, as whole grams read it. Source: 40 CFR 82.152. */
export const SMALL_CHARGE_GRAMS = 2_268

/** Four inches of vacuum do for a small appliance too. Source: 40 CFR 82.156(b)(3). */
export const SMALL_APPLIANCE_VACUUM: EvacuationLevel = { unit: 'inHg-vacuum', value: 4 }

/** Of a vehicle's air conditioner that is disposed of. Source: 40 CFR 82.156(c), (d). */
export const MVAC_VACUUM: EvacuationLevel = { unit: 'mmHg-vacuum', value: 102 }

/** One cell of the table, with what it is the cell of. */
export interface TableCell {
  pressureClass: PressureClass
  charge: ChargeBand
  machineMade: MachineMade
  level: EvacuationLevel
}

type Row = readonly [pressureClass: PressureClass, charges: readonly ChargeBand[], before: EvacuationLevel, since: EvacuationLevel]

const ANY_CHARGE = ['under-200-lb', 'from-200-lb'] as const

const ROWS: readonly Row[] = [
  ['very-high', ANY_CHARGE, vacuum(0), vacuum(0)],
  ['high', ['under-200-lb'], vacuum(0), vacuum(0)],
  ['high', ['from-200-lb'], vacuum(4), vacuum(10)],
  ['medium', ['under-200-lb'], vacuum(4), vacuum(10)],
  ['medium', ['from-200-lb'], vacuum(4), vacuum(15)],
  ['low', ANY_CHARGE, absolute(25), absolute(25)],
]

/** Every cell of the required levels of evacuation. Source: 40 CFR 82.156 Table 1. */
export const TABLE_CELLS: readonly TableCell[] = ROWS.flatMap(([pressureClass, charges, before, since]) => charges.flatMap(charge => [
  { pressureClass, charge, machineMade: 'since-1993-11-15' as const, level: since },
  { pressureClass, charge, machineMade: 'before-1993-11-15' as const, level: before },
]))

/**
 * The most that may be left in mmHg absolute, by the table's own atmosphere; null for a share of the charge, which no
 * gauge can tell.
 */
export function mostLeftMmHg({ unit, value }: EvacuationLevel): number | null {
  switch (unit) {
    case 'inHg-vacuum': return (STANDARD_ATMOSPHERE_INHG - value) * MMHG_PER_INHG
    case 'mmHg-vacuum': return STANDARD_ATMOSPHERE_INHG * MMHG_PER_INHG - value
    case 'mmHg-absolute': return value
    case 'psig': return STANDARD_ATMOSPHERE_INHG * MMHG_PER_INHG + mmHgFromPsi(value)
    case 'percent-of-charge': return null
  }
}

function vacuum(inHg: number): EvacuationLevel {
  return { unit: 'inHg-vacuum', value: inHg }
}

function absolute(mmHg: number): EvacuationLevel {
  return { unit: 'mmHg-absolute', value: mmHg }
}

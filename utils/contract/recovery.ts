import { z } from 'zod'
import { APPLIANCES, CIRCUMSTANCES, MACHINE_MADE, type LevelVerdict, type RequiredLevel } from '../recovery/types'
import { readingGrams } from '../quantity/mass'
import { isMachineDate, machineMadeBy } from '../recovery/machineMade'
import { BAROMETER_RANGE, MOST_READ } from '../recovery/reachedDraft'
import type { OnGauges } from '../recovery/words'
import { massInQuery } from './parts'

/** More is no charge of one appliance. */
const MOST_CHARGE = 'must be at most 100,000 lb'
const MOST_CHARGE_GRAMS = 45_359_237

const chargeInQuery = massInQuery.refine(reading => readingGrams(reading) <= MOST_CHARGE_GRAMS, MOST_CHARGE)

const machineMade = z.union([
  z.enum(MACHINE_MADE),
  z.string().refine(isMachineDate).transform(machineMadeBy),
], `must be ${MACHINE_MADE.join(', ')} or a date such as 2004, 1993-11 or 1993-11-15`)

function reading(most: number, unit: string) {
  return z.string().regex(/^\d{1,7}(\.\d{1,6})?$/, `must be a number of ${unit}, without a sign`).transform(Number)
    .pipe(z.number().max(most, `must be at most ${most} ${unit}`))
}

/**
 * GET /api/evacuation-level: the level that 40 CFR 82.156 asks for, and whether it was reached.
 *
 * What is left out is not known, and then taken as what asks for more; `assumed` says so. What was reached is one of
 * `inHg` (with `barometerInHg`), `microns`, `mmHgAbsolute` and, of a small appliance, `recovered`. 422 for a refrigerant
 * that the catalogue does not have, for two gauges at once, and for what was recovered without a charge.
 */
export const evacuationLevelQuery = z.strictObject({
  refrigerant: z.string().min(1).max(40).optional(),
  charge: chargeInQuery.optional(),
  machineMade: machineMade.optional(),
  appliance: z.enum(APPLIANCES).default('other'),
  circumstances: z.enum(CIRCUMSTANCES).optional(),
  compressorRuns: z.enum(['true', 'false']).optional(),
  inHg: reading(MOST_READ.inHg, 'inHg').optional(),
  barometerInHg: reading(BAROMETER_RANGE.most, 'inHg').pipe(z.number().min(BAROMETER_RANGE.least, `must be at least ${BAROMETER_RANGE.least} inHg`)).optional(),
  microns: reading(MOST_READ.microns, 'microns').optional(),
  mmHgAbsolute: reading(MOST_READ.mmHgAbsolute, 'mmHg').optional(),
  recovered: chargeInQuery.optional(),
  heldMinutes: reading(MOST_READ.heldMinutes, 'minutes').optional(),
})
export type EvacuationLevelQuery = z.output<typeof evacuationLevelQuery>

/** What GET /api/evacuation-level answers. */
export interface EvacuationLevelAnswer extends RequiredLevel {
  refrigerant: string | null
  /** The level on each gauge, at the barometer that was given or 29.9 inHg; null where no gauge tells it. */
  onGauges: OnGauges | null
  /** Null where nothing was said of what was reached. */
  judged: LevelVerdict | null
}

import { fillLimit } from '../capacity/fillLimit'
import type { FillPolicy } from '../capacity/types'
import type { Planned } from '../custody/plan'
import type { Catalogue } from '../refrigerant/types'
import type { Lot } from './lot'

/** What a limit rests on beside the cylinder. */
export interface LimitContext { policy: FillPolicy, catalogue: Catalogue }

/**
 * The fill limit of a cylinder once contents of a lot are in it: burnt refrigerant has a lower one than the same cylinder
 * has with nothing in it. Null where no rule gives one.
 *
 * Rounding: down.
 */
export function limitGramsFor({ stamp }: Planned, { refrigerant, condition, burnt }: Lot, { policy, catalogue }: LimitContext): number | null {
  return stamp === null ? null : fillLimit({ stamp, refrigerant, condition, burnt, policy, catalogue, tareGrams: stamp.tareWeightGrams }).fillLimitGrams
}

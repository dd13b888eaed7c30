import type { VacuumReading } from '../quantity/vacuum'
import type { PressureClass } from '../refrigerant/pressureClass'
import type { Refrigerant } from '../refrigerant/types'

export const APPLIANCES = ['small', 'mvac', 'other'] as const
/** What is opened: a small appliance, the air conditioner of a vehicle (or one like it), or any other. */
export type Appliance = typeof APPLIANCES[number]

export const CIRCUMSTANCES = ['major', 'minor-repair', 'oil-change', 'leaking'] as const
/** Why it is opened. `major` is also a disposal, and any repair after which it is evacuated to the air. */
export type Circumstances = typeof CIRCUMSTANCES[number]

export const MACHINE_MADE = ['before-1993-11-15', 'since-1993-11-15'] as const
/** On which side of 15 November 1993 the recovery machine was made or imported; that day itself is `since`. */
export type MachineMade = typeof MACHINE_MADE[number]

/** Which side of 200 lb an appliance's full charge is on; 200 lb itself is `from-200-lb`. */
export type ChargeBand = 'under-200-lb' | 'from-200-lb'

/**
 * A level to reach: inHg or mmHg of vacuum below 29.9 inHg, mmHg absolute, psig not to be exceeded, or percent of the
 * charge to recover.
 */
export interface EvacuationLevel { unit: 'inHg-vacuum' | 'mmHg-vacuum' | 'mmHg-absolute' | 'psig' | 'percent-of-charge', value: number }

export interface EvacuationInput {
  /** Null where nobody knows it. */
  refrigerant: Refrigerant | null
  /** The full charge of the appliance, or of the part of it that is isolated. */
  chargeGrams: number | null
  machineMade: MachineMade | null
  appliance: Appliance
  circumstances: Circumstances | null
  /** Whether the compressor of a small appliance runs. */
  compressorRuns: boolean | null
}

/** One line of how the level was found. */
export interface AccountLine {
  term: string
  value: string
  /** Where the value is from, or what follows from it. */
  note: string | null
  isAssumed: boolean
}

/** Something of the regulation that goes with the level, with its paragraph. */
export interface LevelNote { text: string, source: string }

/** What 40 CFR 82.156 asks for before an appliance is opened or disposed of. */
export interface RequiredLevel {
  level: EvacuationLevel
  /** Another level that does as well. */
  alternative: EvacuationLevel | null
  /** For the leaking parts of a leaking appliance; as low as can be reached besides. */
  leakingParts: EvacuationLevel | null
  pressureClass: PressureClass | null
  account: AccountLine[]
  /** What was not known and taken as what asks for more. */
  assumed: string[]
  exceptions: LevelNote[]
  source: string
}

/** What was reached: by a gauge, or by the weight of what came out, in grams not rounded, so that 1.8 of 2.0 lb is 90 %. */
export type Reached = VacuumReading | { recoveredGrams: number, chargeGrams: number }

/** Whether a level was reached, and by how much not. */
export interface LevelVerdict {
  verdict: 'reached' | 'not-reached' | 'unknown'
  because: string
  /** What is missing, in the unit of the level: inHg, mmHg, psi or percent of the charge. */
  shortBy: number | null
  /** What the gauge came to. */
  absoluteMmHg: number | null
  heldMinutes: number | null
}

import type { MassReading } from '../quantity/mass'
import type { Month } from '../quantity/month'

/** A rule that sets the most refrigerant a cylinder may hold. */
export type FillRule
  = | 'water-weight'
    | 'liquid-77F'
    | 'filling-density'
    | 'hot-ceiling'
    | 'liquid-130F'
    | 'un-ratio'
    | 'oily'
    | 'hot-pressure'

/** What is known of the refrigerant in a cylinder beside its name. */
export type Condition = 'clean' | 'suspect' | 'burnt' | 'mixed' | 'unknown'

/** What is stamped on the collar of a cylinder, as entered. */
export type Stamp = {
  serial: string | null
  serialUnreadable?: boolean
  maker?: string
  /** Specification without its pressure, 'DOT-4BA'. */
  spec: string
  servicePressurePsig: number | null
  tareWeight: MassReading | null
  tareIncludesValve?: boolean
  waterCapacity: MassReading | null
  madeMonth: Month | null
  flammableMarked: boolean
  floatSwitch?: boolean
  valve?: string
}

/** The firm's fill rule: its share and its ceiling in thousandths, and which further rules are in force. */
export type FillPolicy = {
  shareThousandths: number
  ceilingThousandths: number
  options: { liquid130F: boolean, unRatio: boolean }
}

/** The rule in force until the firm sets a stricter one; neither figure may be raised. */
export const DEFAULT_FILL_POLICY: FillPolicy = {
  shareThousandths: 800,
  ceilingThousandths: 950,
  options: { liquid130F: false, unRatio: false },
}

/**
 * How a rule stands for this cylinder and refrigerant: it counts, it is shown beside the others, its figure lies above
 * the ceiling, or its figure would leave the cylinder liquid-full at 131 F and is not shown.
 */
export type TermStanding = 'in-force' | 'compared' | 'above-margin' | 'unsafe'

/** One term of a rule's sum. Units: as said; a temperature in C where the term holds at one. Unrounded. */
export type Factor = {
  name: 'share' | 'water-capacity' | 'volume' | 'liquid-density' | 'filling-density' | 'filling-ratio' | 'density-at-pressure' | 'derate'
  value: number
  unit: 'lb' | 'kg' | 'L' | 'kg/L' | '%' | ''
  atC?: number
  /** What more there is to say of it: 'as stamped', 'WC \u00F7 0.99904 kg/L'. */
  note?: string
  source?: string
  /** How far the value may be off, as a fraction of one; left out where it is exact. */
  relativeError?: number
  /** What makes it less sure than that. */
  doubt?: string
}

/** One rule's figure and what it is the product of. Units: net grams. Rounding: down. */
export type FillTerm = {
  rule: FillRule
  limitGrams: number | null
  because?: string
  standing: TermStanding
  /** What is multiplied, in order; empty where there is no sum. */
  factors: Factor[]
  source: string
}

/** A rule's figure with its sum as the trade writes it. */
export type FillTermInWords = FillTerm & { working: string }

/** What keeps a figure from being given. */
export type MissingInput = 'tareWeight' | 'waterCapacity' | 'servicePressure' | 'refrigerant' | 'weight' | 'testDate'

/** The most net weight a cylinder may hold, by the lowest of the rules in force. */
export type FillLimit = {
  governingRule: FillRule | null
  exactLimitGrams: number | null
  fillLimitGrams: number | null
  terms: FillTerm[]
  missing: MissingInput[]
}

/** Why a cylinder does not suit a refrigerant. */
export type FitFinding = {
  code: 'pressure-class' | 'spec-not-for-gas' | 'not-refillable' | 'not-marked-flammable' | 'toxic'
  severity: 'stop' | 'caution'
  text: string
  source: string
}

/** One row of the table of filling densities that names a gas. */
export type FillingDensityRow = {
  designation: string
  gas: string
  /** Percent of the weight of water; null where the row asks only that the liquid does not fill the cylinder at 131 F. */
  percent: number | null
  /** Least marks: the same type with a higher service pressure also serves. */
  specs: readonly string[]
}

/** Filling density of a band of specific gravity at 60 F. Units: the gravity in thousandths, percent of the weight of water. */
export type HydrocarbonBand = { fromThousandths: number, toThousandths: number, percent: number }

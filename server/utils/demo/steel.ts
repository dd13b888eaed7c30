import { DEFAULT_FILL_POLICY, type Stamp } from '../../../utils/capacity/types'
import { fillLimit } from '../../../utils/capacity/fillLimit'
import { readingGrams, type MassReading, type MassUnit } from '../../../utils/quantity/mass'
import { CATALOGUE } from '../../../utils/refrigerant/allRefrigerants'
import { drawLabelCode } from '../../../utils/label/code'
import { monthFrom } from './calendar'
import type { Random } from './random'

const GRAMS_PER_POUND = 453.59237

/** A cylinder of the demo with what is truly in it, which the log only learns of by events. */
export interface Steel {
  id: string
  code: string
  stamp: Stamp
  tareGrams: number
  refrigerant: string | null
  netGrams: number
  /** Month of the last test, as stamped. */
  testedMonth: string
}

/** Sizes by what their collars say; TW varies by some tenths from cylinder to cylinder. */
const SIZES = {
  small: { spec: 'DOT-4BA', psig: 400, wcLb: 26.2, twLb: 17.4 },
  middle: { spec: 'DOT-4BA', psig: 400, wcLb: 47.7, twLb: 27.9 },
  low: { spec: 'DOT-4BA', psig: 260, wcLb: 47.6, twLb: 27.2 },
  large: { spec: 'DOT-4BW', psig: 400, wcLb: 123, twLb: 58.4 },
} as const

/** The name of a size. */
export type SteelSize = keyof typeof SIZES

/** A cylinder with its stamp; its test falls due within the coming five years of its month, as the fleet's do. */
export function newSteel(random: Random, at: number, size: SteelSize, more: Partial<Stamp> & { testedMonthsAgo?: number } = {}): Steel {
  const { testedMonthsAgo, ...stamp } = more
  const { spec, psig, wcLb, twLb } = SIZES[size]
  const testedMonth = monthFrom(at, -(testedMonthsAgo ?? random.whole(1, 50)))
  const tare: MassReading = { unit: 'lb', value: Math.round((twLb + random.between(-0.5, 0.5)) * 10) / 10 }
  const whole: Stamp = {
    serial: `${random.pick(['K', 'H', 'T'])}${random.whole(20000, 98999)}`,
    maker: random.pick(['QZT', 'VHX']),
    spec,
    servicePressurePsig: psig,
    tareWeight: tare,
    waterCapacity: { unit: 'lb', value: wcLb },
    madeMonth: testedMonth,
    flammableMarked: false,
    ...stamp,
  }
  return {
    id: random.uuid(at),
    code: drawLabelCode(random.bytes),
    stamp: whole,
    tareGrams: whole.tareWeight ? readingGrams(whole.tareWeight) : 0,
    refrigerant: null,
    netGrams: 0,
    testedMonth,
  }
}

/** The most this cylinder may hold of a refrigerant, by the default rule; 0 where there is no figure. */
export function limitOf(steel: Steel, refrigerant: string): number {
  return fillLimit({
    stamp: steel.stamp, refrigerant, condition: 'clean', burnt: false, policy: DEFAULT_FILL_POLICY, catalogue: CATALOGUE,
  }).fillLimitGrams ?? 0
}

/** What a scale of that unit shows with the cylinder on it; the truth then follows the reading. */
export function weigh(steel: Steel, unit: MassUnit): MassReading {
  const reading = shown(steel.tareGrams + steel.netGrams, unit)
  steel.netGrams = Math.max(0, readingGrams(reading) - steel.tareGrams)
  return reading
}

/** Grams as a scale shows them: 0.1 lb, half an ounce, 0.01 kg. */
export function shown(grams: number, unit: MassUnit): MassReading {
  if (unit === 'kg') return { unit, value: Math.round(grams / 10) / 100 }
  if (unit === 'lb') return { unit, value: Math.round(grams / GRAMS_PER_POUND * 10) / 10 }
  const halves = Math.round(grams / GRAMS_PER_POUND * 32)
  return { unit, lb: Math.floor(halves / 32), oz: (halves % 32) / 2 }
}

/** Pounds in whole grams. */
export function pounds(value: number): number {
  return Math.round(value * GRAMS_PER_POUND)
}

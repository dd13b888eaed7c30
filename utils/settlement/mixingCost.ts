import type { MassReading } from '../quantity/mass'
import type { Rate } from '../reclaim/price'
import { creditOfReading } from './creditOfReading'

/** Mixed contents that a reclaimer took over, and what is known of them. */
export interface MixedLine {
  cylinderId: string
  shipmentId: string
  acceptedNet: MassReading | null
  /** What was paid or charged for them. */
  rate: Rate | null
  /** What is known to have gone in since the last deep vacuum, each with the reclaimer's price for it clean; null where it had none. */
  wentIn: readonly { refrigerant: string, cleanRate: Rate | null }[]
}

/** What mixing cost on one line; null for what cannot be known. */
export interface LineMixingCost {
  cylinderId: string
  shipmentId: string
  acceptedNet: MassReading | null
  creditedCents: number | null
  /** The refrigerant among those that went in which is worth most clean, and what the same mass of it would have been credited. */
  best: { refrigerant: string, cents: number } | null
  costCents: number | null
}

/** What mixing cost over some lines. */
export interface MixingCost {
  lines: LineMixingCost[]
  /** Of the lines whose cost is known. */
  costCents: number
  unknownLines: number
}

/**
 * What mixing cost: for each line the credit that the same mass would have had clean, as the best of the refrigerants
 * known to be in it, less what was credited; a charge adds to it. What is not known stays out of the sum and is counted.
 */
export function mixingCost(lines: readonly MixedLine[]): MixingCost {
  const each = lines.map(ofLine)
  return {
    lines: each,
    costCents: each.reduce((sum, line) => sum + (line.costCents ?? 0), 0),
    unknownLines: each.filter(line => line.costCents === null).length,
  }
}

function ofLine({ cylinderId, shipmentId, acceptedNet, rate, wentIn }: MixedLine): LineMixingCost {
  const creditedCents = acceptedNet && rate ? creditOfReading(rate, acceptedNet) : null
  const best = acceptedNet === null ? null : bestOf(acceptedNet, wentIn)
  return { cylinderId, shipmentId, acceptedNet, creditedCents, best, costCents: best === null || creditedCents === null ? null : best.cents - creditedCents }
}

function bestOf(acceptedNet: MassReading, wentIn: MixedLine['wentIn']): LineMixingCost['best'] {
  return wentIn.reduce<LineMixingCost['best']>((best, { refrigerant, cleanRate }) => {
    if (cleanRate === null) return best
    const cents = creditOfReading(cleanRate, acceptedNet)
    return best === null || cents > best.cents ? { refrigerant, cents } : best
  }, null)
}

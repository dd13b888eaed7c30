/** Fifteen pounds, as whole grams read them. Source: 40 CFR 82.156(e). */
const SYSTEM_DEPENDENT_LIMIT_GRAMS = 6_804

/** What speaks against recovering with the appliance's own compressor. */
export interface SystemDependentCaution { text: string, source: string }

/**
 * Whether the appliance's own compressor may be too little a machine for its charge; null where it may be used.
 *
 * A charge that is not known answers nothing here: what came out proves it later.
 * Source: 40 CFR 82.156(e).
 */
export function systemDependentLimit({ chargeGrams, isFixedPumpOut }: { chargeGrams: number | null, isFixedPumpOut: boolean }): SystemDependentCaution | null {
  if (isFixedPumpOut || chargeGrams === null || chargeGrams <= SYSTEM_DEPENDENT_LIMIT_GRAMS) return null
  return {
    text: 'Above 15 lb (6.80 kg) of charge only a recovery machine may do it, or a pump-out unit fixed to the system.',
    source: '40 CFR 82.156(e)',
  }
}

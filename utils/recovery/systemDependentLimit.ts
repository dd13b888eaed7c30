/** Fifteen pounds, as whole grams read them. Source: 40 CFR 82.156(e). */
export const SYSTEM_DEPENDENT_LIMIT_GRAMS = 6_804

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
    text: 'More than 15 lb (6.80 kg): the system’s own compressor may not do this recovery, unless it is a pump-out unit fixed to the system. Use a recovery machine.',
    source: '40 CFR 82.156(e)',
  }
}

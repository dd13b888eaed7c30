/** One standard atmosphere in kPa, the barometer that gauge readings are taken against unless another is given (ISO 2533). */
export const STANDARD_ATMOSPHERE_KPA = 101.325

// 1 psi = 1 lbf/in2 = 4.4482216152605 N / 645.16 mm2.
const KPA_PER_PSI = 6.894757293168361

/** Absolute pressure in kPa from a gauge reading in psig at standard barometer. */
export function kPaFromPsig(psig: number): number {
  return psig * KPA_PER_PSI + STANDARD_ATMOSPHERE_KPA
}

/** Gauge reading in psig at standard barometer from absolute pressure in kPa. */
export function psigFromKPa(kPa: number): number {
  return (kPa - STANDARD_ATMOSPHERE_KPA) / KPA_PER_PSI
}

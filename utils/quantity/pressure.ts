/** One standard atmosphere in kPa, the barometer that gauge readings are taken against unless another is given (ISO 2533). */
export const STANDARD_ATMOSPHERE_KPA = 101.325

/** One pound to the square inch: 4.4482216152605 N / 645.16 mm2. */
export const KPA_PER_PSI = 6.894757293168361

// The conventional inch of mercury: NIST Special Publication 811 (2008), appendix B.8, from memory.
const KPA_PER_INHG = 3.386389

/** Absolute pressure in kPa from a gauge reading in psig at standard barometer. */
export function kPaFromPsig(psig: number): number {
  return psig * KPA_PER_PSI + STANDARD_ATMOSPHERE_KPA
}

/** Gauge reading in psig at standard barometer from absolute pressure in kPa. */
export function psigFromKPa(kPa: number): number {
  return (kPa - STANDARD_ATMOSPHERE_KPA) / KPA_PER_PSI
}

/** A pressure in kPa from a height of mercury in inches, as a barometer shows it. */
export function kPaFromInHg(inHg: number): number {
  return inHg * KPA_PER_INHG
}

/** The height of mercury in inches from a pressure in kPa. */
export function inHgFromKPa(kPa: number): number {
  return kPa / KPA_PER_INHG
}

/** Absolute pressure in kPa from one in pounds to the square inch absolute. */
export function kPaFromPsia(psia: number): number {
  return psia * KPA_PER_PSI
}

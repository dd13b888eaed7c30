import { SPECS } from './specs'

/**
 * How long a test of a cylinder holds, by its specification and the owner's setting; null where it is not known or never tested.
 *
 * Units: months. Without a setting the shortest period counts, because recovered refrigerant is not proved free of
 * corroding components (49 CFR 180.209(e), (g)). A setting above what the regulation allows is cut to it.
 */
export function intervalMonths(spec: string, ownerSetting?: number | null): number | null {
  const period = SPECS[spec]
  if (!period?.requalified) return null
  if (ownerSetting === null || ownerSetting === undefined || !(ownerSetting > 0)) return period.months
  return period.longestMonths === null ? ownerSetting : Math.min(ownerSetting, period.longestMonths)
}

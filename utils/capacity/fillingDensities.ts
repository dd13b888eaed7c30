import type { SpecMark } from '../requalification/specs'
import { impliedServicePressurePsig, splitSpec } from '../requalification/specs'
import { FILLING_DENSITY_ROWS, HYDROCARBON_BANDS, HYDROCARBONS, LIQUEFIED_GAS_SPECS } from './data/fillingDensityRows'
import type { FillingDensityRow } from './types'

/** How a cylinder stands to a row: its marks suffice, its service pressure is below the row's or unknown, or the row does not name its type. */
export type RowFit = 'met' | 'mark-below' | 'spec-not-listed'

/** What of a stamp decides about filling densities. */
export type CylinderMark = { spec: string, servicePressurePsig: number | null }

const NO_ROWS: readonly FillingDensityRow[] = []
const ROWS_BY_GAS: ReadonlyMap<string, readonly FillingDensityRow[]> = new Map(
  FILLING_DENSITY_ROWS.map(({ designation }) => [designation, FILLING_DENSITY_ROWS.filter(row => row.designation === designation)]),
)

/** The rows that name a gas; none where only the general rule holds. Source: 49 CFR 173.304a(a)(2). */
export function fillingDensityRows(designation: string): readonly FillingDensityRow[] {
  return ROWS_BY_GAS.get(designation) ?? NO_ROWS
}

/** How a cylinder's marks stand to a row. */
export function rowFit(row: FillingDensityRow, cylinder: CylinderMark): RowFit {
  const listed = listedMark(row, cylinder.spec)
  if (!listed) return 'spec-not-listed'
  // A mark without a figure of its own ("39") asks for none.
  if (listed.servicePressurePsig === null) return 'met'
  const marked = markedPressurePsig(cylinder)
  return marked !== null && marked >= listed.servicePressurePsig ? 'met' : 'mark-below'
}

function listedMark(row: FillingDensityRow, spec: string): SpecMark | null {
  for (const text of row.specs) {
    const mark = `DOT-${text}`.startsWith(spec) ? splitSpec(text) : null
    if (mark?.spec === spec) return mark
  }
  return null
}

/** The row of a gas with the highest filling density among those that a cylinder's marks meet, or null. */
export function bestRow(designation: string, cylinder: CylinderMark): FillingDensityRow | null {
  let best: FillingDensityRow | null = null
  for (const row of fillingDensityRows(designation)) {
    if (rowFit(row, cylinder) === 'met' && (best === null || (row.percent ?? 0) > (best.percent ?? 0))) best = row
  }
  return best
}

/** The service pressure of a cylinder: as marked, but never above the one that its specification fixes; null where neither is known. */
export function markedPressurePsig(cylinder: CylinderMark): number | null {
  const implied = impliedServicePressurePsig(cylinder.spec)
  if (cylinder.servicePressurePsig === null || implied === null) return cylinder.servicePressurePsig ?? implied
  return Math.min(cylinder.servicePressurePsig, implied)
}

/** Whether a specification is authorised for liquefied gases that no row names. Source: 49 CFR 173.304a(a)(1). */
export function isLiquefiedGasSpec(spec: string): boolean {
  return LIQUEFIED_GAS_SPECS.includes(spec)
}

/** Whether a refrigerant is filled by its specific gravity. Source: 49 CFR 173.304a(d)(1). */
export function isHydrocarbon(designation: string): boolean {
  return HYDROCARBONS.includes(designation)
}

/**
 * The filling density of a hydrocarbon in percent of the weight of water, or null outside the table.
 *
 * Units: specific gravity of the liquid at 60 F.
 * Rounding: the specific gravity to three decimals; between two bands the lower one holds.
 * Source: 49 CFR 173.304a(d)(1).
 */
export function hydrocarbonPercent(specificGravity: number): number | null {
  const thousandths = Math.round(specificGravity * 1000)
  const first = HYDROCARBON_BANDS[0]
  const last = HYDROCARBON_BANDS.at(-1)
  if (!first || !last || thousandths < first.fromThousandths || thousandths > last.toThousandths) return null
  return HYDROCARBON_BANDS.findLast(band => band.fromThousandths <= thousandths)?.percent ?? null
}

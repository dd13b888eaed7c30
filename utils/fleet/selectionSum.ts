import type { CylinderRow } from '../custody/cylinderView'

/** What chosen cylinders come to. */
export interface SelectionSum {
  count: number
  /** Of the nets that are known; null where none is. */
  netGrams: number | null
  /** Of the gross weights that are known; null where none is. */
  grossGrams: number | null
  /** The one refrigerant that is in them; null where there are several, none or one that is not known. */
  refrigerant: string | null
  /** How many have something in them whose weight is not known. */
  withoutWeight: number
}

/** Adds up the known weights of chosen cylinders; what is not known is counted, never taken as nothing. */
export function selectionSum(rows: readonly CylinderRow[]): SelectionSum {
  const weighed = rows.filter(row => row.netGrams !== null)
  const gross = weighed.filter(row => row.tareWeightGrams !== null)
  const filled = rows.filter(row => !row.nothingInIt)
  const names = new Set(filled.map(row => row.refrigerant))
  return {
    count: rows.length,
    netGrams: weighed.length ? weighed.reduce((sum, row) => sum + row.netGrams!, 0) : null,
    grossGrams: gross.length ? gross.reduce((sum, row) => sum + row.tareWeightGrams! + row.netGrams!, 0) : null,
    refrigerant: names.size === 1 ? [...names][0] ?? null : null,
    withoutWeight: filled.filter(row => row.netGrams === null).length,
  }
}

import type { CylinderRow } from '../custody/cylinderView'

/** What chosen cylinders hold of one refrigerant; null where it is not known which. */
export interface RefrigerantSum {
  refrigerant: string | null
  count: number
  /** Of the nets that are known; null where none is. */
  netGrams: number | null
}

/** What chosen cylinders come to. */
export interface SelectionSum {
  count: number
  /** Of the nets that are known; null where none is. */
  netGrams: number | null
  /** What is in them, the most cylinders first; those with nothing in them are in none. */
  contents: RefrigerantSum[]
  /** Of the gross weights that are known; null where none is. */
  grossGrams: number | null
  /** How many have something in them whose weight is not known. */
  withoutWeight: number
}

/** Adds up the known weights of chosen cylinders; what is not known is counted, never taken as nothing. */
export function selectionSum(rows: readonly CylinderRow[]): SelectionSum {
  const filled = rows.filter(row => !row.nothingInIt)
  const names = [...new Set(filled.map(row => row.refrigerant))]
  return {
    count: rows.length,
    netGrams: sumOfKnown(rows.map(row => row.netGrams)),
    contents: names.map(name => sumOf(name, filled.filter(row => row.refrigerant === name)))
      .sort((a, b) => b.count - a.count),
    grossGrams: sumOfKnown(rows.map(row => row.netGrams === null || row.tareWeightGrams === null ? null : row.tareWeightGrams + row.netGrams)),
    withoutWeight: filled.filter(row => row.netGrams === null).length,
  }
}

function sumOf(refrigerant: string | null, rows: readonly CylinderRow[]): RefrigerantSum {
  return { refrigerant, count: rows.length, netGrams: sumOfKnown(rows.map(row => row.netGrams)) }
}

function sumOfKnown(values: readonly (number | null)[]): number | null {
  const known = values.filter(value => value !== null)
  return known.length === 0 ? null : known.reduce((sum, value) => sum + value, 0)
}

import type { Catalogue, Composition, Refrigerant, RefrigerantRecord, SaturationRow, SupercriticalTable } from './types'

/**
 * The catalogue from the records of its data files.
 *
 * Errors: RangeError where a designation stands twice or a table holds an incomplete row.
 */
export function buildCatalogue(
  records: readonly RefrigerantRecord[], supercritical: readonly SupercriticalTable[], compositions: readonly Composition[] = [],
): Catalogue {
  return {
    refrigerants: byDesignation(records.map(refrigerantOf)),
    supercritical: byDesignation(supercritical),
    compositions: byDesignation(compositions),
  }
}

function refrigerantOf(record: RefrigerantRecord): Refrigerant {
  return { ...record, table: record.table.map(columns => saturationRow(record.designation, columns)) }
}

function saturationRow(designation: string, columns: readonly number[]): SaturationRow {
  const [tC, bubblePressureKPa, dewPressureKPa, liquidDensity, vapourDensity] = columns
  if (tC === undefined || bubblePressureKPa === undefined || dewPressureKPa === undefined
    || liquidDensity === undefined || vapourDensity === undefined) {
    throw new RangeError(`Incomplete saturation row of ${designation}`)
  }
  return { tC, bubblePressureKPa, dewPressureKPa, liquidDensity, vapourDensity }
}

function byDesignation<T extends { designation: string }>(records: readonly T[]): ReadonlyMap<string, T> {
  const map = new Map(records.map(record => [record.designation, record]))
  if (map.size !== records.length) throw new RangeError('A designation stands twice in the catalogue')
  return map
}

import type { CurvePoint } from './monotoneCurve'
import { curveThrough } from './monotoneCurve'
import { risingInverse } from './saturation'
import type {
  Catalogue, Composition, Refrigerant, RefrigerantRecord, SaturationCurves, SaturationRow, SupercriticalRecord, SupercriticalTable,
} from './types'

/**
 * The catalogue from the records of its data files, with the curves through their rows.
 *
 * Errors: RangeError where a designation stands twice, a row is incomplete, or rows do not stand in rising order.
 */
export function buildCatalogue(
  records: readonly RefrigerantRecord[], supercritical: readonly SupercriticalRecord[], compositions: readonly Composition[] = [],
): Catalogue {
  return {
    refrigerants: byDesignation(records.map(refrigerantOf)),
    supercritical: byDesignation(supercritical.map(supercriticalOf)),
    compositions: byDesignation(compositions),
  }
}

function refrigerantOf(record: RefrigerantRecord): Refrigerant {
  const table = record.table.map(columns => saturationRow(record.designation, columns))
  return { ...record, table, curves: saturationCurves(table) }
}

function saturationRow(designation: string, columns: readonly number[]): SaturationRow {
  const [tC, bubblePressureKPa, dewPressureKPa, liquidDensity, vapourDensity] = columns
  if (tC === undefined || bubblePressureKPa === undefined || dewPressureKPa === undefined
    || liquidDensity === undefined || vapourDensity === undefined) {
    throw new RangeError(`Incomplete saturation row of ${designation}`)
  }
  return { tC, bubblePressureKPa, dewPressureKPa, liquidDensity, vapourDensity }
}

// The logarithm of a vapour's pressure and of its density are nearly straight over the inverse of the absolute temperature.
function saturationCurves(table: readonly SaturationRow[]): SaturationCurves {
  const curve = (point: (row: SaturationRow) => CurvePoint) => curveThrough(table.map(point))
  return {
    liquidDensity: curve(row => ({ x: row.tC, y: row.liquidDensity })),
    lnVapourDensity: curve(row => ({ x: risingInverse(row.tC), y: Math.log(row.vapourDensity) })),
    lnBubblePressure: curve(row => ({ x: risingInverse(row.tC), y: Math.log(row.bubblePressureKPa) })),
    lnDewPressure: curve(row => ({ x: risingInverse(row.tC), y: Math.log(row.dewPressureKPa) })),
  }
}

function supercriticalOf(record: SupercriticalRecord): SupercriticalTable {
  const curves = record.tempsC.map((_, column) => curveThrough(record.rows.map((row) => {
    const [density, ...pressures] = row
    const kPa = pressures[column]
    if (density === undefined || kPa === undefined) throw new RangeError(`Incomplete supercritical row of ${record.designation}`)
    return { x: density, y: kPa }
  })))
  return { ...record, curves }
}

function byDesignation<T extends { designation: string }>(records: readonly T[]): ReadonlyMap<string, T> {
  const map = new Map(records.map(record => [record.designation, record]))
  if (map.size !== records.length) throw new RangeError('A designation stands twice in the catalogue')
  return map
}

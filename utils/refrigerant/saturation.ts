import { kelvinFromCelsius } from '../quantity/temperature'
import type { CurvePoint } from './monotoneCurve'
import { valueOnCurve } from './monotoneCurve'
import type { Refrigerant, SaturationRow } from './types'

/** Saturation of a refrigerant at a temperature, with how far it may be off. Units: kg/m3, kPa absolute, fractions of one. */
export type Saturation = {
  liquidDensity: number
  vapourDensity: number
  bubblePressureKPa: number
  dewPressureKPa: number
  relativeErrorDensity: number
  relativeErrorPressure: number
  accuracyGroup: Refrigerant['accuracyGroup']
  /** What makes this refrigerant's figures less sure than its group; null where nothing does. */
  doubt: string | null
  source: string
}

/** Whether a refrigerant's table gives a liquid at a temperature; near and above its critical temperature there is none. */
export function hasLiquidAt(refrigerant: Refrigerant, tC: number): boolean {
  const coldest = refrigerant.table[0]
  return coldest !== undefined && tC >= coldest.tC && tC <= refrigerant.tableMaxC
}

/**
 * Saturation of a refrigerant at a temperature, between the rows of its table.
 *
 * Units: C in; kg/m3 and kPa absolute out; liquid at the bubble point, vapour at the dew point.
 * Errors: RangeError outside the table.
 */
export function saturationAt(refrigerant: Refrigerant, tC: number): Saturation {
  return {
    liquidDensity: densityAt(refrigerant, tC, row => row.liquidDensity),
    vapourDensity: densityAt(refrigerant, tC, row => row.vapourDensity),
    bubblePressureKPa: pressureAt(refrigerant, tC, row => row.bubblePressureKPa),
    dewPressureKPa: pressureAt(refrigerant, tC, row => row.dewPressureKPa),
    relativeErrorDensity: refrigerant.relativeErrorDensity,
    relativeErrorPressure: refrigerant.relativeErrorPressure,
    accuracyGroup: refrigerant.accuracyGroup,
    doubt: refrigerant.doubt ?? null,
    source: refrigerant.source,
  }
}

/** Density of the saturated liquid in kg/m3. Errors: RangeError outside the table. */
export function liquidDensityAt(refrigerant: Refrigerant, tC: number): number {
  return densityAt(refrigerant, tC, row => row.liquidDensity)
}

function densityAt(refrigerant: Refrigerant, tC: number, column: (row: SaturationRow) => number): number {
  assertInTable(refrigerant, tC)
  return valueOnCurve(refrigerant.table.map(row => ({ x: row.tC, y: column(row) })), tC)
}

// The logarithm of a vapour pressure is nearly straight over the inverse of the absolute temperature.
function pressureAt(refrigerant: Refrigerant, tC: number, column: (row: SaturationRow) => number): number {
  assertInTable(refrigerant, tC)
  const points: CurvePoint[] = refrigerant.table.map(row => ({ x: risingInverse(row.tC), y: Math.log(column(row)) }))
  return Math.exp(valueOnCurve(points, risingInverse(tC)))
}

function risingInverse(tC: number): number {
  return -1 / kelvinFromCelsius(tC)
}

function assertInTable(refrigerant: Refrigerant, tC: number): void {
  if (!hasLiquidAt(refrigerant, tC)) {
    throw new RangeError(`${refrigerant.designation} has no saturation data at ${tC} C`)
  }
}

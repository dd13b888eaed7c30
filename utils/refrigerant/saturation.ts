import { kelvinFromCelsius } from '../quantity/temperature'
import { valueOnCurve } from './monotoneCurve'
import type { LiquidTable, Refrigerant } from './types'

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
export function hasLiquidAt(fluid: LiquidTable, tC: number): boolean {
  const coldest = fluid.table[0]
  return coldest !== undefined && tC >= coldest.tC && tC <= fluid.tableMaxC
}

/**
 * Saturation of a refrigerant at a temperature, between the rows of its table.
 *
 * Units: C in; kg/m3 and kPa absolute out; liquid at the bubble point, vapour at the dew point.
 * Errors: RangeError outside the table, also for what is no number.
 */
export function saturationAt(refrigerant: Refrigerant, tC: number): Saturation {
  assertInTable(refrigerant, tC)
  const { curves } = refrigerant
  const inverse = risingInverse(tC)
  return {
    liquidDensity: valueOnCurve(curves.liquidDensity, tC),
    vapourDensity: Math.exp(valueOnCurve(curves.lnVapourDensity, inverse)),
    bubblePressureKPa: Math.exp(valueOnCurve(curves.lnBubblePressure, inverse)),
    dewPressureKPa: Math.exp(valueOnCurve(curves.lnDewPressure, inverse)),
    relativeErrorDensity: refrigerant.relativeErrorDensity,
    relativeErrorPressure: refrigerant.relativeErrorPressure,
    accuracyGroup: refrigerant.accuracyGroup,
    doubt: refrigerant.doubt ?? null,
    source: refrigerant.source,
  }
}

/** Density of the saturated liquid in kg/m3. Errors: RangeError outside the table. */
export function liquidDensityAt(fluid: LiquidTable, tC: number): number {
  assertInTable(fluid, tC)
  return valueOnCurve(fluid.curves.liquidDensity, tC)
}

/** Density of the saturated vapour in kg/m3. Errors: RangeError outside the table. */
export function vapourDensityAt(refrigerant: Refrigerant, tC: number): number {
  assertInTable(refrigerant, tC)
  return Math.exp(valueOnCurve(refrigerant.curves.lnVapourDensity, risingInverse(tC)))
}

/** Pressure at which the liquid begins to boil in kPa absolute. Errors: RangeError outside the table. */
export function bubblePressureAt(refrigerant: Refrigerant, tC: number): number {
  assertInTable(refrigerant, tC)
  return Math.exp(valueOnCurve(refrigerant.curves.lnBubblePressure, risingInverse(tC)))
}

/** What pressures and the vapour's density are interpolated over: the inverse of the absolute temperature, turned so that it rises with it. Units: 1/K. */
export function risingInverse(tC: number): number {
  return -1 / kelvinFromCelsius(tC)
}

function assertInTable(fluid: LiquidTable, tC: number): void {
  if (!hasLiquidAt(fluid, tC)) throw new RangeError(`${fluid.designation} has no saturation data at ${tC} C`)
}

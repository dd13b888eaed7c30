import type { MassReading } from '../quantity/mass'
import { kelvinFromCelsius } from '../quantity/temperature'
import type { Curve } from '../refrigerant/monotoneCurve'
import { valueOnCurve } from '../refrigerant/monotoneCurve'
import { hasLiquidAt } from '../refrigerant/saturation'
import type { Refrigerant, SupercriticalTable } from '../refrigerant/types'
import { volumeLitres } from './rules/ruleInput'
import type { TwoPhase } from './twoPhase'
import { twoPhase } from './twoPhase'

/** A filled cylinder whose behaviour with heat is asked for. */
export type HeatInput = {
  netGrams: number
  waterCapacity: MassReading
  refrigerant: Refrigerant
  supercritical: SupercriticalTable | null
}

/** A filled cylinder at one temperature; null where no figure is held. Units: C, kPa absolute. */
export type HeatPoint = {
  tC: number
  phase: TwoPhase['phase'] | 'supercritical'
  liquidShare: number | null
  pressureKPa: number | null
}

/**
 * How full of liquid a cylinder is, and at which pressure, over the temperatures asked for.
 *
 * Between the rows of the saturation table; above it only at the temperatures for which pressures over fill density are
 * held, and not between them.
 * Errors: RangeError at a temperature that neither table has, for a net below 0 and for a water capacity that is not above 0.
 */
export function heatCurve(input: HeatInput, temperaturesC: readonly number[]): HeatPoint[] {
  return temperaturesC.map(tC => heatPoint(input, tC))
}

/** The temperatures above the saturation table at which a fluid's pressure in a cylinder is known all the same. Units: C. */
export function temperaturesAboveTable(refrigerant: Refrigerant, supercritical: SupercriticalTable | null): number[] {
  return supercritical?.tempsC.filter(tC => tC > refrigerant.tableMaxC) ?? []
}

function heatPoint({ netGrams, waterCapacity, refrigerant, supercritical }: HeatInput, tC: number): HeatPoint {
  const litres = volumeLitres(waterCapacity)
  if (hasLiquidAt(refrigerant, tC)) {
    const { phase, liquidShare, pressureKPa } = twoPhase({ netGrams, volumeLitres: litres, refrigerant, tC })
    return { tC, phase, liquidShare, pressureKPa }
  }
  const curve = supercritical?.curves[supercritical.tempsC.indexOf(tC)]
  if (!curve || !(netGrams >= 0 && litres > 0)) throw new RangeError(`No figures for ${netGrams} g of ${refrigerant.designation} at ${tC} C`)
  // Grams per litre are kilograms per cubic metre.
  const density = netGrams / litres
  if (kelvinFromCelsius(tC) > refrigerant.tcK) return { tC, phase: 'supercritical', liquidShare: null, pressureKPa: pressureOn(curve, density) }
  return belowCritical(tC, curve, density)
}

// Thinner or denser than the rows no pressure is known.
function pressureOn(curve: Curve, density: number): number | null {
  const [thinnest = Infinity] = curve.x
  return density >= thinnest && density <= (curve.x.at(-1) ?? -Infinity) ? valueOnCurve(curve, density) : null
}

// Just below the critical temperature the pressure stays level while liquid and vapour share the cylinder; thinner it is
// all vapour, denser all liquid.
function belowCritical(tC: number, curve: Curve, density: number): HeatPoint {
  const first = curve.y.findIndex((kPa, index) => kPa === curve.y[index + 1])
  const levelKPa = curve.y[first]
  if (levelKPa === undefined) throw new RangeError(`No level pressure at ${tC} C`)
  if (density < (curve.x[first] ?? 0)) return { tC, phase: 'vapour', liquidShare: 0, pressureKPa: pressureOn(curve, density) }
  if (density <= (curve.x[curve.y.lastIndexOf(levelKPa)] ?? 0)) return { tC, phase: 'two-phase', liquidShare: null, pressureKPa: levelKPa }
  return { tC, phase: 'liquid-full', liquidShare: 1, pressureKPa: pressureOn(curve, density) }
}

import { celsiusFromFahrenheit, kelvinFromCelsius } from '../quantity/temperature'
import { kPaFromPsia } from '../quantity/pressure'
import { saturationAt } from './saturation'
import type { Refrigerant } from './types'

export type PressureClass = 'very-high' | 'high' | 'medium' | 'low'

/** The pressure class of a refrigerant, and how near it is to another one. Units: kPa absolute. */
export interface PressureClassing {
  pressureClass: PressureClass
  /** Pressure of the liquid at 104 °F, or that it is above its critical temperature there. */
  at104F: { bubblePressureKPa: number } | { aboveCritical: true }
  /** The neighbouring class, where the pressure is not known to lie on one side of the bound; null also where the law names it. */
  nearBound: { pressureClass: PressureClass, boundKPa: number } | null
  source: string
}

const CLASS_TEMPERATURE_C = celsiusFromFahrenheit(104)

const LADDER = [
  { below: 'low', above: 'medium', boundKPa: kPaFromPsia(45) },
  { below: 'medium', above: 'high', boundKPa: kPaFromPsia(170) },
  { below: 'high', above: 'very-high', boundKPa: kPaFromPsia(355) },
] as const

// What another equation of state or the firm's own table may differ by.
const NEAR_SHARE = 0.015

const NAMED: Readonly<Record<PressureClass, readonly string[]>> = {
  'very-high': ['R-13', 'R-23', 'R-503', 'R-508A', 'R-508B'],
  'high': ['R-22', 'R-407A', 'R-407C', 'R-410A', 'R-502'],
  'medium': ['R-114', 'R-124', 'R-12', 'R-134a', 'R-500'],
  'low': ['R-11', 'R-113', 'R-123', 'R-245fa'],
}

/**
 * The pressure class of a refrigerant: by the pressure of its liquid at 104 °F (40 °C), very high also when it is then above
 * its critical temperature.
 *
 * A refrigerant that the definitions name as an example is of their class, however near it comes to a bound.
 * Errors: RangeError where its table ends below 104 °F although its critical temperature lies above.
 * Source: 40 CFR 82.152; bounds 355, 170 and 45 psia.
 */
export function pressureClassOf(refrigerant: Refrigerant): PressureClassing {
  if (refrigerant.tcK < kelvinFromCelsius(CLASS_TEMPERATURE_C)) {
    return { pressureClass: 'very-high', at104F: { aboveCritical: true }, nearBound: null, source: sourceOf(refrigerant, 'very-high') }
  }
  const { bubblePressureKPa } = saturationAt(refrigerant, CLASS_TEMPERATURE_C)
  const named = nameGivenTo(refrigerant.designation)
  const pressureClass = named ?? classAt(bubblePressureKPa)
  return {
    pressureClass,
    at104F: { bubblePressureKPa },
    nearBound: named ? null : neighbourOf(bubblePressureKPa, Math.max(NEAR_SHARE, refrigerant.relativeErrorPressure)),
    source: sourceOf(refrigerant, pressureClass),
  }
}

function classAt(kPa: number): PressureClass {
  const [low, medium, high] = LADDER
  if (kPa < low.boundKPa) return 'low'
  if (kPa < medium.boundKPa) return 'medium'
  return kPa <= high.boundKPa ? 'high' : 'very-high'
}

function neighbourOf(kPa: number, share: number): PressureClassing['nearBound'] {
  const step = LADDER.find(({ boundKPa }) => Math.abs(kPa / boundKPa - 1) <= share)
  if (!step) return null
  return { pressureClass: classAt(kPa) === step.above ? step.below : step.above, boundKPa: step.boundKPa }
}

function nameGivenTo(designation: string): PressureClass | undefined {
  return (Object.keys(NAMED) as PressureClass[]).find(one => NAMED[one].includes(designation))
}

function sourceOf({ designation }: Refrigerant, pressureClass: PressureClass): string {
  return NAMED[pressureClass].includes(designation) ? '40 CFR 82.152, which names it' : '40 CFR 82.152, by its pressure at 104 °F'
}

import { heatCurve, temperaturesAboveTable, type HeatPoint } from '../capacity/heat'
import { liquidFullTemperature, type LiquidFull } from '../capacity/liquidFull'
import { twoPhase } from '../capacity/twoPhase'
import { exactGrams } from '../quantity/mass'
import { psigFromKPa } from '../quantity/pressure'
import { celsiusFromFahrenheit, fahrenheitFromCelsius } from '../quantity/temperature'
import { hasLiquidAt, liquidDensityAt } from '../refrigerant/saturation'
import type { Catalogue, Refrigerant } from '../refrigerant/types'
import type { AxisMark } from './axisMark'
import type { HeatQuestion } from './heatQuestion'
import { liquidFullWords, volumeShare } from './heatWords'

/** How what is in a cylinder behaves as it warms, one point to a degree Fahrenheit or to a row of its table. */
export type Heat = {
  refrigerant: string
  ofLimit: boolean
  points: HeatPoint[]
  /** Drawn by pressure: the fluid is a gas when hot, so that there is no level to show. */
  isGas: boolean
  liquidFull: LiquidFull | null
  /** How much of the volume is liquid at 130 F after a fill of 80 % at 77 F; null where it is no liquid at both. */
  eightyWhenHot: number | null
}

/** A curve in a box of 100 by 100, from the left and from the top, with what is written beside it. */
export type HeatDrawing = {
  path: string
  places: { x: number, y: number }[]
  /** Temperatures to look at: 77 F or 70 F, and 131 F. */
  marks: { x: number, y: number, temperature: string, value: string }[]
  xTicks: AxisMark[]
  yTicks: AxisMark[]
  /** From where on the cylinder is liquid-full; null where that is not within the picture. */
  fullFrom: number | null
}

const COLDEST_F = 0
const MARKS_F = [70, 77, 131]
const X_STEP_F = 20
const PRESSURE_STEPS = [100, 200, 500, 1000, 2000, 5000]
const MOST_STEPS = 5

/** The behaviour with heat, or null where the catalogue does not hold the refrigerant. */
export function heatOf(question: HeatQuestion, { refrigerants, supercritical }: Catalogue): Heat | null {
  const refrigerant = refrigerants.get(question.refrigerant)
  if (!refrigerant) return null
  const { netGrams, waterCapacity } = question
  const table = supercritical.get(refrigerant.designation) ?? null
  const isGas = !hasLiquidAt(refrigerant, celsiusFromFahrenheit(131))
  const temperaturesC = [...wholeDegrees(refrigerant), ...temperaturesAboveTable(refrigerant, table)]
  return {
    refrigerant: refrigerant.designation,
    ofLimit: question.ofLimit,
    points: heatCurve({ netGrams, waterCapacity, refrigerant, supercritical: table }, temperaturesC),
    isGas,
    liquidFull: liquidFullTemperature({ netGrams, waterCapacityGrams: exactGrams(waterCapacity), refrigerant }),
    eightyWhenHot: eightyWhenHot(refrigerant),
  }
}

// To the last row, which need not lie on a whole degree.
function wholeDegrees({ table, tableMaxC }: Refrigerant): number[] {
  const first = Math.max(COLDEST_F, Math.ceil(fahrenheitFromCelsius(table[0]?.tC ?? tableMaxC)))
  const last = Math.ceil(fahrenheitFromCelsius(tableMaxC))
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => Math.min(tableMaxC, celsiusFromFahrenheit(first + index)))
}

/**
 * How much of a cylinder is liquid at 130 F that was filled with 80 % of its volume of liquid at 77 F: why a level says
 * nothing and a weight does.
 *
 * Returns null where the refrigerant has no liquid at one of the two.
 */
export function eightyWhenHot(refrigerant: Refrigerant): number | null {
  const [coolC, hotC] = [celsiusFromFahrenheit(77), celsiusFromFahrenheit(130)]
  if (!hasLiquidAt(refrigerant, coolC) || !hasLiquidAt(refrigerant, hotC)) return null
  // Of one litre: kg/m3 are grams in it.
  const netGrams = 0.8 * liquidDensityAt(refrigerant, coolC)
  return twoPhase({ netGrams, volumeLitres: 1, refrigerant, tC: hotC }).liquidShare
}

/** Lays the curve out: the liquid's share of the volume, or for a gas the pressure, over the temperature. */
export function layOutHeat({ points, isGas }: Heat): HeatDrawing {
  const drawn = points.filter(point => valueOf(point, isGas) !== null)
  const temperatures = points.map(({ tC }) => fahrenheitFromCelsius(tC))
  const [coldF, hotF] = [temperatures[0] ?? 0, temperatures.at(-1) ?? 1]
  const x = (f: number) => (f - coldF) / (hotF - coldF) * 100
  const yTicks = isGas ? pressureTicks(drawn) : [0, 25, 50, 75, 100].map(percent => ({ value: percent / 100, label: `${percent}` }))
  const top = yTicks.at(-1)?.value ?? 1
  const y = (point: HeatPoint) => 100 - (valueOf(point, isGas) ?? 0) / top * 100
  const places = points.map(point => ({ x: x(fahrenheitFromCelsius(point.tC)), y: y(point) }))
  const full = points.findIndex(point => point.phase === 'liquid-full')
  return {
    path: drawn.map((point, index) => `${index === 0 ? 'M' : 'L'}${two(x(fahrenheitFromCelsius(point.tC)))} ${two(y(point))}`).join(''),
    places,
    marks: MARKS_F.flatMap((f) => {
      const index = temperatures.findIndex(each => Math.abs(each - f) < 0.05)
      const point = points[index]
      const isOther = f === 70 ? !isGas : f === 77 && isGas
      if (!point || isOther || valueOf(point, isGas) === null) return []
      return [{ ...places[index]!, temperature: `${f}\u00A0°F`, value: isGas ? pressureWords(point.pressureKPa) : volumeShare(point.liquidShare ?? 0) }]
    }),
    xTicks: ticksBetween(coldF, hotF).map(f => ({ at: x(f), label: String(f) })),
    yTicks: yTicks.map(({ value, label }) => ({ at: 100 - value / top * 100, label })),
    fullFrom: full === -1 || isGas ? null : places[full]!.x,
  }
}

/** The picture in words, with the same numbers. */
export function heatInWords({ refrigerant, ofLimit, isGas, liquidFull }: Heat, { marks }: HeatDrawing): string {
  const what = isGas ? '' : ' of the volume liquid'
  const full = liquidFull === null || isGas ? [] : [`liquid-full ${'c' in liquidFull ? 'at ' : ''}${liquidFullWords(liquidFull)}`]
  return `${refrigerant}, ${ofLimit ? 'filled to the limit' : 'as much as is in it'}: ${[...marks.map(({ temperature, value }) => `at ${temperature} ${value}${what}`), ...full].join(', ')}.`
}

/** One point in words. Rounding: pressure to the nearest psi, temperature to the nearest degree. */
export function pointInWords({ tC, phase, liquidShare, pressureKPa }: HeatPoint): string {
  const at = `${Math.round(fahrenheitFromCelsius(tC))}\u00A0°F (${Math.round(tC)}\u00A0°C)`
  if (phase === 'liquid-full') return `${at}: liquid-full. No vapor is left, and the pressure climbs with every degree.`
  const pressure = pressureKPa === null ? '' : `, ${pressureWords(pressureKPa)}`
  if (phase === 'supercritical') return `${at}: all gas${pressure}`
  if (phase === 'vapour') return `${at}: all vapor${pressure}`
  if (liquidShare === null) return `${at}: liquid and vapor${pressure}`
  return `${at}: ${volumeShare(liquidShare)} of the volume is liquid${pressure}`
}

function valueOf(point: HeatPoint, isGas: boolean): number | null {
  return isGas ? point.pressureKPa === null ? null : psigFromKPa(point.pressureKPa) : point.liquidShare
}

function pressureWords(kPa: number | null): string {
  return kPa === null ? 'pressure not known' : `${Math.round(psigFromKPa(kPa)).toLocaleString('en-US')}\u00A0psig`
}

function pressureTicks(points: readonly HeatPoint[]): { value: number, label: string }[] {
  const most = Math.max(1, ...points.map(({ pressureKPa }) => pressureKPa === null ? 0 : psigFromKPa(pressureKPa)))
  const step = PRESSURE_STEPS.find(size => most / size <= MOST_STEPS) ?? PRESSURE_STEPS.at(-1)!
  return Array.from({ length: Math.ceil(most / step) + 1 }, (_, index) => ({ value: index * step, label: (index * step).toLocaleString('en-US') }))
}

function ticksBetween(fromF: number, toF: number): number[] {
  const first = Math.ceil(fromF / X_STEP_F)
  return Array.from({ length: Math.max(0, Math.floor(toF / X_STEP_F) - first + 1) }, (_, index) => (first + index) * X_STEP_F)
}

function two(value: number): string {
  return String(Math.round(value * 100) / 100)
}

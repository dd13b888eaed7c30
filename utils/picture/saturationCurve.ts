import { formatGauge, formatThermometer, gaugeFromKPa, thermometerFromCelsius, type GaugeUnit } from '../quantity/gauge'
import type { Saturation } from '../refrigerant/saturation'
import type { AxisMark } from './axisMark'

/** A row of a saturation table. Units: C, kPa absolute. */
export interface CurvePoint { tC: number, bubblePressureKPa: number, dewPressureKPa: number }

/** Pressure over temperature in a box of 100 by 100, from the left and from the top. */
export interface SaturationDrawing {
  bubble: string
  dew: string
  /** Between both curves; a single fluid has none. */
  band: string | null
  /** In the reader's unit, and in the other one. */
  pressures: AxisMark[]
  otherPressures: AxisMark[]
  temperatures: AxisMark[]
  otherTemperatures: AxisMark[]
  /** Where the gauge stands at nothing. */
  zero: number
  place: (tC: number, kPa: number) => { x: number, y: number }
}

const MOST_PRESSURES = 8
const MOST_TEMPERATURES = 6
const PRESSURE_STEPS = [0.5, 1, 2, 5, 10, 20, 50, 100, 200, 500, 1000, 2000]
const TEMPERATURE_STEPS = [5, 10, 20, 40]
// Bubble and dew pressure closer than this are one line, and one figure.
const SAME_SHARE = 0.002

/** The unit that is written at the far edges, for readers of the other kind of gauge. */
export function otherGauge(unit: GaugeUnit): GaugeUnit {
  return unit === 'psi' ? 'bar' : 'psi'
}

/** Lays out the bubble and dew pressure of a refrigerant over its table's temperatures. Errors: RangeError for fewer than two rows. */
export function layOutSaturation(rows: readonly CurvePoint[], unit: GaugeUnit): SaturationDrawing {
  const [first, last] = [rows[0], rows.at(-1)]
  if (!first || !last || first === last) throw new RangeError('A curve needs at least two rows')
  const topKPa = last.bubblePressureKPa * 1.04
  const place = (tC: number, kPa: number) => ({ x: (tC - first.tC) / (last.tC - first.tC) * 100, y: 100 - kPa / topKPa * 100 })
  const points = (pressure: (row: CurvePoint) => number) => rows.map(row => place(row.tC, pressure(row)))
  const [bubble, dew] = [points(row => row.bubblePressureKPa), points(row => row.dewPressureKPa)]
  const pressureMarks = (of: GaugeUnit) => marks(PRESSURE_STEPS, MOST_PRESSURES, gaugeFromKPa(0, of), gaugeFromKPa(topKPa, of))
  const temperatureMarks = (of: GaugeUnit) => marks(TEMPERATURE_STEPS, MOST_TEMPERATURES, thermometerFromCelsius(first.tC, of), thermometerFromCelsius(last.tC, of))
  return {
    bubble: path(bubble),
    dew: path(dew),
    band: rows.some(row => !isOne(row)) ? `${path(bubble)}${path([...dew].reverse()).replace('M', 'L')}Z` : null,
    pressures: pressureMarks(unit).map(mark => ({ ...mark, at: 100 - mark.at })),
    otherPressures: pressureMarks(otherGauge(unit)).map(mark => ({ ...mark, at: 100 - mark.at })),
    temperatures: temperatureMarks(unit),
    otherTemperatures: temperatureMarks(otherGauge(unit)),
    zero: 100 - (0 - gaugeFromKPa(0, unit)) / (gaugeFromKPa(topKPa, unit) - gaugeFromKPa(0, unit)) * 100,
    place,
  }
}

/** Whether bubble and dew pressure are one for the eye and for a gauge. */
export function isOne({ bubblePressureKPa, dewPressureKPa }: Pick<CurvePoint, 'bubblePressureKPa' | 'dewPressureKPa'>): boolean {
  return Math.abs(bubblePressureKPa - dewPressureKPa) <= SAME_SHARE * bubblePressureKPa
}

/** The pressure at one temperature in words, with the other unit beside it. */
export function saturationInWords(tC: number, saturation: Pick<Saturation, 'bubblePressureKPa' | 'dewPressureKPa'>, unit: GaugeUnit): string {
  const both = (kPa: number) => `${formatGauge(kPa, unit)} (${formatGauge(kPa, otherGauge(unit))})`
  const at = `At ${formatThermometer(tC, unit)} (${formatThermometer(tC, otherGauge(unit))})`
  return isOne(saturation)
    ? `${at}: ${both(saturation.bubblePressureKPa)} while liquid is left.`
    : `${at}: bubble ${both(saturation.bubblePressureKPa)}, dew ${both(saturation.dewPressureKPa)}.`
}

function marks(steps: readonly number[], most: number, from: number, to: number): AxisMark[] {
  const step = steps.find(each => (to - from) / each <= most) ?? steps.at(-1) ?? 1
  const found: AxisMark[] = []
  for (let value = Math.ceil(from / step) * step; value <= to; value += step) {
    found.push({ at: (value - from) / (to - from) * 100, label: String(value === 0 ? 0 : value).replace('-', '−') })
  }
  return found
}

function path(points: readonly { x: number, y: number }[]): string {
  return points.map(({ x, y }, index) => `${index ? 'L' : 'M'}${x.toFixed(2)} ${y.toFixed(2)}`).join('')
}

import { parseFigure, parseSignedFigure, type ParsedFigure } from '../quantity/figure'
import {
  barometerFromKPa, celsiusFromDegrees, celsiusFromThermometer, degreesFromCelsius, gaugeFromKPa, kPaFromBarometer, kPaFromDifference,
  kPaFromGauge, differenceFromKPa, plainFigure, thermometerFromCelsius, type GaugeUnit,
} from '../quantity/gauge'
import { isPressurePossible, PRESSURE_READING_RANGES, type PressureReading, type PressureReadingField } from './pressureReading'

/** A pressure reading as the fields of a form hold it, in the units of the gauge. What is left empty is not said. */
export interface PressureEntry {
  gauge: GaugeUnit
  pressure: string
  temperature: string
  gaugeError: string
  thermometerError: string
  barometer: string
}

/** What was read; the instruments and the barometer only where somebody said. */
export type EnteredReading = Pick<PressureReading, 'pressureKPa' | 'temperatureC'> & Partial<PressureReading>

/** Fields with nothing in them yet. */
export function emptyPressureEntry(gauge: GaugeUnit): PressureEntry {
  return { gauge, pressure: '', temperature: '', gaugeError: '', thermometerError: '', barometer: '' }
}

/** A reading, or what there is of one, as its fields show it in the units of a gauge. */
export function pressureEntryOf(reading: Partial<PressureReading>, gauge: GaugeUnit): PressureEntry {
  const text = (value: number | undefined, convert: (value: number, unit: GaugeUnit) => number) =>
    value === undefined ? '' : plainFigure(convert(value, gauge))
  return {
    gauge,
    pressure: text(reading.pressureKPa, gaugeFromKPa),
    temperature: text(reading.temperatureC, thermometerFromCelsius),
    gaugeError: text(reading.gaugeErrorKPa, differenceFromKPa),
    thermometerError: text(reading.thermometerErrorC, degreesFromCelsius),
    barometer: text(reading.barometerKPa, barometerFromKPa),
  }
}

/** The reading that was typed, or why there is none yet. */
export function readPressureEntry(entry: PressureEntry): { reading: EnteredReading } | { reason: string } {
  const fields = [
    field('pressureKPa', parseSignedFigure(entry.pressure), kPaFromGauge),
    field('temperatureC', parseSignedFigure(entry.temperature), celsiusFromThermometer),
    field('gaugeErrorKPa', parseFigure(entry.gaugeError), kPaFromDifference),
    field('thermometerErrorC', parseFigure(entry.thermometerError), celsiusFromDegrees),
    field('barometerKPa', parseFigure(entry.barometer), kPaFromBarometer),
  ]
  const wrong = fields.find(each => 'reason' in each)
  if (wrong && 'reason' in wrong) return wrong
  const reading = Object.assign({}, ...fields) as EnteredReading
  return isPressurePossible(reading) ? { reading } : { reason: 'The gauge shows a deeper vacuum than the air allows.' }

  function field(
    name: PressureReadingField, typed: ParsedFigure, convert: (value: number, unit: GaugeUnit) => number,
  ): Partial<PressureReading> | { reason: string } {
    const { what, isNeeded } = FIELDS[name]
    if ('error' in typed) {
      if (typed.error !== 'empty') return { reason: `The ${what} is not a figure. Write it without a comma, such as 78.5.` }
      return isNeeded ? { reason: `Type what the ${what} shows.` } : {}
    }
    const value = convert(typed.value, entry.gauge)
    const { least, most } = PRESSURE_READING_RANGES[name]
    return value < least || value > most ? { reason: `The ${what} shows more or less than can be. Look at its unit.` } : { [name]: value }
  }
}

const FIELDS: Record<PressureReadingField, { what: string, isNeeded: boolean }> = {
  pressureKPa: { what: 'gauge', isNeeded: true },
  temperatureC: { what: 'thermometer', isNeeded: true },
  gaugeErrorKPa: { what: 'error of the gauge', isNeeded: false },
  thermometerErrorC: { what: 'error of the thermometer', isNeeded: false },
  barometerKPa: { what: 'barometer', isNeeded: false },
}

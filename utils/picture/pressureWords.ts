import { degreesFromCelsius, formatDifference, formatGauge, formatThermometer, plainFigure, thermometerSymbol, type GaugeUnit } from '../quantity/gauge'
import type { PressureCheck } from '../refrigerant/pressureCheck'
import type { PressureReading } from '../refrigerant/pressureReading'
import { inThisAir } from './pressureBand'
import type { StatusKind } from './status'

const NO_BREAK_SPACE = '\u00A0'

/** A pressure check as a person reads it. */
export interface CheckedPressure { check: PressureCheck, reading: PressureReading, designation: string, unit: GaugeUnit }

/** The verdict: its status, its words, and what may be behind it. */
export function pressureVerdict({ check, designation, unit }: CheckedPressure): { kind: StatusKind, head: string, text: string } {
  switch (check.verdict) {
    case 'agrees': return {
      kind: 'ok',
      head: `Agrees with ${designation}`,
      text: `That does not prove ${designation}: others have nearly the same pressure.`,
    }
    case 'excess': return {
      kind: 'att',
      head: `${formatDifference(check.excessKPa, unit)} above ${designation}`,
      text: 'Air or another gas may be in it; a pressure cannot tell which.',
    }
    case 'below': return {
      kind: 'att',
      head: `${formatDifference(check.dewKPa - check.absoluteKPa, unit)} below ${designation}`,
      text: 'It may be colder inside than the thermometer says, all vapor, or another refrigerant.',
    }
  }
}

/** The band, where a reading agrees, and the reading in one sentence: the same numbers as in the picture. */
export function bandInWords(checked: CheckedPressure): string {
  const { check, reading, designation, unit } = checked
  return `The gauge shows ${formatGauge(reading.pressureKPa, unit)}. `
    + `At ${formatThermometer(reading.temperatureC, unit)} ${designation} with liquid left shows ${bandOf(checked)}; `
    + `by what gauge, thermometer and figures may be off, ${span(checked, check.agreesFromKPa, check.agreesToKPa)} agrees.`
}

/** The refrigerant's own band as the gauge in this air would show it. */
export function bandOf(checked: CheckedPressure): string {
  return span(checked, checked.check.dewKPa, checked.check.bubbleKPa)
}

/** A line of the account of what a reading may be off. */
export interface AccountLine {
  term: string
  /** How the figure comes about. */
  by: string | null
  figure: string
  /** The line that a sum ends in. */
  isSum: boolean
}

/** How the tolerance at the nearer edge comes about, line by line, down to where a reading agrees. */
export function pressureAccount(checked: CheckedPressure): AccountLine[] {
  const { check, reading, designation, unit } = checked
  const give = (kPa: number) => `±${NO_BREAK_SPACE}${formatDifference(kPa, unit)}`
  const degrees = degreesFromCelsius(reading.thermometerErrorC, unit)
  const slope = formatDifference(check.slopeKPaPerC / degreesFromCelsius(1, unit), unit)
  // A single fluid has one pressure, which needs no name.
  const hasGlide = check.bubbleKPa > check.dewKPa
  const [edge, edgeKPa] = check.absoluteKPa >= (check.dewKPa + check.bubbleKPa) / 2
    ? ['bubble', check.bubbleKPa] as const
    : ['dew', check.dewKPa] as const
  return [
    { term: 'Gauge', by: null, figure: give(reading.gaugeErrorKPa), isSum: false },
    { term: 'Thermometer', by: `${plainFigure(degrees)}${NO_BREAK_SPACE}${thermometerSymbol(unit)} × ${slope} to a degree`, figure: give(check.toleranceKPa - reading.gaugeErrorKPa), isSum: false },
    {
      term: `Figures of ${designation}`,
      by: `${plainFigure(check.relativeErrorPressure * 100)}${NO_BREAK_SPACE}% of ${formatDifference(edgeKPa, unit)} absolute`,
      figure: give(check.dataErrorKPa), isSum: false,
    },
    { term: 'Together', by: hasGlide ? `at the ${edge} pressure` : null, figure: give(check.toleranceKPa + check.dataErrorKPa), isSum: true },
    { term: `${designation} shows`, by: hasGlide ? 'dew to bubble' : null, figure: bandOf(checked), isSum: false },
    { term: 'Agrees', by: null, figure: span(checked, check.agreesFromKPa, check.agreesToKPa), isSum: true },
  ]
}

function span({ reading, unit }: CheckedPressure, fromKPa: number, toKPa: number): string {
  const from = formatGauge(inThisAir(fromKPa, reading.barometerKPa), unit)
  const to = formatGauge(inThisAir(toKPa, reading.barometerKPa), unit)
  return from === to ? to : `${from.split(NO_BREAK_SPACE)[0]} to ${to}`
}

import { degreesFromCelsius, formatDifference, formatGauge, formatThermometer, thermometerSymbol, type GaugeUnit } from '../quantity/gauge'
import type { PressureCheck } from '../refrigerant/pressureCheck'
import type { PressureReading } from '../refrigerant/pressureReading'
import { inThisAir, marginKPa } from './pressureBand'
import type { StatusKind } from './status'

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
      text: 'It is colder inside than the thermometer says, all of it is vapor, or it is another refrigerant.',
    }
  }
}

/** The band, its tolerance and the reading in one sentence: the same numbers as in the picture. */
export function bandInWords(checked: CheckedPressure): string {
  const { check, reading, designation, unit } = checked
  return `The gauge shows ${formatGauge(reading.pressureKPa, unit)}. `
    + `At ${formatThermometer(reading.temperatureC, unit)} ${designation} with liquid left shows ${bandOf(checked)}, give or take ${formatDifference(marginKPa(check), unit)}.`
}

/** The refrigerant's own band as the gauge in this air would show it. */
export function bandOf({ check, reading, unit }: CheckedPressure): string {
  const bubble = formatGauge(inThisAir(check.bubbleKPa, reading.barometerKPa), unit)
  const dew = formatGauge(inThisAir(check.dewKPa, reading.barometerKPa), unit)
  return dew === bubble ? bubble : `${dew.split('\u00A0')[0]} to ${bubble}`
}

/** A line of the account of what a reading may be off. */
export interface AccountLine { term: string, value: string, figure: true, strong?: boolean }

/** How the tolerance comes about, line by line, down to where a reading agrees. */
export function pressureAccount({ check, reading, designation, unit }: CheckedPressure): AccountLine[] {
  const give = (kPa: number) => `±\u00A0${formatDifference(kPa, unit)}`
  const degrees = degreesFromCelsius(reading.thermometerErrorC, unit)
  const slopeText = formatDifference(check.slopeKPaPerC / degreesFromCelsius(1, unit), unit)
  const margin = marginKPa(check)
  const isNearerBubble = check.absoluteKPa >= (check.dewKPa + check.bubbleKPa) / 2
  const edge = (kPa: number) => formatGauge(inThisAir(kPa, reading.barometerKPa), unit)
  const thermometer = `±\u00A0${degrees.toFixed(1)}\u00A0${thermometerSymbol(unit)} × ${slopeText} to a degree`
  return [
    { term: 'Gauge', value: give(reading.gaugeErrorKPa), figure: true },
    { term: `Thermometer, ${thermometer}`, value: give(check.toleranceKPa - reading.gaugeErrorKPa), figure: true },
    { term: `Figures of ${designation}, ${percent(check.relativeErrorPressure)} of the pressure above none`, value: give(check.dataErrorKPa), figure: true },
    { term: 'Together', value: give(margin), figure: true, strong: true },
    { term: `Band of ${designation}, as this gauge shows it`, value: bandOf({ check, reading, designation, unit }), figure: true },
    isNearerBubble
      ? { term: 'Agrees up to', value: edge(check.bubbleKPa + margin), figure: true, strong: true }
      : { term: 'Agrees down to', value: edge(Math.max(0, check.dewKPa - margin)), figure: true, strong: true },
  ]
}

function percent(share: number): string {
  return `${Number((share * 100).toFixed(1))}\u00A0%`
}

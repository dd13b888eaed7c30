import { differenceFromKPa, gaugeFromKPa, kPaFromDifference, type GaugeUnit } from '../quantity/gauge'
import { STANDARD_ATMOSPHERE_KPA } from '../quantity/pressure'
import type { PressureCheck } from '../refrigerant/pressureCheck'

/** A mark on the gauge's scale; `at` is its place from the left, in percent. */
export interface BandTick { at: number, label: string }

/** A strip of a gauge's scale as places in percent of its width. */
export interface PressureBand {
  /** From where to where a reading agrees. */
  from: number
  to: number
  /** The refrigerant's own band within. */
  dew: number
  bubble: number
  /** What was read. */
  needle: number
  ticks: BandTick[]
}

/** What a gauge in this air shows for an absolute pressure, as {@link gaugeFromKPa} takes it. */
export function inThisAir(absoluteKPa: number, barometerKPa: number): number {
  return absoluteKPa - barometerKPa + STANDARD_ATMOSPHERE_KPA
}

const PADDING = 0.14
const MOST_TICKS = 7
const STEPS = [1, 2, 5]

/** Lays out the part of a gauge's scale on which the band and the reading lie. */
export function layOutPressureBand(check: PressureCheck, barometerKPa: number, unit: GaugeUnit): PressureBand {
  const { dewKPa, bubbleKPa, absoluteKPa, agreesFromKPa, agreesToKPa } = check
  const low = Math.min(agreesFromKPa, absoluteKPa)
  const high = Math.max(agreesToKPa, absoluteKPa)
  const padding = (high - low) * PADDING || 1
  const begin = Math.max(0, low - padding)
  const end = high + padding
  const place = (kPa: number) => Math.min(100, Math.max(0, (kPa - begin) / (end - begin) * 100))
  return {
    from: place(agreesFromKPa),
    to: place(agreesToKPa),
    dew: place(dewKPa),
    bubble: place(bubbleKPa),
    needle: place(absoluteKPa),
    ticks: ticksBetween(begin, end, barometerKPa, unit, place),
  }
}

function ticksBetween(begin: number, end: number, barometerKPa: number, unit: GaugeUnit, place: (kPa: number) => number): BandTick[] {
  const step = stepFor(differenceFromKPa(end - begin, unit))
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9))
  const first = Math.ceil(gaugeFromKPa(inThisAir(begin, barometerKPa), unit) / step)
  const last = Math.floor(gaugeFromKPa(inThisAir(end, barometerKPa), unit) / step)
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => {
    const reading = (first + index) * step
    return { at: place(kPaFromDifference(reading, unit) + barometerKPa), label: (reading === 0 ? 0 : reading).toFixed(decimals).replace('-', '\u2212') }
  })
}

// The least round step that gives few enough marks.
function stepFor(span: number): number {
  const least = span / MOST_TICKS
  const decade = 10 ** Math.floor(Math.log10(least))
  return decade * (STEPS.find(step => decade * step >= least) ?? 10)
}

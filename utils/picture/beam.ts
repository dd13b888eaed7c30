import { exactGrams, formatFigure, formatMass, type MassRounding, type MassUnit } from '../quantity/mass'

/** What a beam picture is drawn from; every mass is gross, as the scale shows it. */
export type BeamMasses = {
  tareGrams: number
  /** What the scale shows now. */
  nowGrams: number
  /** Where filling stops. */
  stopGrams: number
  /** What the scale would show with the cylinder full of water. */
  waterFullGrams: number
}

/** A mark on the scale; `at` is its place from the left, in percent. */
export type BeamTick = { at: number, size: 'minor' | 'middle' | 'major', label: string | null }

/** The beam as lengths in percent of its width. */
export type Beam = {
  now: number
  stop: number
  /** How far what is in it reaches, at most to the stop. */
  filled: number
  /** How far it reaches past the stop; 0 while it does not. */
  over: number
  ticks: BeamTick[]
  /** The words at the poise and at the tare; the tare gives way where they would touch. */
  nowLabel: string
  tareLabel: string | null
  stopLabel: string
  /** The stop's figure stands over the flag where the poise would hide it. */
  stopLabelAbove: boolean
}

const STEPS = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000]
const MOST_LABELS = 6
// A bold figure of 14 px on the narrowest beam we draw, 250 px wide, takes this many percent a character.
const PERCENT_PER_CHARACTER = 3.4
const POISE_HALF_WIDTH = 5
const GAP = 2
const TICK_GAP = 4

/**
 * Lays out the straight scale from the empty cylinder to the water-full one.
 *
 * Rounding: tare and what the scale shows now to the nearest division, the stop weight down.
 */
export function layOutBeam(masses: BeamMasses, unit: MassUnit): Beam {
  const { tareGrams, nowGrams, stopGrams } = masses
  // An excess beyond water-full is still drawn, never clipped.
  const endGrams = Math.max(masses.waterFullGrams, nowGrams, stopGrams)
  const place = (grams: number) => Math.min(100, Math.max(0, (grams - tareGrams) / (endGrams - tareGrams) * 100))

  const now = place(nowGrams)
  const stop = place(stopGrams)
  const stopLabel = short(stopGrams, unit, 'down')
  const stopLabelAbove = overlaps(
    { left: leftOf(stop, stopLabel), right: leftOf(stop, stopLabel) + width(stopLabel) },
    { left: now - POISE_HALF_WIDTH, right: now + POISE_HALF_WIDTH },
  )
  const nowLabel = `${short(nowGrams, unit, 'nearest')} now`
  const tareLabel = `${short(tareGrams, unit, 'nearest')} tare`
  return {
    now,
    stop,
    filled: Math.min(now, stop),
    over: Math.max(0, now - stop),
    ticks: scaleTicks(tareGrams, endGrams, unit, place, label => clear(label, now, stop, stopLabelAbove ? '' : stopLabel)),
    nowLabel,
    tareLabel: leftOf(now, nowLabel) > width(tareLabel) + GAP ? tareLabel : null,
    stopLabel,
    stopLabelAbove,
  }
}

/** The same numbers as a line of text. Rounding: as on the beam. */
export function beamText(masses: BeamMasses, unit: MassUnit): string {
  const now = formatMass(masses.nowGrams, unit, 'nearest')
  const stop = formatMass(masses.stopGrams, unit, 'down')
  const excess = masses.nowGrams > masses.stopGrams
    ? `, ${formatMass(masses.nowGrams - masses.stopGrams, unit, 'up')} above the stop`
    : ''
  return `On the scale: tare ${formatMass(masses.tareGrams, unit, 'nearest')}, now ${now}${excess}, stop at ${stop}, full of water ${formatMass(masses.waterFullGrams, unit, 'nearest')}`
}

/** Where a label of that many characters begins when it is centred on a place and kept on the beam, in percent. */
export function leftOf(at: number, label: string): number {
  return Math.min(100 - width(label), Math.max(0, at - width(label) / 2))
}

// On the beam a decimal figure goes without its symbol; pounds and ounces cannot.
function short(grams: number, unit: MassUnit, rounding: MassRounding): string {
  return unit === 'lb-oz' ? formatMass(grams, unit, rounding) : formatFigure(grams, unit, rounding).figure
}

function width(label: string): number {
  return label.length * PERCENT_PER_CHARACTER
}

type Span = { left: number, right: number }

function overlaps(a: Span, b: Span): boolean {
  return a.left - TICK_GAP <= b.right && b.left - TICK_GAP <= a.right
}

type Label = { at: number, text: string }

function clear(label: Label, now: number, stop: number, stopLabel: string): boolean {
  const own = { left: leftOf(label.at, label.text), right: leftOf(label.at, label.text) + width(label.text) }
  const offPoise = !overlaps(own, { left: now - POISE_HALF_WIDTH, right: now + POISE_HALF_WIDTH })
  const stopLeft = leftOf(stop, stopLabel)
  const offStop = !overlaps(own, { left: stopLeft, right: stopLeft + width(stopLabel) })
  return offPoise && offStop && label.at >= width(label.text) / 2 && label.at <= 100 - width(label.text) / 2
}

/** Marks of a straight scale in the unit's round steps, a label where `free` has room for it. Units: grams. */
export function scaleTicks(
  fromGrams: number, toGrams: number, unit: MassUnit, place: (grams: number) => number, free: (label: Label) => boolean,
): BeamTick[] {
  const gramsPerUnit = exactGrams({ unit: unit === 'kg' ? 'kg' : 'lb', value: 1 })
  const span = (toGrams - fromGrams) / gramsPerUnit
  const step = STEPS.find(size => span / size <= MOST_LABELS) ?? STEPS.at(-1)!
  // Counted in tenths of the step, so that no sum of decimals drifts.
  const first = Math.ceil(fromGrams / gramsPerUnit / step * 10)
  const last = Math.floor(toGrams / gramsPerUnit / step * 10)
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => {
    const tenth = first + index
    const at = place(tenth / 10 * step * gramsPerUnit)
    const size = tenth % 10 === 0 ? 'major' : tenth % 5 === 0 ? 'middle' : 'minor'
    const text = String(tenth / 10 * step)
    return { at, size, label: size === 'major' && free({ at, text }) ? text : null }
  })
}

import type { Condition } from '../capacity/types'
import { isDay, type Day } from '../quantity/day'
import { parseFigure } from '../quantity/figure'
import { readingGrams, type MassReading } from '../quantity/mass'
import { SPECS } from '../requalification/specs'
import { amountText, readAmount } from './amountEntry'
import type { Fault } from './priceTyped'
import type { ReclaimerTerms } from './terms'

/** The conditions in which a named refrigerant may be taken; mixed contents are a term of their own. */
export const TAKEN_CONDITIONS = ['clean', 'suspect', 'burnt', 'unknown'] as const satisfies readonly Condition[]

/** Terms as they are typed: empty texts are nothing said. */
export interface TermsTyped {
  fromDay: string
  refrigerants: { designation: string, conditions: Record<(typeof TAKEN_CONDITIONS)[number], boolean> }[]
  takesMixed: boolean
  takesUnknown: boolean
  takesOverdue: boolean
  /** Apart by commas or spaces, as are the pressures. */
  specs: string
  pressures: string
  contamination: string
  minimum: string
  minimumUnit: 'lb' | 'kg'
  minimumCylinders: string
  pickUp: string
  note: string
}

/** The fields filled with terms, or empty. */
export function typedTerms(terms: ReclaimerTerms | null, fromDay: Day): TermsTyped {
  return {
    fromDay,
    refrigerants: terms?.refrigerants.map(({ designation, conditions }) => takenRow(designation, conditions)) ?? [],
    takesMixed: terms?.takesMixed ?? false,
    takesUnknown: terms?.takesUnknown ?? false,
    takesOverdue: terms?.takesOverdue ?? false,
    specs: terms?.specs?.join(', ') ?? '',
    pressures: terms?.pressuresPsig?.join(', ') ?? '',
    contamination: figureText(terms?.mostContaminationPercent ?? null),
    ...minimumTyped(terms?.minimum ?? null),
    minimumCylinders: figureText(terms?.minimumCylinders ?? null),
    pickUp: terms?.pickUpCents == null ? '' : amountText(terms.pickUpCents, 2),
    note: terms?.note ?? '',
  }
}

/** A refrigerant among those taken, at first clean and suspect. */
export function takenRow(designation: string, conditions: readonly Condition[] = ['clean', 'suspect']): TermsTyped['refrigerants'][number] {
  const ticks = Object.fromEntries(TAKEN_CONDITIONS.map(one => [one, conditions.includes(one)]))
  return { designation, conditions: ticks as TermsTyped['refrigerants'][number]['conditions'] }
}

/** Reads terms from their fields, or says beside each what is wrong. */
export function readTerms(typed: TermsTyped): { fromDay: Day, terms: ReclaimerTerms, faults: [] } | { terms: null, faults: Fault[] } {
  const faults: Fault[] = []
  const wrong = (path: string, message: string) => {
    faults.push({ path, message })
    return null
  }
  if (!isDay(typed.fromDay)) wrong('fromDay', 'Give the day from which it holds.')
  const refrigerants = typed.refrigerants.map(({ designation, conditions }) => {
    const taken = TAKEN_CONDITIONS.filter(one => conditions[one])
    if (taken.length === 0) wrong('terms.refrigerants', `Say in which condition ${designation} is taken, or take it off the list.`)
    return { designation, conditions: taken as Condition[] }
  })
  const terms: ReclaimerTerms = {
    refrigerants,
    takesMixed: typed.takesMixed,
    takesUnknown: typed.takesUnknown,
    takesOverdue: typed.takesOverdue,
    specs: specsOf(typed.specs, wrong),
    pressuresPsig: pressuresOf(typed.pressures, wrong),
    mostContaminationPercent: percentOf(typed.contamination, wrong),
    minimum: minimumOf(typed, wrong),
    minimumCylinders: cylindersOf(typed.minimumCylinders, wrong),
    pickUpCents: centsOf(typed.pickUp, wrong),
    note: typed.note.trim() || null,
  }
  return faults.length > 0 ? { terms: null, faults } : { fromDay: typed.fromDay, terms, faults: [] }
}

type Wrong = (path: string, message: string) => null

function specsOf(text: string, wrong: Wrong): string[] | null {
  const specs = apart(text).map(name => name.toUpperCase())
  const stray = specs.find(name => !Object.hasOwn(SPECS, name))
  if (stray !== undefined) return wrong('terms.specs', `“${stray}” is no specification that a collar is stamped with. Write them such as DOT-4BA, DOT-4BW.`)
  return specs.length === 0 ? null : [...new Set(specs)]
}

function pressuresOf(text: string, wrong: Wrong): number[] | null {
  const pressures = apart(text)
  const stray = pressures.find(one => !/^[1-9]\d{1,3}$/.test(one))
  if (stray !== undefined) return wrong('terms.pressuresPsig', `“${stray}” is no service pressure. Write them in psig, such as 260, 350, 400.`)
  return pressures.length === 0 ? null : [...new Set(pressures.map(Number))]
}

function percentOf(text: string, wrong: Wrong): number | null {
  const parsed = parseFigure(text)
  if ('error' in parsed) return parsed.error === 'empty' ? null : wrong('terms.mostContaminationPercent', 'A percentage, such as 2.5; empty where no limit was said.')
  return parsed.value <= 100 ? parsed.value : wrong('terms.mostContaminationPercent', 'At most 100 %.')
}

function minimumOf({ minimum, minimumUnit: unit }: TermsTyped, wrong: Wrong): MassReading | null {
  const parsed = parseFigure(minimum)
  if ('error' in parsed) {
    if (parsed.error === 'empty') return null
    return wrong('terms.minimum', `“${minimum.trim()}” is not a weight that can be read in one way. Write figures, such as 500.`)
  }
  if (readingGrams({ unit, value: parsed.value }) === 0) return wrong('terms.minimum', 'More than nothing; empty where there is no minimum.')
  return parsed.value <= 50_000 ? { unit, value: parsed.value } : wrong('terms.minimum', 'At most 50,000. Look at the figure again.')
}

function cylindersOf(text: string, wrong: Wrong): number | null {
  if (text.trim() === '') return null
  return /^[1-9]\d{0,3}$/.test(text.trim()) ? Number(text) : wrong('terms.minimumCylinders', 'A whole number from 1 to 9999; empty where there is no minimum.')
}

function centsOf(text: string, wrong: Wrong): number | null {
  const amount = readAmount(text, 2)
  if ('parts' in amount) return amount.parts <= 100_000_000 ? amount.parts : wrong('terms.pickUpCents', 'At most 1,000,000. Look at the figure again.')
  return amount.isEmpty ? null : wrong('terms.pickUpCents', amount.reason)
}

function minimumTyped(minimum: MassReading | null): Pick<TermsTyped, 'minimum' | 'minimumUnit'> {
  if (minimum === null) return { minimum: '', minimumUnit: 'lb' }
  if (minimum.unit === 'lb-oz') return { minimum: String(minimum.lb + minimum.oz / 16), minimumUnit: 'lb' }
  return { minimum: String(minimum.value), minimumUnit: minimum.unit }
}

function figureText(value: number | null): string {
  return value === null ? '' : String(value)
}

function apart(text: string): string[] {
  return text.split(/[\s,;]+/).filter(word => word !== '')
}

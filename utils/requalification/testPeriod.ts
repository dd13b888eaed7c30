import { compareMonths, type Month } from '../quantity/month'
import { CHOICE_TERMS, type ChoiceParagraph, type OwnerChoice, type RetestRules } from './ownerChoice'
import { SPECS } from './specs'

/**
 * What a period begins with: the making, or a test of a kind. 'starred' is a volumetric test with the star of
 * 49 CFR 180.209(b), 'examination' one by sound or current in its place.
 */
export type Beginning = 'made' | 'volumetric' | 'starred' | 'proof' | 'visual' | 'examination'

/** What of a cylinder decides whether a paragraph covers it. */
export type Steel = {
  spec: string
  madeMonth: Month | null
  /** null where the stamp does not tell it. */
  waterCapacityGrams: number | null
  service: Service
}

/** What a cylinder is used for, as far as the log tells. */
export type Service = {
  /** Whether it is the contractor's own: of another's nobody here knows what else it was used for, nor chooses its owner's period. */
  isOwn: boolean
  dedicatedTo: string | null
  /** Every refrigerant known to be in it. */
  holds: readonly string[]
  /** Burnt refrigerant (oil, acid) was in it at any time: then it was not used for clean gas alone. */
  hasHeldBurnt: boolean
}

/** How long a period is, and by whose choice. */
export type TestPeriod = {
  months: number
  /** null = the shortest of the specification. */
  choice: OwnerChoice | null
  /** The owner's own setting cut it, or gave it to a special permit. */
  isOwnMonths: boolean
}

const SPECIAL_PERMIT = 'DOT-SP'
const FIRST_MONTH_OF_STAR = '1946-01'
// 49 CFR 180.209(b)(1): a water capacity of 125 lb (56.7 kg) or less. 1 lb = 453.59237 g exactly.
const MOST_WATER_OF_STAR_GRAMS = 125 * 453.59237
// An acetylene shell (specification 8) is tested by pressure and marked S, 49 CFR 180.213; a special permit says for itself.
const PROOF_SUFFICES: readonly string[] = ['DOT-8', 'DOT-8AL', 'DOT-SP']
// The 700 series: inorganic, by the numbering of ASHRAE 34.
const INORGANIC = /^R-7\d\d/
const AMMONIA = 'R-717'

// Months by paragraph and by what the period begins with; a beginning that is not named is none by that paragraph.
const CHOSEN_MONTHS: Readonly<Record<ChoiceParagraph, Partial<Record<Beginning, number>>>> = {
  '180.209(b)': { starred: 120 },
  '180.209(e)': { made: 144, volumetric: 144, starred: 144, proof: 120 },
  '180.209(g)': { visual: 60 },
  '180.209(h)': { made: 120, volumetric: 120, starred: 120 },
}

/**
 * The period that begins with a test or with the making, or null where that begins none.
 *
 * Without a choice the shortest period of the specification counts, and only after a volumetric test: recovered
 * refrigerant is not proved free of corroding components, and a proof pressure test or an outside look stands in for the
 * volumetric test only by the paragraphs that an owner chooses.
 *
 * Source: 49 CFR 180.205(g), 180.209(a) Table 1, (b), (e), (g), (h).
 */
export function testPeriod(beginning: Beginning, month: Month, steel: Steel, rules: RetestRules): TestPeriod | null {
  const months = standsAlone(beginning, steel.spec) ? regularMonths(steel.spec, rules) : null
  let period: TestPeriod | null = months === null ? null : { months, choice: null, isOwnMonths: steel.spec === SPECIAL_PERMIT }
  for (const choice of rules.ownerChoices) {
    const chosen = CHOSEN_MONTHS[choice.paragraph][beginning]
    if (chosen === undefined || !covers(choice, month, steel)) continue
    if (period === null || chosen > period.months) period = { months: chosen, choice, isOwnMonths: false }
  }
  return period !== null && isCut(period.months, rules) ? { ...period, months: rules.intervalMonths!, isOwnMonths: true } : period
}

/** The months that a test holds without any choice of the owner's, or null where the specification has no period that is known. */
export function shortestMonths(spec: string, rules: RetestRules): number | null {
  const months = regularMonths(spec, rules)
  return months !== null && isCut(months, rules) ? rules.intervalMonths : months
}

function isCut(months: number, { intervalMonths }: RetestRules): boolean {
  return intervalMonths !== null && intervalMonths > 0 && intervalMonths < months
}

function regularMonths(spec: string, { intervalMonths }: RetestRules): number | null {
  if (spec !== SPECIAL_PERMIT) return SPECS[spec]?.months ?? null
  return intervalMonths !== null && intervalMonths > 0 ? intervalMonths : null
}

/** Whether a beginning counts without a choice of the owner's. */
function standsAlone(beginning: Beginning, spec: string): boolean {
  return beginning !== 'visual' && (beginning !== 'proof' || PROOF_SUFFICES.includes(spec))
}

/** Whether an owner's choice covers a period of a cylinder that begins in a month. */
function covers({ paragraph, from }: OwnerChoice, month: Month, steel: Steel): boolean {
  if (!CHOICE_TERMS[paragraph].specs.includes(steel.spec)) return false
  return (from === null || compareMonths(month, from) >= 0) && isInService(paragraph, steel)
}

function isInService(paragraph: ChoiceParagraph, { service, madeMonth, waterCapacityGrams }: Steel): boolean {
  const { isOwn, dedicatedTo, holds, hasHeldBurnt } = service
  if (!isOwn || hasHeldBurnt) return false
  if (paragraph === '180.209(h)') return dedicatedTo === AMMONIA && holds.every(name => name === AMMONIA)
  if ([dedicatedTo ?? '', ...holds].some(name => INORGANIC.test(name))) return false
  if (paragraph !== '180.209(b)') return true
  return madeMonth !== null && compareMonths(madeMonth, FIRST_MONTH_OF_STAR) >= 0
    && waterCapacityGrams !== null && waterCapacityGrams <= MOST_WATER_OF_STAR_GRAMS
}

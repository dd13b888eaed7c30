import { CONDITION_WORDS } from '../custody/words'
import { formatReading } from '../quantity/mass'
import { formatMoney } from './price'
import type { ReclaimerTerms } from './terms'

/** A term and what was said of it; null where nothing was. */
export interface TermLine { term: string, value: string | null, reason?: string }

/** What a reclaimer takes beside its list of refrigerants, a line for each term. */
export function termLines(terms: ReclaimerTerms): TermLine[] {
  const unsaid = { reason: 'not said' }
  return [
    { term: 'Mixed contents', value: taken(terms.takesMixed) },
    { term: 'Contents nobody has named', value: taken(terms.takesUnknown) },
    { term: 'Past the retest date', value: taken(terms.takesOverdue) },
    { term: 'Other refrigerants in it', value: terms.mostContaminationPercent === null ? null : `at most ${terms.mostContaminationPercent} %`, ...unsaid },
    { term: 'Specifications', value: terms.specs?.join(', ') ?? 'any' },
    { term: 'Service pressures', value: terms.pressuresPsig ? `${terms.pressuresPsig.join(', ')} psig` : 'any' },
    { term: 'Fetches from', value: minimumWords(terms) },
    { term: 'A pick-up costs', value: pickUpWords(terms), ...unsaid },
  ]
}

/** From how much on a reclaimer fetches. */
export function minimumWords({ minimum, minimumCylinders }: Pick<ReclaimerTerms, 'minimum' | 'minimumCylinders'>): string {
  const asked = [
    ...(minimum === null ? [] : [`${formatReading(minimum)} net`]),
    ...(minimumCylinders === null ? [] : [`${minimumCylinders} ${minimumCylinders === 1 ? 'cylinder' : 'cylinders'}`]),
  ]
  return asked.length === 0 ? 'any amount' : asked.join(' and ')
}

/** The refrigerants a reclaimer takes, in short. @example refrigerantWords(terms) // 'R-22 (clean, suspect), R-134a (clean)' */
export function refrigerantWords({ refrigerants }: Pick<ReclaimerTerms, 'refrigerants'>): string {
  return refrigerants.map(({ designation, conditions }) => `${designation} (${conditions.map(one => CONDITION_WORDS[one]).join(', ')})`).join(', ') || 'none by name'
}

/** The terms in one line, for a history. */
export function termsInShort(terms: ReclaimerTerms): string {
  const more = [
    ...(terms.takesMixed ? ['mixed'] : []), ...(terms.takesUnknown ? ['unnamed'] : []), ...(terms.takesOverdue ? ['past the retest date'] : []),
    ...(terms.specs ? [terms.specs.join(', ')] : []), ...(terms.pressuresPsig ? [`${terms.pressuresPsig.join(', ')} psig`] : []),
    ...(terms.mostContaminationPercent === null ? [] : [`others at most ${terms.mostContaminationPercent} %`]),
  ]
  return [refrigerantWords(terms), ...more, `from ${minimumWords(terms)}`, ...(terms.pickUpCents === null ? [] : [`pick-up ${pickUpWords(terms)}`])].join('; ')
}

function pickUpWords({ pickUpCents }: Pick<ReclaimerTerms, 'pickUpCents'>): string | null {
  if (pickUpCents === null) return null
  return pickUpCents === 0 ? 'nothing' : formatMoney(pickUpCents)
}

function taken(isTaken: boolean): string {
  return isTaken ? 'taken' : 'not taken'
}

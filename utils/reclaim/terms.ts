import type { CylinderView } from '../custody/cylinderView'
import type { Condition } from '../capacity/types'
import type { Finding } from '../custody/finding'
import { notShippable } from '../custody/findings/record'
import type { Planned } from '../custody/plan'
import { CONDITION_WORDS } from '../custody/words'
import type { MassReading } from '../quantity/mass'

/** A refrigerant that a reclaimer takes, and in which conditions; mixed contents are a term of their own. */
export interface TakenRefrigerant { designation: string, conditions: Condition[] }

/** What a reclaimer takes and from how much on, as it told us. */
export interface ReclaimerTerms {
  refrigerants: TakenRefrigerant[]
  takesMixed: boolean
  /** Contents whose refrigerant nobody has named. */
  takesUnknown: boolean
  /** Cylinders past their retest, or without a known test date. */
  takesOverdue: boolean
  /** Specifications of cylinders; null = any. */
  specs: string[] | null
  /** Service pressures; null = any. */
  pressuresPsig: number[] | null
  /** Of other refrigerants by mass, as analysed; null = no limit was said. */
  mostContaminationPercent: number | null
  /** From how much net on it fetches; where both minimums are given, both must be reached. */
  minimum: MassReading | null
  minimumCylinders: number | null
  /** What a pick-up costs, in cents; null = not known, 0 = nothing. */
  pickUpCents: number | null
  note: string | null
}

/** What of a cylinder and its contents a reclaimer's terms are about. */
export interface Offered {
  refrigerant: string | null
  condition: Condition
  nothingInIt: boolean
  spec: string | null
  servicePressurePsig: number | null
  retest: CylinderView['requalification']['state']
  /** Of other refrigerants by the last analysis; null = never analysed; left out where nobody looked. */
  contaminationPercent?: number | null
}

/** Where a refusal by a reclaimer's terms comes from. */
export const TERMS_SOURCE = 'what the reclaimer takes, as recorded'

/**
 * Why a reclaimer would not take a cylinder: one finding for each reason, none where it would.
 *
 * Terms that nobody recorded (null) are a reason of their own: what it takes is then not known.
 */
export function refusedBy(terms: ReclaimerTerms | null, view: Planned, contaminationPercent?: number | null): Finding[] {
  return refusals(terms, {
    refrigerant: view.contents.refrigerant,
    condition: view.contents.condition,
    nothingInIt: view.contents.nothingInIt,
    spec: view.stamp?.spec ?? null,
    servicePressurePsig: view.stamp?.servicePressurePsig ?? null,
    retest: view.requalification.state,
    contaminationPercent,
  })
}

/** The same as {@link refusedBy}, of no more than what the terms are about. */
export function refusals(terms: ReclaimerTerms | null, offered: Offered): Finding[] {
  if (terms === null) return [refusal('What this reclaimer takes is not recorded. Ask it, and record its terms first.')]
  return [
    ...(offered.nothingInIt ? [] : [contentsRefused(terms, offered), contaminationRefused(terms, offered)]),
    overdueRefused(terms, offered),
    specRefused(terms, offered),
    pressureRefused(terms, offered),
  ].filter(because => because !== null).map(refusal)
}

function contentsRefused(terms: ReclaimerTerms, { refrigerant, condition }: Offered): string | null {
  if (condition === 'mixed') return terms.takesMixed ? null : 'The reclaimer does not take mixed contents.'
  if (refrigerant === null) return terms.takesUnknown ? null : 'The reclaimer does not take contents that nobody has named. Have them analysed first.'
  const taken = terms.refrigerants.find(({ designation }) => designation === refrigerant)
  if (!taken) return `The reclaimer does not take ${refrigerant}.`
  if (taken.conditions.includes(condition)) return null
  return `The reclaimer takes ${refrigerant} only ${inWords(taken.conditions.map(one => CONDITION_WORDS[one]))}; by the log this is ${CONDITION_WORDS[condition]}.`
}

function contaminationRefused({ mostContaminationPercent: most, takesMixed }: ReclaimerTerms, { condition, contaminationPercent: share }: Offered): string | null {
  if (most === null || share === undefined) return null
  if (share === null) {
    return condition === 'mixed' && takesMixed ? `The reclaimer takes at most ${most} % of other refrigerants; how much this holds was never analysed.` : null
  }
  return share > most ? `The reclaimer takes at most ${most} % of other refrigerants; by its last analysis this holds ${share} %.` : null
}

function overdueRefused({ takesOverdue }: ReclaimerTerms, { retest }: Offered): string | null {
  if (takesOverdue) return null
  if (retest === 'overdue') return 'The reclaimer does not take cylinders past their retest date.'
  return retest === 'unknown' ? 'The reclaimer does not take cylinders past their retest date, and no test date of this one is known.' : null
}

function specRefused({ specs }: ReclaimerTerms, { spec }: Offered): string | null {
  if (specs === null || (spec !== null && specs.includes(spec))) return null
  return `The reclaimer takes ${inWords(specs)} only; ${spec === null ? 'what this one is stamped with is not recorded' : `this is a ${spec}`}.`
}

function pressureRefused({ pressuresPsig }: ReclaimerTerms, { servicePressurePsig: own }: Offered): string | null {
  if (pressuresPsig === null || (own !== null && pressuresPsig.includes(own))) return null
  return `The reclaimer takes service pressures of ${inWords(pressuresPsig.map(String))} psig only; ${own === null ? 'that of this one is not recorded' : `this one has ${own} psig`}.`
}

function refusal(because: string): Finding {
  return notShippable(because, TERMS_SOURCE)
}

function inWords(words: readonly string[]): string {
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} or ${words.at(-1)}`
}

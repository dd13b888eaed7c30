import { settlementCredit } from './credit'
import { fourWeights } from './fourWeights'
import type { SettlementFigures } from './figures'

/** What can be argued about with a reclaimer. */
export const DISPUTE_SUBJECTS = ['gross', 'net', 'grade', 'credit', 'missing', 'unexpected', 'total'] as const
export type DisputeSubject = (typeof DISPUTE_SUBJECTS)[number]

/** How a dispute ended. */
export const DISPUTE_OUTCOMES = ['theirs-accepted', 'ours-accepted', 'agreed', 'no-difference'] as const
export type DisputeOutcome = (typeof DISPUTE_OUTCOMES)[number]

/** A difference that the figures themselves show. */
export interface Difference {
  about: DisputeSubject
  /** null where it is about the whole statement. */
  cylinderId: string | null
  /** By how much: grams, cents, or the serials that came unexpectedly. Another measure is another difference. */
  measure: string
}

/** What is known of a dispute to say what the figures do to it. */
export interface DisputeState {
  id: string
  about: DisputeSubject
  cylinderId: string | null
  /** Nobody opened it: the figures did. */
  isByFigures: boolean
  isOpen: boolean
  /** By how much the figures differed as it ended last; null where it never has, or they did not. */
  endedMeasure: string | null
}

/** What a change of the figures does to the disputes of a shipment. */
export interface DisputeChanges {
  open: Difference[]
  /** Ended ones whose difference is another now. */
  reopen: { id: string, difference: Difference }[]
  /** Those that the figures had opened and that they do not show any more. */
  end: string[]
}

/**
 * Every difference that opens a dispute by itself: a weight beyond what both scales may be off, a line that did not
 * arrive, cylinders that nobody sent, and any cent between what the statement credits and what its own figures give.
 * A grade is argued about only by people.
 */
export function differencesOf(settlement: SettlementFigures): Difference[] {
  const credit = settlementCredit(settlement)
  const creditOf = new Map(credit.lines.map(line => [line.cylinderId, line]))
  const ofLines = settlement.lines.flatMap(({ cylinderId, sent, figures }): Difference[] => {
    const found = (about: DisputeSubject, measure: number | string): Difference => ({ about, cylinderId, measure: String(measure) })
    const { gross, net } = fourWeights(sent, figures)
    const cents = creditOf.get(cylinderId)?.differenceCents ?? 0
    return [
      ...gross?.isBeyond ? [found('gross', gross.grams)] : [],
      ...net?.isBeyond ? [found('net', net.grams)] : [],
      ...cents !== 0 ? [found('credit', cents)] : [],
      ...figures.outcome === 'not-arrived' ? [found('missing', '')] : [],
    ]
  })
  const { unexpected } = settlement
  return [
    ...ofLines,
    ...unexpected.length > 0 ? [{ about: 'unexpected' as const, cylinderId: null, measure: [...unexpected].sort().join(', ') }] : [],
    ...credit.differenceCents ? [{ about: 'total' as const, cylinderId: null, measure: String(credit.differenceCents) }] : [],
  ]
}

/**
 * What the figures do to the disputes: a difference that nobody argues about opens one; an ended one is opened again where
 * its difference is not the one that was settled; one that nobody but the figures opened ends with its difference.
 */
export function disputeChanges(disputes: readonly DisputeState[], differences: readonly Difference[]): DisputeChanges {
  const shown = new Set(differences.map(keyOf))
  const changes: DisputeChanges = { open: [], reopen: [], end: [] }
  for (const difference of differences) {
    const about = disputes.filter(dispute => keyOf(dispute) === keyOf(difference))
    const latest = about.at(-1)
    if (!latest) changes.open.push(difference)
    else if (about.every(({ isOpen }) => !isOpen) && about.every(({ endedMeasure }) => endedMeasure !== difference.measure)) changes.reopen.push({ id: latest.id, difference })
  }
  changes.end = disputes.filter(dispute => dispute.isOpen && dispute.isByFigures && !shown.has(keyOf(dispute))).map(({ id }) => id)
  return changes
}

function keyOf({ about, cylinderId }: Pick<Difference, 'about' | 'cylinderId'>): string {
  return `${about} ${cylinderId ?? ''}`
}

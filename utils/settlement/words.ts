import type { DisputeOutcome, DisputeSubject } from './dispute'
import type { LineFigures, LineOutcome } from './figures'

/** What became of a cylinder, in words. */
export const OUTCOME_WORDS: Record<LineOutcome, string> = { 'taken-over': 'Taken over', 'sent-back': 'Sent back', 'not-arrived': 'Did not arrive' }

/** What a dispute is about, in words. */
export const SUBJECT_WORDS: Record<DisputeSubject, string> = {
  gross: 'Gross weight', net: 'Net weight', grade: 'Grade', credit: 'Credit of a line', missing: 'Did not arrive', unexpected: 'Cylinders nobody sent', total: 'Total of the statement',
}

/** How a dispute ended, in words. */
export const DISPUTE_OUTCOME_WORDS: Record<DisputeOutcome, string> = {
  'theirs-accepted': 'Their figure stands', 'ours-accepted': 'Our figure stands', 'agreed': 'Agreed on something between', 'no-difference': 'No difference after all',
}

/** What each figure of a line is called. */
export const FIGURE_WORDS: Record<keyof LineFigures, string> = {
  theirGross: 'their gross', acceptedNet: 'accepted net', grade: 'grade', rate: 'price', statedCents: 'stated credit', outcome: 'what became of it',
}

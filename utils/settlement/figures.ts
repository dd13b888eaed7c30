import type { MassReading } from '../quantity/mass'
import type { Rate } from '../reclaim/price'

/** What became of a cylinder at the reclaimer. */
export const LINE_OUTCOMES = ['taken-over', 'sent-back', 'not-arrived'] as const
export type LineOutcome = (typeof LINE_OUTCOMES)[number]

/** A line as it left us; null where it left without that being known. */
export interface SentFigures {
  grossGrams: number
  netGrams: number | null
  refrigerant: string | null
  condition: string
}

/** What the reclaimer says of one line, as it was typed; null for what it has not said. */
export interface LineFigures {
  theirGross: MassReading | null
  acceptedNet: MassReading | null
  grade: string | null
  rate: Rate | null
  /** What the statement credits for the line; negative is charged. */
  statedCents: number | null
  outcome: LineOutcome | null
}

/** A line with nothing said of it yet. */
export const NOTHING_SAID: LineFigures = { theirGross: null, acceptedNet: null, grade: null, rate: null, statedCents: null, outcome: null }

/** A fee or another amount beside the lines; negative is charged. */
export interface OtherAmount { what: string, cents: number }

/** What a statement says of the shipment as a whole. */
export interface StatementFigures {
  number: string | null
  /** 'YYYY-MM-DD'. */
  day: string | null
  others: OtherAmount[]
  totalCents: number | null
}

/** A line of the settlement: as it left, and what the reclaimer says of it. */
export interface SettledLine { cylinderId: string, sent: SentFigures | null, figures: LineFigures }

/** A settlement as far as its figures are typed. */
export interface SettlementFigures {
  lines: readonly SettledLine[]
  statement: StatementFigures
  /** What arrived there and stands on no line: serials, as the dock typed them. */
  unexpected: readonly string[]
}

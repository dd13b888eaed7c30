import { creditOfReading } from './creditOfReading'
import type { LineFigures, SettlementFigures } from './figures'

/** What a line is credited, beside what the statement says of it. */
export interface LineCredit {
  cylinderId: string
  /** Rate times accepted net; null where one of them is not known, or the reclaimer did not take it over. */
  cents: number | null
  statedCents: number | null
  /** Stated less computed; null where one of them is not known. */
  differenceCents: number | null
}

/** What a whole settlement comes to. */
export interface SettlementCredit {
  lines: LineCredit[]
  /** Of the lines whose credit is known; null where there are lines, and none is. */
  linesCents: number | null
  /** Lines that were taken over, or of which nothing is said yet, and whose credit is not known. */
  unknownLines: number
  othersCents: number
  /** Lines and other amounts; null while a line's credit is not known. */
  totalCents: number | null
  statedTotalCents: number | null
  /** Stated less computed. */
  differenceCents: number | null
}

/** What one line is credited; null where rate or accepted net is not known, or where it was not taken over. Rounding: to the nearest cent. */
export function lineCreditCents({ outcome, rate, acceptedNet }: LineFigures): number | null {
  if (isOut(outcome) || rate === null || acceptedNet === null) return null
  return creditOfReading(rate, acceptedNet)
}

/** What all lines and the other amounts come to, beside what the statement says. */
export function settlementCredit({ lines, statement }: SettlementFigures): SettlementCredit {
  const credits = lines.map(({ cylinderId, figures }): LineCredit => {
    const cents = lineCreditCents(figures)
    return { cylinderId, cents, statedCents: figures.statedCents, differenceCents: apart(figures.statedCents, cents ?? ofOneThatIsOut(figures)) }
  })
  const unknownLines = lines.filter(({ figures }) => !isOut(figures.outcome) && lineCreditCents(figures) === null).length
  const known = credits.flatMap(({ cents }) => cents ?? [])
  const linesCents = known.length === 0 && unknownLines > 0 ? null : sum(known)
  const othersCents = sum(statement.others.map(({ cents }) => cents))
  const totalCents = unknownLines > 0 ? null : sum(known) + othersCents
  return {
    lines: credits, linesCents, unknownLines, othersCents, totalCents,
    statedTotalCents: statement.totalCents,
    differenceCents: apart(statement.totalCents, totalCents),
  }
}

/** Whether a line has no part in the credit, for the reclaimer does not have its contents. */
function isOut(outcome: LineFigures['outcome']): boolean {
  return outcome === 'sent-back' || outcome === 'not-arrived'
}

/** A statement that credits what was never taken over is off by all of it. */
function ofOneThatIsOut({ outcome }: LineFigures): number | null {
  return isOut(outcome) ? 0 : null
}

function apart(stated: number | null, computed: number | null): number | null {
  return stated === null || computed === null ? null : stated - computed
}

function sum(cents: readonly number[]): number {
  return cents.reduce((total, one) => total + one, 0)
}

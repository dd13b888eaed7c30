import type { SettlementFigures } from './figures'

/** What a settlement still lacks. */
export interface StillMissing {
  /** Lines of which it is not said what became of them: until it is, the shipment cannot be settled. */
  outcome: string[]
  /** Lines taken over without an accepted net, or without a price: their credit is not known. */
  acceptedNet: string[]
  rate: string[]
  /** The statement itself: its number, day or total. */
  statement: ('number' | 'day' | 'total')[]
}

/** What is still missing, by cylinder. Only an outcome holds a settlement up; the rest stays unknown. */
export function stillMissing({ lines, statement }: SettlementFigures): StillMissing {
  const taken = lines.filter(({ figures }) => figures.outcome === 'taken-over')
  return {
    outcome: idsOf(lines.filter(({ figures }) => figures.outcome === null)),
    acceptedNet: idsOf(taken.filter(({ figures }) => figures.acceptedNet === null)),
    rate: idsOf(taken.filter(({ figures }) => figures.rate === null)),
    statement: [
      ...statement.number === null ? ['number' as const] : [],
      ...statement.day === null ? ['day' as const] : [],
      ...statement.totalCents === null ? ['total' as const] : [],
    ],
  }
}

function idsOf(lines: SettlementFigures['lines']): string[] {
  return lines.map(({ cylinderId }) => cylinderId)
}

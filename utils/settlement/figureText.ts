import { formatReading, type MassReading } from '../quantity/mass'
import { formatMoney, formatRate, type Rate } from '../reclaim/price'
import type { LineOutcome } from './figures'
import type { FigureChange } from './statementCsv'
import { FIGURE_WORDS, OUTCOME_WORDS } from './words'

/** What a figure would change from and to, in words. @example changeText(change) // 'accepted net 11.0 lb, before 10.5 lb' */
export function changeText({ field, from, to }: FigureChange): string {
  const before = figureText(field, from)
  return `${FIGURE_WORDS[field]} ${figureText(field, to) ?? 'left out'}${before === null ? '' : `, before ${before}`}`
}

/** What an act changed: the figures of one line, or of how many lines. */
export function changesText(changes: readonly ({ cylinderId: string } & FigureChange)[]): string | null {
  const lines = new Set(changes.map(({ cylinderId }) => cylinderId)).size
  if (lines === 0) return null
  return lines === 1 ? changes.map(changeText).join(', ') : `${changes.length} figures of ${lines} lines`
}

function figureText(field: FigureChange['field'], value: FigureChange['to']): string | null {
  if (value === null) return null
  switch (field) {
    case 'theirGross':
    case 'acceptedNet': return formatReading(value as MassReading)
    case 'rate': return formatRate(value as Rate)
    case 'statedCents': return formatMoney(value as number)
    case 'outcome': return OUTCOME_WORDS[value as LineOutcome].toLowerCase()
    case 'grade': return value as string
  }
}

import { formatReading, type MassReading } from '../quantity/mass'
import type { DisputeOutcome } from '../settlement/dispute'
import { changesText } from '../settlement/figureText'
import { DISPUTE_OUTCOME_WORDS } from '../settlement/words'
import type { ShipmentAct } from './acts'

/** What an act says beside its kind, in words; null where that is all. */
export function actDetail({ details }: Pick<ShipmentAct, 'details'>): string | null {
  const said = [
    ...['gross', 'theirGross', 'acceptedNet'].flatMap(key => isReading(details[key]) ? [formatReading(details[key])] : []),
    ...['grade', 'reason', 'why', 'what', 'because', 'text', 'serial', 'name', 'forWhom'].flatMap(key => isText(details[key]) ? [details[key]] : []),
    ...(Array.isArray(details['changes']) ? [changesText(details['changes'] as Parameters<typeof changesText>[0])].filter(isText) : []),
    ...(isOutcome(details['outcome']) ? [DISPUTE_OUTCOME_WORDS[details['outcome']]] : []),
    ...(typeof details['cylinders'] === 'number' ? [details['cylinders'] === 1 ? '1 cylinder' : `${details['cylinders']} cylinders`] : []),
  ]
  return said.length === 0 ? null : said.join(', ')
}

function isReading(value: unknown): value is MassReading {
  return typeof value === 'object' && value !== null && 'unit' in value
}

function isOutcome(value: unknown): value is DisputeOutcome {
  return typeof value === 'string' && value in DISPUTE_OUTCOME_WORDS
}

function isText(value: unknown): value is string {
  return typeof value === 'string' && value !== ''
}

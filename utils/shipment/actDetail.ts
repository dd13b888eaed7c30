import { formatReading, type MassReading } from '../quantity/mass'
import type { ShipmentAct } from './acts'

/** What an act says beside its kind, in words; null where that is all. */
export function actDetail({ details }: Pick<ShipmentAct, 'details'>): string | null {
  const said = [
    ...['gross', 'theirGross', 'acceptedNet'].flatMap(key => isReading(details[key]) ? [formatReading(details[key])] : []),
    ...['grade', 'reason', 'why', 'what', 'because', 'text', 'serial', 'name', 'forWhom'].flatMap(key => isText(details[key]) ? [details[key]] : []),
    ...(typeof details['cylinders'] === 'number' ? [details['cylinders'] === 1 ? '1 cylinder' : `${details['cylinders']} cylinders`] : []),
  ]
  return said.length === 0 ? null : said.join(', ')
}

function isReading(value: unknown): value is MassReading {
  return typeof value === 'object' && value !== null && 'unit' in value
}

function isText(value: unknown): value is string {
  return typeof value === 'string' && value !== ''
}

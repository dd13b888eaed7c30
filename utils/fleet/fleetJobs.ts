import type { FleetSummary } from '../contract/custody'
import { formatLabelCode } from '../label/code'
import { formatMass, type MassUnit } from '../quantity/mass'

/** One thing that waits in the fleet: a number, a reason and a verb. */
export interface FleetJob {
  code: string
  kind: 'att' | 'stop' | 'unk'
  title: string
  text: string
  verb: string
  /** What the verb does: it shows these cylinders, or begins a shipment. */
  act: 'filter' | 'ship'
  finding: string
}

/**
 * The sentences above the fleet, the most dangerous first; what has nothing in it is left out.
 *
 * Rounding: an excess up, a net to the nearest division.
 */
export function fleetJobs(summary: FleetSummary, unit: MassUnit, mayShip: boolean): FleetJob[] {
  const jobs: (FleetJob | null)[] = [overfilled(summary, unit), full(summary, unit, mayShip), withoutNumber(summary), notSeen(summary)]
  return jobs.filter(job => job !== null)
}

function overfilled({ overfilled: { count, first } }: FleetSummary, unit: MassUnit): FleetJob | null {
  if (count === 0) return null
  const excess = first?.netGrams != null && first.fillLimitGrams !== null ? first.netGrams - first.fillLimitGrams : null
  const by = excess !== null && excess > 0 ? `, ${count === 1 ? '' : 'the first '}by ${formatMass(excess, unit, 'up')}` : ''
  const where = first ? `${[named(first), first.refrigerant, first.place?.name].filter(Boolean).join(', ')}. ` : ''
  return {
    code: 'overfilled', kind: 'stop', act: 'filter', finding: 'overfill',
    title: `${count} overfilled${by}`,
    text: `${where}Keep it cool and off the road until drawn down.`,
    verb: count === 1 ? 'Show it' : `Show the ${count}`,
  }
}

function full({ full: { count, netGrams } }: FleetSummary, unit: MassUnit, mayShip: boolean): FleetJob | null {
  if (count === 0) return null
  return {
    code: 'full', kind: 'att', act: mayShip ? 'ship' : 'filter', finding: 'nearly-full',
    title: `${count} full, ready to ship`,
    text: `${formatMass(netGrams, unit, 'nearest')} net, ${count === 1 ? 'it is' : 'each'} at 90\u00A0% of its limit or more.`,
    verb: mayShip ? 'Prepare a shipment' : count === 1 ? 'Show it' : `Show the ${count}`,
  }
}

function withoutNumber({ withoutNumber: { count } }: FleetSummary): FleetJob | null {
  if (count === 0) return null
  return {
    code: 'without-number', kind: 'unk', act: 'filter', finding: 'weight-not-known',
    title: `${count} without a number`,
    text: 'Not weighed: no room can be given.',
    verb: count === 1 ? 'Show it' : `Show the ${count}`,
  }
}

function notSeen({ notSeen: { count } }: FleetSummary): FleetJob | null {
  if (count === 0) return null
  return {
    code: 'not-seen', kind: 'unk', act: 'filter', finding: 'not-seen',
    title: `${count} not seen lately`,
    text: 'Look for it, or ask who had it last.',
    verb: count === 1 ? 'Show it' : `Show the ${count}`,
  }
}

function named(row: { labelCode: string | null, serial: string | null }): string | null {
  return row.labelCode ? formatLabelCode(row.labelCode) : row.serial
}

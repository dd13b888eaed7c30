import type { InValue } from '@libsql/client'
import type { FleetQuery } from '../../../utils/contract/custody'
import type { DateBounds } from './dateBounds'
import { isOverdue, isSoonOrOverdue, isUnseen, type FleetFilter } from './fleetFilter'

/**
 * A part of the fleet that comes as one in an order: which cylinders, and by which column within it.
 *
 * An order is a row of such stretches, each read along an index of its own, so that a page costs the same in a fleet of
 * any size. Together they hold each cylinder once.
 */
export interface Stretch {
  where: FleetFilter
  /** What of `cylinders c` it goes by, never null here; null where it goes by id alone. */
  by: string | null
}

/** A stretch as it is read for one page: its place among those of its order, and which way. */
export interface ReadStretch extends Stretch { index: number, isDown: boolean }

/** The stretches of an order as they are first, in the order of a list that goes up. */
export function stretchesOf(sort: FleetQuery['sort'], bounds: DateBounds): Stretch[] {
  switch (sort) {
    case 'urgency': return byUrgency(bounds)
    case 'code': return byColumn('c.label_code')
    case 'serial': return byColumn('c.serial')
    case 'refrigerant': return byColumn('c.refrigerant')
    case 'condition': return byColumn('c.condition')
    case 'lifecycle': return byColumn('c.lifecycle')
    case 'net': return byColumn('c.net_grams')
    case 'room': return byColumnInDate('c.room_grams', bounds)
    case 'stop': return byColumnInDate('c.stop_weight_grams', bounds)
    case 'due': return byColumn('c.due_month')
    case 'last-event': return byColumn('c.last_event_at')
    case 'place': return [
      { where: when('c.place_id IS NOT NULL'), by: '(SELECT p.name FROM places p WHERE p.id = c.place_id)' },
      { where: when('c.place_id IS NULL'), by: null },
    ]
  }
}

/**
 * The stretches in the order in which they are read. What is not known stands last whichever way a column goes; only the
 * order by urgency turns round wholly.
 */
export function readingOrder(sort: FleetQuery['sort'], order: FleetQuery['order'], isBackward: boolean, bounds: DateBounds): ReadStretch[] {
  const isDown = order === 'desc'
  const shown = stretchesOf(sort, bounds).map((stretch, index) => ({ ...stretch, index, isDown }))
  if (isDown && sort === 'urgency') shown.reverse()
  return isBackward ? shown.reverse().map(stretch => ({ ...stretch, isDown: !stretch.isDown })) : shown
}

function byColumn(column: string): Stretch[] {
  return [{ where: when(`${column} IS NOT NULL`), by: column }, { where: when(`${column} IS NULL`), by: null }]
}

/** A column that a row shows only while its cylinder is in date. */
function byColumnInDate(column: string, bounds: DateBounds): Stretch[] {
  const late = 'c.due_month < ?'
  return [
    { where: when(`${column} IS NOT NULL AND (${late}) IS NOT TRUE`, bounds.thisMonth), by: column },
    { where: when(`${column} IS NULL OR ${late}`, bounds.thisMonth), by: null },
  ]
}

/**
 * Stops first, then empty cylinders late for their test, cautions, tests late or soon due, cylinders unseen, those without
 * a number, and the rest: by the same dates as a row's worst finding.
 *
 * A plus before a column keeps the planner from reading along that column's index.
 */
function byUrgency(bounds: DateBounds): Stretch[] {
  const lateAndEmpty = isOverdue(bounds, 'c.nothing_in_it = 1')
  const dueSoon = isSoonOrOverdue(bounds)
  const unseen = isUnseen(bounds)
  const noNumber = when('c.net_grams IS NULL AND c.nothing_in_it = 0')
  return [
    { where: when('c.severity = 2'), by: null },
    { where: all(when('+c.severity < 2'), lateAndEmpty), by: 'c.due_month' },
    { where: all(when('c.severity = 1'), not(lateAndEmpty)), by: null },
    { where: all(when('+c.severity = 0'), dueSoon, not(lateAndEmpty)), by: 'c.due_month' },
    { where: all(when('+c.severity = 0'), unseen, not(dueSoon)), by: 'c.last_seen_at' },
    { where: all(when('+c.severity = 0'), noNumber, not(dueSoon), not(unseen)), by: null },
    { where: all(when('c.severity = 0'), not(noNumber), not(dueSoon), not(unseen)), by: null },
  ]
}

function when(sql: string, ...args: InValue[]): FleetFilter {
  return { sql, args }
}

function not({ sql, args }: FleetFilter): FleetFilter {
  return { sql: `(${sql}) IS NOT TRUE`, args }
}

function all(...filters: FleetFilter[]): FleetFilter {
  return { sql: filters.map(one => `(${one.sql})`).join(' AND '), args: filters.flatMap(one => one.args) }
}

import type { InValue } from '@libsql/client'
import type { FleetQuery } from '../../../utils/contract/custody'
import { normaliseLabelCode } from '../../../utils/label/code'
import type { DateBounds } from './dateBounds'

/** A condition over `cylinders c` and `places p`. */
export interface FleetFilter { sql: string, args: InValue[] }

const ENDED = `('condemned', 'retired')`
const AWAY_OR_ENDED = `('missing', 'at-reclaim', 'at-test', 'condemned', 'retired')`

/** The filters of a fleet query as one condition. Dates are compared with cached columns, never computed in SQL. */
export function fleetFilter(query: Partial<FleetQuery>, bounds: DateBounds): FleetFilter {
  const all: FleetFilter[] = []
  const when = (sql: string, ...args: InValue[]) => all.push({ sql, args })
  if (query.place) when('(c.place_id = ? OR p.parent_id = ?)', query.place, query.place)
  if (query.holder) when('c.holder_id = ?', query.holder)
  if (query.refrigerant) when('c.refrigerant = ?', query.refrigerant)
  if (query.condition) when('c.condition = ?', query.condition)
  if (query.lifecycle) when('c.lifecycle = ?', query.lifecycle)
  if (query.dueBefore) when(`c.retest_state = 'dated' AND c.due_month < ? AND c.lifecycle NOT IN ${ENDED}`, query.dueBefore)
  if (query.owner) when('c.owner_id = ?', query.owner)
  if (query.label) when('c.label_code = ?', normaliseLabelCode(query.label) ?? query.label)
  if (query.finding) all.push(findingFilter(query.finding, bounds))
  if (query.q) all.push(searchFilter(query.q))
  if (all.length === 0) return { sql: '1', args: [] }
  return { sql: all.map(one => `(${one.sql})`).join(' AND '), args: all.flatMap(one => one.args) }
}

/** Cylinders on which a finding stands today; 'stop' and 'caution' stand for any of that severity. */
export function findingFilter(code: string, bounds: DateBounds): FleetFilter {
  const overdue: FleetFilter = { sql: `c.retest_state = 'dated' AND c.due_month < ? AND c.lifecycle NOT IN ${ENDED}`, args: [bounds.thisMonth] }
  const soon: FleetFilter = {
    sql: `c.retest_state = 'dated' AND c.due_month >= ? AND c.due_month <= ? AND c.lifecycle NOT IN ${ENDED}`,
    args: [bounds.thisMonth, bounds.lastSoonMonth],
  }
  const notSeen: FleetFilter = { sql: `c.last_seen_at < ? AND c.lifecycle NOT IN ${AWAY_OR_ENDED}`, args: [bounds.notSeenBefore] }
  switch (code) {
    case 'retest-overdue': return overdue
    case 'retest-soon': return soon
    case 'not-seen': return notSeen
    case 'stop': return either({ sql: 'c.severity = 2', args: [] }, { sql: `${overdue.sql} AND c.nothing_in_it = 1`, args: overdue.args })
    case 'caution': return either({ sql: 'c.severity >= 1', args: [] }, overdue, soon, notSeen)
    default: return { sql: 'c.finding_codes LIKE ?', args: [`% ${code.replace(/[%_]/g, '')} %`] }
  }
}

function either(...filters: FleetFilter[]): FleetFilter {
  return { sql: filters.map(one => `(${one.sql})`).join(' OR '), args: filters.flatMap(one => one.args) }
}

/** By part of a code, of a serial, of a refrigerant or of a place's name. */
function searchFilter(text: string): FleetFilter {
  const words = `%${text.replace(/[\\%_]/g, match => `\\${match}`)}%`
  const squeezed = `%${text.replace(/[\s-]/g, '').replace(/[\\%_]/g, match => `\\${match}`)}%`
  return {
    sql: `c.label_code LIKE ? ESCAPE '\\' OR c.serial LIKE ? ESCAPE '\\' OR c.refrigerant LIKE ? ESCAPE '\\' OR p.name LIKE ? ESCAPE '\\'`,
    args: [squeezed, words, words, words],
  }
}

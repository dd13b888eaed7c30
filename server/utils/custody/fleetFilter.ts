import type { InValue } from '@libsql/client'
import type { FleetQuery } from '../../../utils/contract/custody'
import { normaliseLabelCode, readAsSymbols } from '../../../utils/label/code'
import type { DateBounds } from './dateBounds'

/** A condition over `cylinders c`. */
export interface FleetFilter { sql: string, args: InValue[] }

/** A place and all that stands within it. */
const WITHIN = 'WITH RECURSIVE inside (id) AS (VALUES (?) UNION SELECT p.id FROM places p JOIN inside ON p.parent_id = inside.id) SELECT id FROM inside'

/** What is the fleet's: what was given away in an exchange is no more. The plus keeps a page from being read along that column's index. */
export const IN_FLEET = '+c.given_away = 0'

const ENDED = `('condemned', 'retired')`
const AWAY_OR_ENDED = `('missing', 'at-reclaim', 'at-test', 'condemned', 'retired')`

/**
 * The filters of a fleet query as one condition. Dates are compared with cached columns, never computed in SQL.
 *
 * What was given away in an exchange comes only where it is asked for: by that, by what is written on it, or by the firm
 * or the place that has it.
 */
export function fleetFilter(query: Partial<FleetQuery>, bounds: DateBounds): FleetFilter {
  const all: FleetFilter[] = []
  const when = (sql: string, ...args: InValue[]) => all.push({ sql, args })
  if (query.place) when(`c.place_id IN (${WITHIN})`, query.place)
  if (query.holder) when('c.holder_id = ?', query.holder)
  if (query.refrigerant) when('c.refrigerant = ?', query.refrigerant)
  if (query.condition) when('c.condition = ?', query.condition)
  if (query.lifecycle === 'given-away') when('c.given_away = 1')
  else if (query.lifecycle) when('c.lifecycle = ?', query.lifecycle)
  if (query.dueBefore) when(dueUntil('<'), query.dueBefore)
  if (query.owner) when('c.owner_id = ?', query.owner)
  if (query.label) when('c.label_code = ?', normaliseLabelCode(query.label) ?? query.label)
  if (query.finding) all.push(findingFilter(query.finding, bounds))
  if (query.q) all.push(searchFilter(query.q))
  if (!isAskedForByName(query) && query.lifecycle !== 'given-away') when(IN_FLEET)
  if (all.length === 0) return { sql: '1', args: [] }
  return { sql: all.map(one => `(${one.sql})`).join(' AND '), args: all.flatMap(one => one.args) }
}

function isAskedForByName({ q, label, owner, place }: Partial<FleetQuery>): boolean {
  return [q, label, owner, place].some(asked => asked !== undefined && asked !== '')
}

/** Cylinders on which a finding stands today; 'stop' and 'caution' stand for any of that severity. */
export function findingFilter(code: string, bounds: DateBounds): FleetFilter {
  const overdue = isOverdue(bounds)
  const soon: FleetFilter = { sql: `c.due_month >= ? AND ${dueUntil('<=')}`, args: [bounds.thisMonth, bounds.lastSoonMonth] }
  const notSeen = isUnseen(bounds)
  switch (code) {
    case 'retest-overdue': return overdue
    case 'retest-soon': return soon
    case 'not-seen': return notSeen
    case 'stop': return either({ sql: 'c.severity = 2', args: [] }, { sql: `${overdue.sql} AND c.nothing_in_it = 1`, args: overdue.args })
    case 'caution': return either({ sql: 'c.severity >= 1', args: [] }, isSoonOrOverdue(bounds), notSeen)
    default: return { sql: 'c.severity >= 1 AND c.finding_codes LIKE ?', args: [`% ${code.replace(/[%_]/g, '')} %`] }
  }
}

/** Cylinders in use whose due month has passed; `more` narrows it down. */
export function isOverdue(bounds: DateBounds, more = '1'): FleetFilter {
  return { sql: `${dueUntil('<')} AND ${more}`, args: [bounds.thisMonth] }
}

/** Cylinders in use whose due month has passed or is near. */
export function isSoonOrOverdue(bounds: DateBounds): FleetFilter {
  return { sql: dueUntil('<='), args: [bounds.lastSoonMonth] }
}

/** Cylinders that ought to be here and were not seen for the firm's number of days. */
export function isUnseen(bounds: DateBounds): FleetFilter {
  return { sql: `c.last_seen_at < ? AND c.lifecycle NOT IN ${AWAY_OR_ENDED}`, args: [bounds.notSeenBefore] }
}

function dueUntil(compare: '<' | '<='): string {
  return `c.due_month ${compare} ? AND c.retest_state = 'dated' AND c.lifecycle NOT IN ${ENDED}`
}

function either(...filters: FleetFilter[]): FleetFilter {
  return { sql: filters.map(one => `(${one.sql})`).join(' OR '), args: filters.flatMap(one => one.args) }
}

/** By part of a code, of a serial, of a refrigerant or of a place's name. Codes and serials go by their characters: spaces and hyphens are how they were cut apart, and in a code an O is read as 0. */
function searchFilter(text: string): FleetFilter {
  const words = partOf(text)
  const characters = partOf(text.replace(/[\s-]/g, '') || text)
  return {
    sql: `c.label_code LIKE ? ESCAPE '\\' OR replace(replace(c.serial, ' ', ''), '-', '') LIKE ? ESCAPE '\\' OR c.refrigerant LIKE ? ESCAPE '\\' OR c.place_id IN (SELECT p.id FROM places p WHERE p.name LIKE ? ESCAPE '\\')`,
    args: [partOf(readAsSymbols(text) || text), characters, words, words],
  }
}

function partOf(text: string): string {
  return `%${text.replace(/[\\%_]/g, match => `\\${match}`)}%`
}

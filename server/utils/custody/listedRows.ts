import type { InValue, Row } from '@libsql/client'
import type { CylinderRow } from '../../../utils/custody/cylinderView'
import { cacheRow, rowToday, type CachedRow } from '../../../utils/custody/row'
import type { CylinderState } from '../../../utils/custody/state'
import type { Database } from '../database/database'
import { retestAt, rulesInForceKey } from '../directory/datedRules'
import { namesOf, type Directory } from '../directory/directory'
import { rowContext } from './foldContext'
import { saidByOthers } from './saidByOthers'

/** A row of the fleet as lists show it, and the version of its cylinder. */
export interface ListedRow { row: CylinderRow, version: number }

const COLUMNS = [
  'id', 'version', 'label_code', 'serial', 'spec', 'place_id', 'holder_id', 'owner_id', 'refrigerant', 'condition', 'lifecycle', 'given_away',
  'nothing_in_it', 'net_grams', 'fill_limit_grams', 'governing_rule', 'room_grams', 'stop_weight_grams', 'exact_stop_weight',
  'tare_weight_grams', 'water_capacity_grams', 'due_month', 'retest_state', 'last_event_at', 'last_event_kind', 'last_seen_at',
  'finding_codes', 'severity',
] as const

/** What is to be read of `cylinders c` for {@link listedRows}: with the state, where the row rests on rules no longer in force. */
export function rowColumns(from: Directory, nowMs: number): { sql: string, args: InValue[] } {
  return {
    sql: `${COLUMNS.map(column => `c.${column}`).join(', ')}, CASE WHEN c.ruled_by = ? THEN NULL ELSE c.state END AS state_behind`,
    args: [rulesInForceKey(from, nowMs)],
  }
}

/**
 * Cached rows as they read on a day, in the order given.
 *
 * A row that has not followed a change of the firm's rules yet is made anew here: nobody reads a stop weight of a rule
 * that has ended.
 */
export async function listedRows(db: Database, rows: readonly Row[], from: Directory, nowMs: number): Promise<ListedRow[]> {
  const behind = rows.filter(row => row['state_behind'] !== null).map(row => row['id'] as string)
  const said = await saidByOthers(db, behind)
  const today = { nowMs, timeZone: from.timeZone, retest: retestAt(from.retests, nowMs), names: namesOf(from) }
  return rows.map((row) => {
    const cached = row['state_behind'] === null
      ? cachedRow(row)
      : madeAnew(row['state_behind'] as string, rowContext(from, nowMs, said(row['id'] as string)))
    return { row: rowToday(cached, today), version: cached.version }
  })
}

function madeAnew(json: string, context: ReturnType<typeof rowContext>): CachedRow {
  const state = JSON.parse(json) as CylinderState
  return { id: state.id, ...cacheRow(state, context) }
}

function cachedRow(row: Row): CachedRow {
  return {
    id: row['id'] as string,
    version: row['version'] as number,
    labelCode: row['label_code'] as string | null,
    serial: row['serial'] as string | null,
    spec: row['spec'] as string | null,
    placeId: row['place_id'] as string | null,
    holderId: row['holder_id'] as string | null,
    ownerId: row['owner_id'] as string | null,
    refrigerant: row['refrigerant'] as string | null,
    condition: row['condition'] as CachedRow['condition'],
    lifecycle: row['lifecycle'] as CachedRow['lifecycle'],
    givenAway: row['given_away'] === 1,
    nothingInIt: row['nothing_in_it'] === 1,
    netGrams: row['net_grams'] as number | null,
    fillLimitGrams: row['fill_limit_grams'] as number | null,
    governingRule: row['governing_rule'] as CachedRow['governingRule'],
    roomGrams: row['room_grams'] as number | null,
    stopWeightGrams: row['stop_weight_grams'] as number | null,
    exactStopWeight: row['exact_stop_weight'] as string | null,
    tareWeightGrams: row['tare_weight_grams'] as number | null,
    waterCapacityGrams: row['water_capacity_grams'] as number | null,
    dueMonth: row['due_month'] as CachedRow['dueMonth'],
    retestState: row['retest_state'] as CachedRow['retestState'],
    lastEventAt: row['last_event_at'] as number | null,
    lastEventKind: row['last_event_kind'] as CachedRow['lastEventKind'],
    lastSeenAt: row['last_seen_at'] as number | null,
    findingCodes: row['finding_codes'] as string,
    severity: row['severity'] as number,
  }
}

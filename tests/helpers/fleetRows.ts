import type { InStatement, InValue } from '@libsql/client'
import { openDatabase } from '../../server/utils/database/database'
import { rulesInForceKey } from '../../server/utils/directory/datedRules'
import { directory } from '../../server/utils/directory/directory'
import { drawLabelCode } from '../../utils/label/code'
import type { Lifecycle } from '../../utils/custody/cylinderView'

/** What rows of a made fleet refer to. */
export interface FleetSetting {
  places: readonly string[]
  holders: readonly string[]
  owner: string
  /** Names the rules that the rows rest on, as the database has them in force. */
  ruledBy: string
  nowMs: number
}

const DAY_MS = 86_400_000
const REFRIGERANTS = ['R-410A', 'R-22', 'R-134a', 'R-404A', 'R-407C', 'R-32', null]
const CONDITIONS = ['clean', 'suspect', 'burnt', 'mixed', 'unknown']
const LIFECYCLES: Lifecycle[] = ['in-service', 'in-service', 'in-service', 'in-service', 'at-reclaim', 'at-test', 'quarantined', 'missing', 'retired']
const ROWS_AT_ONCE = 500

/**
 * Statements that put a fleet of any size straight into the list's cache: for what only a large fleet shows.
 *
 * Nine in ten stand as most do, in date and of known weight; the rest have something of everything.
 */
export function fleetRows(count: number, setting: FleetSetting): InStatement[] {
  const rows = Array.from({ length: count }, (_, index) => fleetRow(index, setting))
  const names = Object.keys(rows[0]!)
  const one = `(${names.map(() => '?').join(', ')})`
  return Array.from({ length: Math.ceil(count / ROWS_AT_ONCE) }, (_, part) => rows.slice(part * ROWS_AT_ONCE, (part + 1) * ROWS_AT_ONCE)).map(some => ({
    sql: `INSERT INTO cylinders (${names.join(', ')}) VALUES ${some.map(() => one).join(', ')}`,
    args: some.flatMap(row => Object.values(row)),
  }))
}

/** One row by its number; the same number gives the same row. */
function fleetRow(index: number, { places, holders, owner, ruledBy, nowMs }: FleetSetting): Record<string, InValue> {
  const dice = (sides: number, salt: number) => scattered(index * 31 + salt) % sides
  const isUsual = dice(10, 1) > 0
  const isEmpty = dice(4, 2) === 0
  const refrigerant = isEmpty ? null : isUsual ? REFRIGERANTS[dice(6, 3)]! : REFRIGERANTS[dice(7, 3)]!
  const isWeighed = dice(isUsual ? 40 : 3, 4) > 0
  const netGrams = isEmpty ? 0 : isWeighed ? dice(15_000, 5) : null
  const limit = refrigerant === null ? null : 17_272
  const severity = isUsual ? 0 : dice(3, 6)
  const stop = limit === null ? null : 12_474 + limit
  return {
    id: `${scattered(index + 1).toString(16).padStart(8, '0')}-${(index >> 16).toString(16).padStart(4, '0')}-7000-8000-${index.toString(16).padStart(12, '0')}`,
    version: 1,
    label_code: dice(20, 7) === 0 ? null : labelCodeOf(index),
    serial: `K${String(index).padStart(6, '0')}`,
    spec: 'DOT-4BA',
    place_id: dice(30, 8) === 0 ? null : places[dice(places.length, 9)]!,
    holder_id: dice(5, 10) === 0 ? holders[dice(holders.length, 11)]! : null,
    owner_id: dice(50, 12) === 0 ? owner : null,
    refrigerant,
    condition: isUsual ? 'clean' : CONDITIONS[dice(5, 13)]!,
    lifecycle: isUsual ? 'in-service' : LIFECYCLES[dice(LIFECYCLES.length, 14)]!,
    nothing_in_it: isEmpty ? 1 : 0,
    net_grams: netGrams,
    fill_limit_grams: limit,
    governing_rule: limit === null ? null : 'water-weight',
    room_grams: limit === null || netGrams === null ? null : limit - netGrams,
    stop_weight_grams: stop,
    exact_stop_weight: stop === null ? null : `${stop}.4`,
    tare_weight_grams: 12_474,
    water_capacity_grams: 21_591,
    due_month: dice(40, 15) === 0 ? null : monthFrom(nowMs, isUsual ? 6 + dice(50, 16) : dice(12, 16) - 6),
    retest_state: dice(40, 15) === 0 ? 'not-required' : 'dated',
    last_event_at: nowMs - dice(300, 17) * DAY_MS,
    last_event_kind: 'filled',
    last_seen_at: nowMs - (isUsual ? dice(20, 17) : dice(300, 17)) * DAY_MS,
    finding_codes: ['', ' nearly-full ', ' overfill '][severity]!,
    severity,
    state: '{}',
    ruled_by: ruledBy,
  }
}

function labelCodeOf(index: number): string {
  let draws = 0
  return drawLabelCode((count) => {
    draws++
    return Uint8Array.from({ length: count }, (_, at) => scattered(index * 1_009 + draws * 101 + at) >>> 8)
  })
}

/** Evenly spread whole numbers under 2^32 (a multiply and shift mix). */
function scattered(number: number): number {
  let mixed = Math.imul(number ^ (number >>> 16), 0x45D9F3B)
  mixed = Math.imul(mixed ^ (mixed >>> 15), 0x2C1B3C6D)
  return (mixed ^ (mixed >>> 16)) >>> 0
}

function monthFrom(nowMs: number, months: number): string {
  const day = new Date(nowMs)
  return new Date(Date.UTC(day.getUTCFullYear(), day.getUTCMonth() + months, 1)).toISOString().slice(0, 7)
}

/** Puts a made fleet into the database of a server that runs, among its own places and people. */
export async function fillFleet(databaseFile: string, count: number, setting: Omit<FleetSetting, 'ruledBy' | 'nowMs'>): Promise<void> {
  const db = await openDatabase(`file:${databaseFile}`)
  try {
    const nowMs = Date.now()
    const ruledBy = rulesInForceKey(await directory(db), nowMs)
    await db.write(fleetRows(count, { ...setting, ruledBy, nowMs }))
  }
  finally {
    db.close()
  }
}

import type { Row } from '@libsql/client'
import type { Condition } from '~~/utils/capacity/types'
import { isOverdue } from '~~/utils/custody/dateFindings'
import type { Candidate } from '~~/utils/reclaim/worth'
import type { Database } from '../database/database'
import type { Directory } from '../directory/directory'

/** What is in stock and may be offered, and where it stands; null for nobody knows where. */
export interface StockLine { candidate: Omit<Candidate, 'placeId'>, placeId: string | null }

/** Beyond these, the heaviest, nothing is looked at: fifty shipments as large as one may be. */
const MOST_LOOKED_AT = 10_000

// The plus keeps the rows from being read along another index than the weight's.
const IN_STOCK = `c.nothing_in_it = 0 AND +c.given_away = 0 AND +c.lifecycle IN ('in-service', 'quarantined', 'rejected')
  AND c.id NOT IN (SELECT o.cylinder_id FROM open_lines o)`

/** Cylinders with contents, in stock and on no open list, the heaviest first, and whether these are all. */
export async function stockLines(db: Database, from: Directory, nowMs: number): Promise<{ lines: StockLine[], isAll: boolean }> {
  const { rows } = await db.readClient.execute({
    // In the order of an index backwards, so that no more rows are read than are looked at.
    sql: `SELECT c.id, c.label_code, c.serial, c.spec, c.refrigerant, c.condition, c.net_grams, c.due_month, c.retest_state, c.finding_codes, c.owner_id,
        coalesce(shop.id, c.place_id), json_extract(c.state, '$.contents.shares', '$.stamp.servicePressurePsig')
      FROM cylinders c LEFT JOIN places p ON p.id = c.place_id LEFT JOIN places shop ON shop.id = p.parent_id AND p.kind = 'rack'
      WHERE ${IN_STOCK} ORDER BY c.net_grams DESC, c.id DESC LIMIT ?`,
    args: [MOST_LOOKED_AT + 1],
  })
  return { lines: rows.slice(0, MOST_LOOKED_AT).map(row => stockLine(row, from.timeZone, nowMs)), isAll: rows.length <= MOST_LOOKED_AT }
}

function stockLine(row: Row, timeZone: string, nowMs: number): StockLine {
  const [shares, servicePressurePsig] = JSON.parse(row[12] as string) as [{ ownerId: string | null }[] | null, number | null]
  const labelCode = row[1] as string | null
  const spec = row[3] as string | null
  return {
    placeId: row[11] as string | null,
    candidate: {
      id: row[0] as string, labelCode, serial: row[2] as string | null, spec,
      refrigerant: row[4] as string | null, condition: row[5] as Condition, netGrams: row[6] as number | null,
      retest: retestOf(row[8] as string, isOverdue(row[7] as string | null, { nowMs, timeZone })),
      servicePressurePsig,
      ownerIds: shares?.length ? shares.map(({ ownerId }) => ownerId) : [null],
      isOurSteel: row[10] === null,
      heldBack: heldBack({ labelCode, spec, findingCodes: row[9] as string }),
    },
  }
}

function retestOf(state: string, isPast: boolean): Candidate['retest'] {
  if (state === 'dated') return isPast ? 'overdue' : 'in-date'
  return state === 'unknown' ? 'unknown' : 'not-required'
}

// The same as is asked of each line before it leaves, from what the fleet's rows keep.
function heldBack({ labelCode, spec, findingCodes }: { labelCode: string | null, spec: string | null, findingCodes: string }): string[] {
  return [
    ...(labelCode === null ? ['Has no label: label it first.'] : []),
    ...(findingCodes.includes(' not-registered ') ? ['Is not registered: enter what its collar says first.'] : []),
    ...(findingCodes.includes(' overfill ') ? ['Is overfilled: draw it down first.'] : []),
    ...(spec === 'DOT-39' ? ['Is a DOT-39 that was filled again: it may not be moved by road.'] : []),
  ]
}

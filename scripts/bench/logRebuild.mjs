// What making the caches again costs over a plain loop that scans, parses, folds and writes the same rows.
import process from 'node:process'
import { setImmediate as nextTurn } from 'node:timers/promises'
import { median } from './measured.mjs'

const PAGE = 1_000
const STATEMENTS_A_COMMIT = 1_000

/** @returns medians in seconds of the processor. */
export async function rebuilding({ db, parts, rounds, events }) {
  const costs = { ours: [], bare: [] }
  for (let round = 0; round < rounds; round++) {
    costs.bare.push(await cpuOf(() => plainRebuild(db, parts), events))
    costs.ours.push(await cpuOf(async () => (await parts.rebuildCaches(db, Date.now())).events, events))
  }
  return { ours: median(costs.ours), bare: median(costs.bare) }
}

async function cpuOf(work, events) {
  const begin = process.cpuUsage()
  const done = await work()
  const { user, system } = process.cpuUsage(begin)
  if (done !== events) throw new Error(`${done} events were gone through, not ${events}`)
  return (user + system) / 1e6
}

/** Keyset pages by the same client, each cylinder folded by the same fold, and its rows in batches, one statement to a row. */
async function plainRebuild(db, { cylinderColumns, directory, fold, foldContext, logRow, recordedEvent, rowContext, SELECT_LOG }) {
  const from = await directory(db)
  const nowMs = Date.now()
  const [context, columnsContext] = [foldContext(from), rowContext(from, nowMs)]
  let events = 0
  let open = []
  let statements = []
  let after = ['', 0]
  const close = async () => {
    if (open.length === 0) return
    const cylinderId = open[0].cylinderId
    const folded = fold(open, context)
    statements.push(
      insert('cylinders', cylinderColumns(cylinderId, folded.state, columnsContext)),
      ...folded.movements.map(one => insert('movements', {
        cylinder_id: cylinderId, event_id: one.eventId, ordinal: one.ordinal, cause: one.cause, refrigerant: one.refrigerant, owner_id: one.ownerId, grams: one.grams,
        at: one.at, apart: Number(one.apart),
      })),
      ...folded.stockChanges.map(one => insert('stock_changes', {
        cylinder_id: cylinderId, event_id: one.eventId, ordinal: one.ordinal, refrigerant: one.refrigerant, owner_id: one.ownerId, grams: one.grams,
        not_known: one.notKnown, weighed_variance: one.weighedVariance, found_variance: one.foundVariance,
        weighed_together: one.weighedTogether, found_together: one.foundTogether, at: one.at, apart: Number(one.apart),
      })),
      ...folded.labelClaims.map(one => insert('label_claims', {
        event_id: one.eventId, code: one.code, cylinder_id: cylinderId, effective_at: one.effectiveAt, device_id: one.deviceId, device_seq: one.deviceSeq,
      })),
    )
    open = []
    if (statements.length < STATEMENTS_A_COMMIT) return
    await db.write(statements)
    statements = []
    // The driver gives statements back only between turns of the loop.
    await nextTurn()
  }
  for (;;) {
    const { rows } = await db.readClient.execute({ sql: `${SELECT_LOG} WHERE (cylinder_id, version) > (?, ?) ORDER BY cylinder_id, version LIMIT ${PAGE}`, args: after })
    for (const raw of rows) {
      const event = recordedEvent(logRow(raw))
      if (open[0] && open[0].cylinderId !== event.cylinderId) await close()
      open.push(event)
      events++
    }
    if (rows.length < PAGE) break
    after = [rows.at(-1)[2], rows.at(-1)[3]]
  }
  await close()
  await db.write(statements)
  return events
}

function insert(table, columns) {
  const names = Object.keys(columns)
  return { sql: `INSERT OR REPLACE INTO ${table} (${names.join(', ')}) VALUES (${names.map(() => '?').join(', ')})`, args: Object.values(columns) }
}

// A custody log of any size: cylinders with a usual life, each line sealed by the server's own code.
import { createHash } from 'node:crypto'
import { setImmediate as nextTurn } from 'node:timers/promises'
import { LOG_COLUMNS } from '../../server/utils/custody/logRow'
import { parsePost } from '../../server/utils/custody/judge'
import { rebuildCaches } from '../../server/utils/custody/rebuild'
import { sealedRow } from '../../server/utils/custody/sealedRow'
import { makeCheckpoint } from '../../server/utils/proof/checkpoints'
import { drawLabelCode } from '../../utils/label/code'

/** Events in the life of each cylinder. */
export const EVENTS_A_CYLINDER = 10

const DAY_MS = 86_400_000
/** Rows in one statement, and statements in one commit. */
const ROWS_A_STATEMENT = 100
const STATEMENTS_A_COMMIT = 50
const TARE_LB = 27.5

/** A whole number under 2^32 that looks like chance and is the same each time. */
function scattered(text) {
  return createHash('sha256').update(text).digest()
}

/** An id as a phone makes it: its time first (RFC 9562, version 7). */
export function madeId(atMs, salt) {
  const hex = scattered(salt).toString('hex')
  const time = atMs.toString(16).padStart(12, '0')
  return `${time.slice(0, 8)}-${time.slice(8)}-7${hex.slice(0, 3)}-8${hex.slice(3, 6)}-${hex.slice(6, 18)}`
}

export function lb(value) {
  return { unit: 'lb', value: Math.round(value * 10) / 10 }
}

/** The life of a cylinder, event by event: registered, labelled, out with a van, filled, drawn from, and back. */
function happening(number, step, { shop, van }) {
  const extra = number % 50 / 10
  const gross = [0, 0, 0, TARE_LB + 14 + extra, TARE_LB + 14 + extra, TARE_LB + 9 + extra, 0, TARE_LB + 9 + extra, TARE_LB + 22 + extra, TARE_LB + 22 + extra][step]
  switch (step) {
    case 0: return {
      kind: 'registered', placeId: shop, details: {
        stamp: { serial: `M${String(number).padStart(6, '0')}`, spec: 'DOT-4BA', servicePressurePsig: 400, tareWeight: lb(TARE_LB), waterCapacity: lb(47.6), madeMonth: '2022-03', flammableMarked: true },
        marks: [{ month: '2024-06' }], ownership: 'own', contents: 'evacuated', gross: lb(TARE_LB),
      },
    }
    case 1: return { kind: 'labelled', details: { code: codeOf(number) } }
    case 2: return { kind: 'moved', details: { toPlaceId: van } }
    case 3: return { kind: 'filled', details: { refrigerant: 'R-410A', condition: 'clean', grossBefore: lb(TARE_LB), grossAfter: lb(gross), looked: true } }
    case 5: return { kind: 'drawn', details: { grossAfter: lb(gross), purpose: 'same-system', phase: 'liquid' } }
    case 6: return { kind: 'moved', details: { toPlaceId: shop } }
    case 8: return { kind: 'filled', details: { refrigerant: 'R-410A', condition: 'clean', grossAfter: lb(gross), looked: true } }
    default: return { kind: 'weighed', details: { gross: lb(gross) }, note: 'on the floor scale' }
  }
}

function codeOf(number) {
  let draw = 0
  return drawLabelCode(count => scattered(`code ${number} ${draw++}`).subarray(0, count))
}

/**
 * Fills an empty log with so many cylinders, all their first events before all their second ones and a checkpoint in
 * between, and makes its caches.
 *
 * @param setting the places, who records (`access`), and the present (`nowMs`).
 */
export async function makeLog(db, cylinders, { shop, van, access, nowMs }, sealing, tell) {
  const begin = nowMs - 500 * DAY_MS
  const heads = Array.from({ length: cylinders }, (_, number) => ({ id: madeId(begin + number, `cylinder ${number}`), version: 0, hash: '' }))
  let seq = 0
  let rows = []
  for (let step = 0; step < EVENTS_A_CYLINDER; step++) {
    for (let number = 0; number < cylinders; number++) {
      const head = heads[number]
      const at = Math.floor(begin + (step + number / cylinders) * 45 * DAY_MS)
      const post = parsePost({
        id: madeId(at, `event ${number} ${step}`), cylinderId: head.id, occurredAt: new Date(at).toISOString(), deviceId: 'phone-1', deviceSeq: ++seq,
        ...happening(number, step, { shop, van }),
      })
      if ('refused' in post) throw new Error(JSON.stringify(post.refused))
      const row = sealedRow(post, { access, now: at + 2_000, deviceNow: null }, head, seq, null)
      Object.assign(head, { version: row.version, hash: row.hash })
      rows.push(row)
      if (rows.length < ROWS_A_STATEMENT * STATEMENTS_A_COMMIT && number < cylinders - 1) continue
      await db.write(insertRows(rows))
      rows = []
      // The driver gives statements back only between turns of the loop.
      await nextTurn()
    }
    await makeCheckpoint(db, sealing, nowMs, null)
    tell(`${seq.toLocaleString('en-US')} events`)
  }
  tell('the caches')
  await rebuildCaches(db, nowMs)
}

function insertRows(rows) {
  const one = `(${LOG_COLUMNS.map(() => '?').join(', ')})`
  return Array.from({ length: Math.ceil(rows.length / ROWS_A_STATEMENT) }, (_, part) => rows.slice(part * ROWS_A_STATEMENT, (part + 1) * ROWS_A_STATEMENT)).map(some => ({
    sql: `INSERT INTO custody_events (${LOG_COLUMNS.join(', ')}) VALUES ${some.map(() => one).join(', ')}`,
    args: some.flatMap(row => LOG_COLUMNS.map(column => row[column])),
  }))
}

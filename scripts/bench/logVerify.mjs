// What verifying the custody log costs over reading its columns by the same client and hashing them.
import { createHash } from 'node:crypto'
import process from 'node:process'
import { median } from './measured.mjs'

const PAGE = 1_000

/** @returns medians in seconds of the processor, and what verifying found. */
export async function verifying({ db, parts: { LOG_COLUMNS, verifyLog }, sealing, rounds, events }) {
  const costs = { ours: [], bare: [] }
  let found
  for (let round = 0; round < rounds; round++) {
    const plain = await cpuOf(() => readAndHash(db, LOG_COLUMNS))
    if (!Number.isFinite(plain.result)) throw new Error('Nothing was hashed')
    costs.bare.push(plain.seconds)
    const verified = await cpuOf(() => verifyLog(db, { now: 0, sealing }))
    found = verified.result
    if (!found.ok || found.checked !== events) throw new Error(`The log is not whole: ${JSON.stringify(found)}`)
    costs.ours.push(verified.seconds)
  }
  return { ours: median(costs.ours), bare: median(costs.bare), found }
}

/** Reads the same columns in the same order by the same client, and hashes each row: what no verifying can do without. */
async function readAndHash(db, columns) {
  let after = ['', 0]
  let kept = 0
  for (;;) {
    const { rows } = await db.readClient.execute({
      sql: `SELECT ${columns.join(', ')} FROM custody_events WHERE (cylinder_id, version) > (?, ?) ORDER BY cylinder_id, version LIMIT ${PAGE}`, args: after,
    })
    for (const row of rows) kept += createHash('sha256').update(JSON.stringify(Array.from({ length: columns.length }, (_, index) => row[index]))).digest()[0]
    if (rows.length < PAGE) return kept
    after = [rows.at(-1)[2], rows.at(-1)[3]]
  }
}

/** Units: seconds of the processor. */
async function cpuOf(work) {
  const begin = process.cpuUsage()
  const result = await work()
  const { user, system } = process.cpuUsage(begin)
  return { seconds: (user + system) / 1e6, result }
}

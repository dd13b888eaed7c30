import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { comparingCaches } from '../../../server/utils/proof/compareCaches'
import { verdictOf, verifyLog } from '../../../server/utils/proof/verifyLog'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'
import { lb } from '../../helpers/stamps'

let log: LogDatabase
let first: string
beforeAll(async () => {
  log = await openLogDatabase()
  first = await newCylinder(log)
  // More cylinders than are compared at once.
  for (let more = 0; more < 55; more++) await newCylinder(log)
  await record(log.db, log.technician, [
    sent(first, 'filled', { refrigerant: 'R-22', condition: 'clean', grossBefore: lb(27.5), grossAfter: lb(41), looked: true }),
    sent(first, 'labelled', { code: '7K3M9Q2TX' }),
  ])
})
afterAll(() => log.close())

function compare() {
  return verdictOf(comparingCaches(log.db, Date.now()))
}

describe('what is made from the log, against the log', () => {
  it('is the same as long as nobody touched it', async () => {
    expect(await compare()).toMatchObject({ ok: true, scope: 'caches', checked: 58, cylinders: 56, found: 0 })
  })

  it.each([
    ['its row', 'UPDATE cylinders SET net_grams = net_grams + 1 WHERE id = ?', 'UPDATE cylinders SET net_grams = net_grams - 1 WHERE id = ?', 'row-differs'],
    ['its movements', 'UPDATE movements SET grams = grams + 1 WHERE cylinder_id = ?', 'UPDATE movements SET grams = grams - 1 WHERE cylinder_id = ?', 'movements-differ'],
    ['its stock', 'UPDATE stock_changes SET grams = grams + 1 WHERE cylinder_id = ?', 'UPDATE stock_changes SET grams = grams - 1 WHERE cylinder_id = ?', 'movements-differ'],
    ['its label', 'UPDATE label_claims SET effective_at = effective_at + 1 WHERE cylinder_id = ?', 'UPDATE label_claims SET effective_at = effective_at - 1 WHERE cylinder_id = ?', 'labels-differ'],
  ])('is told to differ for the cylinder in which %s was changed, and the log is not', async (_, change, back, kind) => {
    await log.db.write([{ sql: change, args: [first] }])
    expect(await compare()).toMatchObject({ ok: false, found: 1, firstBad: { kind, cylinderId: first } })
    expect(await verifyLog(log.db, { now: 0, sealing: null })).toMatchObject({ ok: true })
    await log.db.write([{ sql: back, args: [first] }])
    expect(await compare()).toMatchObject({ ok: true })
  })

  it('is told to differ where a cylinder is in the fleet and not in the log', async () => {
    const ghost = 'ffffffff-0000-7000-8000-000000000000'
    await log.db.write([{ sql: `INSERT INTO cylinders (id, version, condition, lifecycle, nothing_in_it, retest_state, finding_codes, severity, state)
      VALUES (?, 1, 'clean', 'in-service', 0, 'unknown', '', 0, '{}')`, args: [ghost] }])
    expect(await compare()).toMatchObject({ ok: false, found: 1, firstBad: { kind: 'row-differs', cylinderId: ghost } })
    await log.db.write([{ sql: 'DELETE FROM cylinders WHERE id = ?', args: [ghost] }])
  })
})

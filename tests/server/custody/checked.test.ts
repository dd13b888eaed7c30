import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { custodyLog } from '../../../server/utils/custody/custodyLog'
import { cylinderView } from '../../../server/utils/custody/cylinderViews'
import { verifyLog } from '../../../server/utils/proof/verifyLog'
import { lb } from '../../helpers/stamps'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'

let log: LogDatabase
beforeAll(async () => {
  log = await openLogDatabase()
})
afterAll(() => log.close())

/** A cylinder with 12.5 lb of R-22 in it, 5670 g. */
async function holdingR22(): Promise<string> {
  const id = await newCylinder(log)
  await record(log.db, log.technician, [sent(id, 'filled', { refrigerant: 'R-22', condition: 'clean', grossBefore: lb(27.5), grossAfter: lb(40), looked: true })])
  return id
}

const viewOf = async (id: string) => (await cylinderView(log.db, id, { access: log.technician, nowMs: Date.now() }))!
const movementsOf = async (id: string) => (await log.db.readClient.execute({
  sql: 'SELECT cause, refrigerant, grams FROM movements WHERE cylinder_id = ? ORDER BY at, ordinal', args: [id],
})).rows.map(row => [row[0], row[1], row[2]])

describe('a check that is recorded', () => {
  it('by pressure changes nothing, and its excess stands on its line in the log', async () => {
    const id = await holdingR22()
    const before = await viewOf(id)
    // R-22 at 80 F: 143.6 psig = 1091.4 kPa (printed); 20 psi more are 1229.3.
    const [result] = await record(log.db, log.technician, [sent(id, 'checked', { method: 'pressure', pressureKPa: 1229.3, temperatureC: 26.667 })])
    expect(result).toMatchObject({ outcome: 'accepted', version: 3 })
    expect((await viewOf(id)).contents).toEqual(before.contents)
    const [line] = (await custodyLog(log.db, id, { limit: 1 })).items
    expect(line!.findings.map(({ code, severity }) => [code, severity])).toEqual([['gas-excess', 'caution']])
    expect((await viewOf(id)).findings.map(({ code }) => code)).not.toContain('gas-excess')
  })

  it('by a laboratory gives the contents their name, and moves the pounds from the one to the other', async () => {
    const id = await holdingR22()
    const verdict = { refrigerant: 'R-407C', condition: 'suspect' }
    await record(log.db, log.technician, [sent(id, 'checked', { method: 'laboratory', composition: [{ component: 'R-407C', massPercent: 98.2 }], verdict })])
    expect((await viewOf(id)).contents).toMatchObject({ ...verdict, netGrams: 5670 })
    expect(await movementsOf(id)).toEqual([['recovered', 'R-22', 5670], ['renamed', 'R-22', -5670], ['renamed', 'R-407C', 5670]])
    const { rows } = await log.db.readClient.execute({ sql: 'SELECT refrigerant, condition FROM cylinders WHERE id = ?', args: [id] })
    expect([rows[0]![0], rows[0]![1]]).toEqual(['R-407C', 'suspect'])
    expect(await verifyLog(log.db, { now: 0, sealing: null })).toMatchObject({ ok: true })
  })

  it('can be mended by its author, and the contents follow', async () => {
    const id = await holdingR22()
    const wrong = sent(id, 'checked', { method: 'identifier', verdict: { refrigerant: null, condition: 'mixed' } })
    await record(log.db, log.technician, [wrong])
    const mended = { eventId: wrong.id, reason: 'read the wrong line', instead: { method: 'identifier', verdict: { refrigerant: 'R-22', condition: 'suspect' } } }
    const [result] = await record(log.db, log.technician, [sent(id, 'corrected', mended)])
    expect(result?.outcome).toBe('accepted')
    expect((await viewOf(id)).contents).toMatchObject({ refrigerant: 'R-22', condition: 'suspect', netGrams: 5670 })
  })
})

describe('a check that is refused', () => {
  it('is one that lacks what its method needs; the others go on', async () => {
    const id = await holdingR22()
    const results = await record(log.db, log.technician, [
      sent(id, 'checked', { method: 'pressure', pressureKPa: 1000 }),
      sent(id, 'checked', { method: 'identifier' }, { deviceSeq: 2 }),
      sent(id, 'weighed', { gross: lb(40) }, { deviceSeq: 3 }),
    ])
    expect(results.map(({ outcome }) => outcome)).toEqual(['refused', 'refused', 'accepted'])
    expect(results[0]!.problem?.errors).toEqual([{ path: 'details.temperatureC', message: 'is missing' }])
    expect(results[1]!.problem?.errors).toEqual([{ path: 'details.verdict', message: 'is missing' }])
  })

  it('is one by somebody who only reads; the warehouse and managers may', async () => {
    const id = await holdingR22()
    const by = async (roles: ('auditor' | 'warehouse' | 'manager')[]) => {
      const access = { ...log.manager, roles }
      return (await record(log.db, access, [sent(id, 'checked', { method: 'pressure', pressureKPa: 1000, temperatureC: 25 })]))[0]?.outcome
    }
    expect(await by(['auditor'])).toBe('refused')
    expect(await by(['warehouse'])).toBe('accepted')
    expect(await by(['manager'])).toBe('accepted')
  })
})

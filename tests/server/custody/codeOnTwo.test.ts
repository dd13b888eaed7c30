import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { cylinderView } from '../../../server/utils/custody/cylinderViews'
import { findCylinder } from '../../../server/utils/custody/findCylinder'
import { fleet } from '../../../server/utils/custody/fleet'
import { rebuildCaches } from '../../../server/utils/custody/rebuild'
import { fleetQuery } from '../../../utils/contract/custody'
import { drawLabelCode } from '../../../utils/label/code'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'

let log: LogDatabase
beforeAll(async () => {
  log = await openLogDatabase()
})
afterAll(() => log.close())

const NOW = Date.now()
const newCode = () => drawLabelCode(count => crypto.getRandomValues(new Uint8Array(count)))
const label = (id: string, code: string, replaces?: string) =>
  record(log.db, log.warehouse, [sent(id, 'labelled', { code, ...(replaces && { replaces }) })])

/** Which of these cylinders stand under the stop, by their own page and by the fleet's list. */
async function stopped(...ids: string[]): Promise<boolean[]> {
  const { items } = await fleet(log.db, fleetQuery.parse({ finding: 'code-on-two', limit: 200 }), NOW)
  return Promise.all(ids.map(async (id) => {
    const view = await cylinderView(log.db, id, { access: null, nowMs: NOW })
    const isStopped = view!.findings.some(({ code }) => code === 'code-on-two')
    expect(items.some(row => row.id === id)).toBe(isStopped)
    return isStopped
  }))
}

async function onTwo(): Promise<{ first: string, second: string, code: string }> {
  const [first, second, code] = [await newCylinder(log), await newCylinder(log), newCode()]
  await label(first, code)
  await label(second, code)
  expect(await stopped(first, second)).toEqual([true, true])
  return { first, second, code }
}

describe('a code on two cylinders', () => {
  it('is on one again once a new label has taken its place on the later one', async () => {
    const { first, second, code } = await onTwo()
    await label(second, newCode(), code)
    expect(await stopped(first, second)).toEqual([false, false])
    expect(await findCylinder(log.db, code)).toBe(first)
    await rebuildCaches(log.db, NOW)
    expect(await stopped(first, second)).toEqual([false, false])
  })

  it('is on two still where a label was stuck on beside it', async () => {
    const { first, second } = await onTwo()
    await label(second, newCode())
    expect(await stopped(first, second)).toEqual([true, true])
  })

  it('is on two still where the first was labelled anew: its code opens the first', async () => {
    const { first, second, code } = await onTwo()
    await label(first, newCode(), code)
    expect(await stopped(first, second)).toEqual([true, true])
    expect(await findCylinder(log.db, code)).toBe(first)
  })

  it('stops those that it is still on, where there are three', async () => {
    const { first, second, code } = await onTwo()
    const third = await newCylinder(log)
    await label(third, code)
    await label(second, newCode(), code)
    expect(await stopped(first, second, third)).toEqual([true, false, true])
    await label(third, newCode(), code)
    expect(await stopped(first, second, third)).toEqual([false, false, false])
  })

  it('is on two again where the old label comes back', async () => {
    const { first, second, code } = await onTwo()
    await label(second, newCode(), code)
    await label(second, code)
    expect(await stopped(first, second)).toEqual([true, true])
  })
})

import { afterAll, beforeEach, describe, expect, it } from 'vitest'
import { newSession } from '../../../server/utils/session/sessions'
import { openLogDatabase, type LogDatabase } from '../../helpers/logDatabase'

const log: LogDatabase = await openLogDatabase()
const { personId } = log.technician
beforeEach(async () => {
  await log.db.write([{ sql: 'UPDATE people SET password_hash = ?, active = 1 WHERE id = ?', args: ['hash-of-the-old', personId] }])
})
afterAll(() => log.close())

/** Whether a session is stored for who was checked against this hash. */
async function isStored(checkedAgainst: string): Promise<boolean> {
  const [answer] = await log.db.write([newSession(personId, checkedAgainst, 1).store])
  return answer?.rows.length === 1
}

describe('a session of somebody whose password was just checked', () => {
  it('stands while the password is that one', async () => {
    expect(await isStored('hash-of-the-old')).toBe(true)
  })

  it('is not made where the password was changed during the check', async () => {
    await log.db.write([{ sql: 'UPDATE people SET password_hash = ? WHERE id = ?', args: ['hash-of-the-new', personId] }])
    expect(await isStored('hash-of-the-old')).toBe(false)
  })

  it('is not made where the person was turned off during the check', async () => {
    await log.db.write([{ sql: 'UPDATE people SET active = 0 WHERE id = ?', args: [personId] }])
    expect(await isStored('hash-of-the-old')).toBe(false)
  })
})

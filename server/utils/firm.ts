import { firm } from '../../drizzle/schema'
import type { FirmCard, OwnFirm, OwnFirmChange } from '../../utils/contract/firm'
import type { Access } from '../../utils/access/roles'
import { useDatabase } from './database/currentDatabase'
import { statement } from './database/database'
import { directory } from './directory/directory'
import { problem } from './http/problem'
import { securityEntry } from './securityLog'

/**
 * The contractor itself.
 *
 * Errors: 404 before the set-up.
 */
export async function ownFirm(): Promise<OwnFirm> {
  const [row] = await useDatabase().read.select({
    name: firm.name, telephone: firm.telephone, timeZone: firm.timeZone, units: firm.units,
    address: firm.address, emergencyTelephone: firm.emergencyTelephone, emergencyContract: firm.emergencyContract,
  }).from(firm).limit(1)
  if (!row) throw problem(404, 'Not set up', 'This Collarbook has not been set up yet.', undefined, { type: 'not-set-up' })
  return row
}

/** What anybody who finds a cylinder may know. Errors: 404 before the set-up. */
export async function firmCard(): Promise<FirmCard> {
  const { name, telephone } = await ownFirm()
  return { name, telephone }
}

/** Changes the firm's own particulars. */
export async function changeOwnFirm(change: OwnFirmChange, by: Access, now: number): Promise<OwnFirm> {
  const db = useDatabase()
  const { read, write } = db
  const entry = securityEntry({ what: 'firm-changed', personId: by.personId, subject: Object.keys(change).join(' ') }, now)
  if (Object.keys(change).length > 0) {
    await write([statement(read.update(firm).set(change)), entry])
    await directory(db, true)
  }
  return ownFirm()
}

import { firm, people } from '../../../drizzle/schema'
import type { CheckpointLine } from '../../../utils/contract/log'
import type { Database } from '../database/database'
import { checkpointLetter } from '../mail/letters'
import { sendMail } from '../mail/mail'
import { rolesOf } from '../session/person'
import { checkpointLine, makeCheckpoint, type StoredCheckpoint } from './checkpoints'
import { sealingNow, type Sealing } from './sealing'

/**
 * Makes a checkpoint and writes it to every auditor.
 *
 * @param askedBy null for the daily one.
 * Errors: 404 before the set-up.
 */
export async function checkpointNow(db: Database, now: number, askedBy: string | null): Promise<CheckpointLine> {
  const seal = await sealingNow(db)
  const made = await makeCheckpoint(db, seal, now, askedBy)
  await sendToAuditors(db, seal, made, now)
  return (await checkpointLine(db, made))!
}

async function sendToAuditors(db: Database, { signer }: Sealing, { note, says }: StoredCheckpoint, now: number): Promise<void> {
  const [[ours], everybody] = await Promise.all([db.read.select({ name: firm.name }).from(firm).limit(1), db.read.select().from(people)])
  const auditors = everybody.filter(one => one.active && rolesOf(one).includes('auditor'))
  await Promise.all(auditors.map(({ email, name }) => sendMail(checkpointLetter({
    recipient: email, name, firmName: ours!.name, note, number: says!.number, events: says!.events, publicKey: signer.publicKey,
  }), now)))
}

import { eq } from 'drizzle-orm'
import { jobNotes } from '~~/drizzle/schema'
import type { RecoveryNoteMailAnswer } from '~~/utils/contract/jobs'
import { statement, type Database } from '../database/database'
import { ownFirm } from '../firm'
import { problem } from '../http/problem'
import { impossible } from '../http/impossible'
import { keptAs, sendMail } from '../mail/mail'
import { theJob } from './jobs'
import { noteFileName, printedRecoveryNote } from './recoveryNote'

/** A note that is to go: its sender's own id, to whom, and by whom. */
export interface NoteToSend { id: string, recipient?: string, sentBy: string }

/**
 * Sends the recovery note of a job, as it now stands, to the customer. Asked for twice under one id it goes once.
 *
 * Errors: 404; 409 where another letter has this id; 422 where nobody has said to which address.
 */
export async function mailRecoveryNote(db: Database, jobId: string, { id, recipient: asked, sentBy }: NoteToSend, now: number): Promise<RecoveryNoteMailAnswer> {
  // The letter first: it is kept in one commit with its note.
  const kept = await keptAs(id)
  const [job, sender, [before]] = await Promise.all([theJob(db, jobId), ownFirm(), db.read.select().from(jobNotes).where(eq(jobNotes.id, id)).limit(1)])
  if (before ? before.jobId !== jobId : kept) throw problem(409, 'Another letter has this id', 'Send it again under a new id.')
  const recipient = before?.recipient ?? asked ?? job.email
  if (recipient === null) throw impossible('recipient', 'is not known of this customer; write the address')
  const { issue } = before ?? job
  const name = `${sender.name}: recovery note ${job.number}${issue > 1 ? `, issue ${issue}` : ''}`
  const outcome = await sendMail({
    recipient,
    subject: name,
    body: [
      `Hello ${job.customer.name},`, '',
      `with this comes the note of what ${sender.name} recovered from your equipment: ${job.equipment}, ${job.site}.`, '',
      ...(issue > 1 ? [`It is issue ${issue} and replaces what was sent before: something was corrected.`, ''] : []),
      `Questions: telephone ${sender.telephone}.`, '',
    ].join('\n'),
    attachments: [{ name: noteFileName({ number: job.number, issue }), mediaType: 'application/pdf', content: await printedRecoveryNote(db, job, now) }],
  }, now, {
    id,
    alongside: [statement(db.read.insert(jobNotes).values({ id, jobId, issue, recipient, mailId: id, sentBy, sentAt: now }).onConflictDoNothing())],
  })
  return { outcome, recipient, issue }
}

import { firm } from '~~/drizzle/schema'
import type { JobAnswer } from '~~/utils/contract/jobs'
import { recoveryNote } from '~~/utils/document/recoveryNote'
import type { Database } from '../database/database'
import { directory, namesOf } from '../directory/directory'
import { ownFirm } from '../firm'
import { paperPdf } from '../pdf/paperPdf'

/** The recovery note of a job as it now stands, as a PDF on letter paper. */
export async function printedRecoveryNote(db: Database, job: JobAnswer, nowMs: number): Promise<Buffer> {
  const [from, { name, telephone }, [own]] = await Promise.all([directory(db), ownFirm(), db.read.select({ address: firm.address }).from(firm).limit(1)])
  const names = namesOf(from)
  const paper = recoveryNote(job, {
    sender: { name, telephone, address: own?.address ?? null },
    ownerName: ownerId => ownerId === null ? name : names.firm(ownerId).name,
    timeZone: from.timeZone,
    printedMs: nowMs,
  })
  return paperPdf(paper, `Recovery note ${job.number}`)
}

/** What the file of a note is called. */
export function noteFileName({ number, issue }: Pick<JobAnswer, 'number' | 'issue'>): string {
  return `recovery-note-${number}${issue > 1 ? `-issue-${issue}` : ''}.pdf`
}

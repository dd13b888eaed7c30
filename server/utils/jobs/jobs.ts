import { and, desc, eq, lt, or, sql } from 'drizzle-orm'
import { jobNotes, jobs, JOB_NAMED, mail, people } from '~~/drizzle/schema'
import type { Job, JobAnswer, JobFill, JobLine, JobsAnswer, JobsQuery, SentNote } from '~~/utils/contract/jobs'
import { jobCautions } from '~~/utils/jobs/jobCautions'
import { jobCorrections } from '~~/utils/jobs/jobCorrections'
import { jobLines, recoveredGrams } from '~~/utils/jobs/jobFills'
import { readingGrams } from '~~/utils/quantity/mass'
import { requiredLevel } from '~~/utils/recovery/evacuationLevel'
import type { RequiredLevel } from '~~/utils/recovery/types'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { pageByNumber } from '../cylinder-lists/paging'
import type { Database } from '../database/database'
import { foreignCursor } from '../http/cursor'
import { jobLog } from './jobLog'
import { jobRows, theJobRow, type JobRow } from './jobRows'

/** The jobs, the newest first, each with what came out. Errors: 400 for a cursor that is none of ours. */
export async function listJobs(db: Database, { customer, refrigerant, mine, cursor, limit }: JobsQuery, personId: string): Promise<JobsAnswer> {
  if (cursor !== undefined && !/^[1-9]\d{0,14}$/.test(cursor)) throw foreignCursor()
  const recordedByMe = sql`EXISTS (SELECT 1 FROM custody_events WHERE (${sql.raw(JOB_NAMED)}) = ${jobs.id} AND actor_id = ${personId})`
  const rows = await jobRows(db, and(
    customer === undefined ? undefined : eq(jobs.customerId, customer),
    refrigerant === undefined ? undefined : eq(jobs.refrigerant, refrigerant),
    mine === undefined ? undefined : or(eq(jobs.createdBy, personId), recordedByMe),
    cursor === undefined ? undefined : lt(jobs.number, Number(cursor)),
  ), limit + 1)
  const { items, nextCursor } = pageByNumber(rows, limit)
  const log = await jobLog(db, items.map(({ id }) => id))
  return { items: items.map(row => lineOf(row, jobLines(row.id, log.logs.values(), { ...log, required: levelFor(row) }).fills)), nextCursor }
}

/** One job with all that the log says of it. Errors: 404. */
export async function theJob(db: Database, id: string): Promise<JobAnswer> {
  const [row, log, notes] = await Promise.all([theJobRow(db, id), jobLog(db, [id]), sentNotes(db, id)])
  const required = levelFor(row)
  const { fills, draws } = jobLines(id, log.logs.values(), { ...log, required })
  const corrections = jobCorrections(id, log.logs.values())
  return {
    ...lineOf(row, fills),
    fills, draws,
    required: { level: required.level, alternative: required.alternative, assumed: required.assumed, source: required.source },
    cautions: jobCautions(row, fills),
    issue: 1 + row.changes + corrections.length,
    corrections, notes,
  }
}

function lineOf({ changes: _, ...job }: JobRow, fills: readonly JobFill[]): JobLine {
  return {
    ...job,
    cylinders: new Set(fills.map(({ cylinder }) => cylinder.id)).size,
    recoveredGrams: recoveredGrams(fills),
    notKnown: fills.filter(({ netGrams }) => netGrams === null).length,
  }
}

/** What the equipment had to come down to; what was not said of it is taken as what asks for more. */
function levelFor({ refrigerant, charge, opened }: Job): RequiredLevel {
  return requiredLevel({
    refrigerant: refrigerant === null ? null : CATALOGUE.refrigerants.get(refrigerant) ?? null,
    chargeGrams: charge === null ? null : readingGrams(charge),
    machineMade: opened?.machineMade ?? null,
    appliance: opened?.appliance ?? 'other',
    circumstances: opened?.circumstances ?? null,
    compressorRuns: null,
  })
}

async function sentNotes(db: Database, jobId: string): Promise<SentNote[]> {
  const rows = await db.read.select({ note: jobNotes, sentAt: mail.sentAt, error: mail.error, name: people.name }).from(jobNotes)
    .leftJoin(mail, eq(mail.id, jobNotes.mailId)).leftJoin(people, eq(people.id, jobNotes.sentBy))
    .where(eq(jobNotes.jobId, jobId)).orderBy(desc(jobNotes.sentAt), desc(jobNotes.id))
  return rows.map(({ note, sentAt, error, name }) => ({
    issue: note.issue, recipient: note.recipient, sentAt: new Date(note.sentAt).toISOString(), sentBy: name ?? note.sentBy,
    outcome: error !== null ? 'failed' : sentAt === null ? 'kept' : 'sent',
  }))
}

import { alias } from 'drizzle-orm/sqlite-core'
import { and, desc, eq, type SQL } from 'drizzle-orm'
import { firms, jobs, people } from '~~/drizzle/schema'
import type { Job } from '~~/utils/contract/jobs'
import type { Database } from '../database/database'
import { problem } from '../http/problem'

/** A job as it is stored, and by whom it was made. */
export interface JobRow extends Job {
  /** How often what it says was changed. */
  changes: number
}

const maker = alias(people, 'maker')

/** The jobs that a condition leaves, the newest first. */
export async function jobRows(db: Database, where: SQL | undefined, limit: number): Promise<JobRow[]> {
  const rows = await db.read.select({ job: jobs, firmName: firms.name, firmEmail: firms.email, makerName: maker.name }).from(jobs)
    .leftJoin(firms, eq(firms.id, jobs.customerId))
    .leftJoin(maker, eq(maker.id, jobs.createdBy))
    .where(and(where)).orderBy(desc(jobs.number)).limit(limit)
  return rows.map(({ job, firmName, firmEmail, makerName }) => ({
    id: job.id,
    number: job.number,
    customer: { id: job.customerId, name: firmName ?? job.customerName },
    email: job.email ?? firmEmail,
    site: job.site,
    equipment: job.equipment,
    refrigerant: job.refrigerant,
    charge: job.charge,
    keeps: job.keeps,
    opened: job.opened,
    note: job.note,
    createdAt: new Date(job.createdAt).toISOString(),
    createdBy: { id: job.createdBy, name: makerName ?? job.createdBy },
    changes: job.changes,
  }))
}

/** One job. Errors: 404. */
export async function theJobRow(db: Database, id: string): Promise<JobRow> {
  const [row] = await jobRows(db, eq(jobs.id, id), 1)
  if (!row) throw problem(404, 'No such job', 'It may have been written wrongly.')
  return row
}

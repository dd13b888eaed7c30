import { JOB_NAMED } from '~~/drizzle/schema'
import type { AnyRecordedEvent } from '~~/utils/custody/event'
import { certificationWords } from '~~/utils/access/certification'
import type { JobContext } from '~~/utils/jobs/jobFills'
import { logsOf } from '../custody/logPages'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'

/** What the log says that may be of some jobs: the events of every cylinder that names one, and what is known of those cylinders and people. */
export interface JobLog extends Omit<JobContext, 'required'> {
  logs: ReadonlyMap<string, readonly AnyRecordedEvent[]>
}

/** Reads it. A cylinder of which a correction names a job is among them, whatever counts in the end. */
export async function jobLog(db: Database, jobIds: readonly string[]): Promise<JobLog> {
  const [named, from] = await Promise.all([
    db.readClient.execute({ sql: `SELECT DISTINCT cylinder_id FROM custody_events WHERE (${JOB_NAMED}) IN (SELECT value FROM json_each(?))`, args: [JSON.stringify(jobIds)] }),
    directory(db),
  ])
  const cylinderIds = named.rows.map(row => row[0] as string)
  const [logs, moved, cylinders] = await Promise.all([logsOf(db, cylinderIds), movedBy(db, cylinderIds), namesOf(db, cylinderIds)])
  return {
    logs, moved,
    scales: from.scales,
    cylinder: id => cylinders.get(id) ?? { id, labelCode: null, serial: null },
    person: (id) => {
      const row = from.people.get(id)
      return { id, name: row?.name ?? id, certification: row ? certificationWords(row) : null }
    },
  }
}

const CAUSES = ['recovered', 'drawn-same-system', 'drawn-same-owner', 'drawn-other', 'sampled'] as const

async function movedBy({ readClient }: Database, cylinderIds: readonly string[]): Promise<Map<string, number>> {
  const { rows } = await readClient.execute({
    sql: `SELECT event_id, sum(grams) FROM movements WHERE cylinder_id IN (SELECT value FROM json_each(?)) AND cause IN (${CAUSES.map(() => '?').join(', ')}) GROUP BY event_id`,
    args: [JSON.stringify(cylinderIds), ...CAUSES],
  })
  return new Map(rows.map(row => [row[0] as string, row[1] as number]))
}

async function namesOf({ readClient }: Database, cylinderIds: readonly string[]): Promise<Map<string, ReturnType<JobContext['cylinder']>>> {
  const { rows } = await readClient.execute({ sql: 'SELECT id, label_code, serial FROM cylinders WHERE id IN (SELECT value FROM json_each(?))', args: [JSON.stringify(cylinderIds)] })
  return new Map(rows.map(row => [row[0] as string, { id: row[0] as string, labelCode: row[1] as string | null, serial: row[2] as string | null }]))
}

import type { UnsignedFacts } from '../../../utils/now/nowFacts'
import type { Database } from '../database/database'
import { namesOf, type Directory } from '../directory/directory'

/**
 * What trainees recorded that nobody has countersigned, by the supervisor it names, the most first; of one supervisor
 * where an id is given. What was taken back needs no signature; what a trainee corrected
 * after it was signed needs another.
 */
export async function unsignedFacts(db: Database, from: Directory, supervisorId?: string): Promise<UnsignedFacts[]> {
  const { rows } = await db.readClient.execute({
    sql: `SELECT e.supervisor_id, count(*), c.id, c.label_code, c.serial FROM cylinders c JOIN custody_events e ON e.cylinder_id = c.id
      WHERE c.finding_codes LIKE '% unsigned %' AND e.trainee = 1 AND e.kind <> 'corrected' ${supervisorId === undefined ? '' : 'AND e.supervisor_id = ?'}
        AND NOT EXISTS (SELECT 1 FROM custody_events s WHERE s.cylinder_id = c.id AND json_extract(s.body, '$.details.eventId') = e.id
          AND (s.kind = 'corrected' AND json_extract(s.body, '$.details.instead') IS NULL
            OR s.kind = 'countersigned' AND NOT EXISTS (SELECT 1 FROM custody_events k WHERE k.cylinder_id = c.id AND k.kind = 'corrected'
              AND k.trainee = 1 AND k.seq > s.seq AND json_extract(k.body, '$.details.eventId') = e.id)))
      GROUP BY e.supervisor_id, c.id ORDER BY e.supervisor_id, max(e.seq) DESC`,
    args: supervisorId === undefined ? [] : [supervisorId],
  })
  const { person } = namesOf(from)
  return [...new Set(rows.map(row => row[0] as string | null))].map((id): UnsignedFacts => {
    const some = rows.filter(row => row[0] === id)
    return {
      supervisor: id === null ? null : person(id).name,
      count: some.reduce((sum, row) => sum + (row[1] as number), 0),
      cylinders: some.map(row => ({ id: row[2] as string, labelCode: row[3] as string | null, serial: row[4] as string | null })),
    }
  }).sort((a, b) => b.count - a.count)
}

import { applyCorrections } from '../../../utils/custody/corrections'
import { waitingEntries } from '../../../utils/custody/signatures'
import type { UnsignedFacts } from '../../../utils/now/nowFacts'
import { eventLine, recordedEvent, SELECT_EVENT_LINES } from '../custody/logRow'
import type { Database } from '../database/database'
import { namesOf, type Directory } from '../directory/directory'

type Cylinder = UnsignedFacts['cylinders'][number]

/** An entry that waits, by the supervisor it names. */
interface Waiting { supervisorId: string | null, cylinder: Cylinder, seq: number }

/**
 * What trainees recorded that nobody has countersigned, by the supervisor it names, the most first; of one supervisor
 * where an id is given. Which entries wait, is told by the same reckoning as the log and the books.
 */
export async function unsignedFacts(db: Database, from: Directory, supervisorId?: string): Promise<UnsignedFacts[]> {
  const all = await waiting(db)
  const some = supervisorId === undefined ? all : all.filter(one => one.supervisorId === supervisorId)
  const { person } = namesOf(from)
  return [...new Set(some.map(one => one.supervisorId))].map((id): UnsignedFacts => {
    const theirs = some.filter(one => one.supervisorId === id)
    return {
      supervisor: id === null ? null : person(id).name,
      count: theirs.length,
      cylinders: [...new Map(theirs.map(({ cylinder }) => [cylinder.id, cylinder])).values()],
    }
  }).sort((a, b) => b.count - a.count)
}

/** The entries that wait, those of the cylinder with the newest first. */
async function waiting(db: Database): Promise<Waiting[]> {
  const unsigned = `SELECT c.id, c.label_code, c.serial FROM cylinders c WHERE c.finding_codes LIKE '% unsigned %'`
  const [cylinders, log] = await db.readClient.batch([
    unsigned,
    // What a trainee has not recorded settles nothing about signatures, unless it signs or corrects.
    `${SELECT_EVENT_LINES} WHERE cylinder_id IN (SELECT id FROM (${unsigned})) AND (trainee = 1 OR kind IN ('countersigned', 'corrected')) ORDER BY cylinder_id, version`,
  ], 'read')
  const events = log!.rows.map(row => recordedEvent(eventLine(row)))
  return cylinders!.rows.map((row): Waiting[] => {
    const cylinder = { id: row[0] as string, labelCode: row[1] as string | null, serial: row[2] as string | null }
    return waitingEntries(applyCorrections(events.filter(({ cylinderId }) => cylinderId === cylinder.id)))
      .map(({ supervisorId, seq }) => ({ supervisorId, cylinder, seq }))
  }).sort((a, b) => newest(b) - newest(a)).flat()
}

function newest(entries: readonly Waiting[]): number {
  return Math.max(0, ...entries.map(({ seq }) => seq))
}

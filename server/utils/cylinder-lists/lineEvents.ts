import { applyCorrections } from '~~/utils/custody/corrections'
import type { AnyRecordedEvent } from '~~/utils/custody/event'
import type { EventKind } from '~~/utils/custody/kinds'
import { eventLine, recordedEvent, SELECT_EVENT_LINES } from '../custody/logRow'
import type { Database } from '../database/database'
import { LISTS, type ListRef } from './lists'

/** The events of these kinds on each cylinder of a list, corrected as they now stand, in order of effect. */
export async function lineEvents(db: Database, list: ListRef, kinds: readonly EventKind[]): Promise<Map<string, AnyRecordedEvent[]>> {
  const { lines, key } = LISTS[list.kind]
  const { rows } = await db.readClient.execute({
    sql: `${SELECT_EVENT_LINES} WHERE cylinder_id IN (SELECT cylinder_id FROM ${lines} WHERE ${key} = ?)
      AND kind IN (SELECT value FROM json_each(?)) ORDER BY seq`,
    args: [list.id, JSON.stringify([...kinds, 'corrected'])],
  })
  const byCylinder = new Map<string, AnyRecordedEvent[]>()
  for (const event of rows.map(row => recordedEvent(eventLine(row)))) {
    byCylinder.set(event.cylinderId, [...byCylinder.get(event.cylinderId) ?? [], event])
  }
  return new Map([...byCylinder].map(([cylinderId, events]) => [
    cylinderId,
    applyCorrections(events).flatMap(({ event, isOut }) => isOut || event.kind === 'corrected' ? [] : [event]),
  ]))
}

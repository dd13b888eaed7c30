import type { InStatement } from '@libsql/client'
import { foldAsItStood } from '../../../utils/custody/asItStood'
import { foldContext } from '../custody/foldContext'
import { logsOf } from '../custody/logPages'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'

/** What the papers of each shipment say: what the log said of each cylinder as it left, by what was known then. */
export async function paperStatements(db: Database): Promise<InStatement[]> {
  const [from, { rows }] = await Promise.all([directory(db), db.readClient.execute('SELECT shipment_id, cylinder_id FROM shipment_lines WHERE sent IS NOT NULL')])
  const logs = await logsOf(db, [...new Set(rows.map(row => row[1] as string))])
  return rows.flatMap((row): InStatement[] => {
    const [shipmentId, cylinderId] = [row[0] as string, row[1] as string]
    const events = logs.get(cylinderId) ?? []
    const left = events.find(event => event.kind === 'sent-for-reclaim' && event.details.shipmentId === shipmentId)
    const after = left && foldAsItStood(events, foldContext(from), { asOf: null, knownAt: left.recordedAt })?.steps.find(({ eventId }) => eventId === left.id)?.after
    if (!after) return []
    return [{
      sql: `UPDATE shipment_lines SET sent = json_set(sent, '$.refrigerant', ?, '$.condition', ?, '$.netGrams', ?) WHERE shipment_id = ? AND cylinder_id = ?`,
      args: [after.refrigerant, after.condition, after.netGrams, shipmentId, cylinderId],
    }]
  })
}

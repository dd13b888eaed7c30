import type { Database } from '../database/database'
import { problem } from '../http/problem'

/**
 * Photos of a shipment's cylinders since it was made, by cylinder: those that an event names, those put to one later, and
 * the dock's. One that is named counts only where the one who names it sent it.
 */
export async function shipmentPhotos(db: Database, shipmentId: string): Promise<Map<string, string[]>> {
  const { rows } = await db.readClient.execute({
    sql: `WITH event AS (
        SELECT e.id, e.cylinder_id, e.actor_id, e.body, e.seq FROM custody_events e
        JOIN shipment_lines line ON line.cylinder_id = e.cylinder_id JOIN shipments ON shipments.id = line.shipment_id
        WHERE line.shipment_id = ? AND e.effective_at >= shipments.created_at
      )
      SELECT event.cylinder_id, a.id, event.seq FROM event, json_each(event.body, '$.photoIds') named JOIN attachments a ON a.id = named.value AND a.sent_by = event.actor_id
      UNION SELECT event.cylinder_id, a.id, event.seq FROM event JOIN attachment_events put ON put.event_id = event.id JOIN attachments a ON a.id = put.attachment_id
      UNION SELECT act.cylinder_id, a.id, act.seq FROM shipment_acts act, json_each(act.details, '$.photoIds') named JOIN attachments a ON a.id = named.value AND a.sent_by = act.link_id
      WHERE act.shipment_id = ? AND act.cylinder_id IS NOT NULL
      ORDER BY 3`,
    args: [shipmentId, shipmentId],
  })
  const photos = new Map<string, string[]>()
  for (const row of rows) {
    const of = photos.get(row[0] as string) ?? []
    photos.set(row[0] as string, of.includes(row[1] as string) ? of : [...of, row[1] as string])
  }
  return photos
}

/** Errors: 422 for photos that are neither the person's own nor of the shipment's cylinders: an id is no way in for somebody else's picture. */
export async function refuseStrangePhotos(db: Database, { shipmentId, personId }: { shipmentId: string, personId: string }, photoIds: readonly string[]): Promise<void> {
  if (photoIds.length === 0) return
  const { rows } = await db.readClient.execute({ sql: 'SELECT id FROM attachments WHERE sent_by = ? AND id IN (SELECT value FROM json_each(?))', args: [personId, JSON.stringify(photoIds)] })
  const known = new Set([...rows.map(row => row[0] as string), ...[...(await shipmentPhotos(db, shipmentId)).values()].flat()])
  const errors = photoIds.flatMap((id, index) => known.has(id) ? [] : [{ path: `photoIds.${index}`, message: 'has not arrived, or belongs elsewhere' }])
  if (errors.length > 0) throw problem(422, 'A photo is not there', 'Wait until it was sent, or take it again.', errors)
}

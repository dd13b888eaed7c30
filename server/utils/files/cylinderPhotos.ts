import type { Row } from '@libsql/client'
import type { CylinderPhotosAnswer, EventPhotos, Photo } from '../../../utils/contract/uploads'
import type { PhotoSubject } from '../../../utils/photo/subject'
import type { Database } from '../database/database'
import { directory, namesOf } from '../directory/directory'

/**
 * Every photo that an event names itself, in its envelope or as the proof of an end, and every one that was put to it
 * later. One that is named counts as arrived only where the event's own author sent it: an id that is still on its way
 * is no way in for anybody else's picture.
 */
const PHOTOS = `
  WITH named (event_id, version, actor_id, photo_id) AS (
    SELECT e.id, e.version, e.actor_id, n.value FROM custody_events e, json_each(e.body, '$.photoIds') n WHERE e.cylinder_id = ?1
    UNION
    SELECT e.id, e.version, e.actor_id, n.value FROM custody_events e, json_each(e.body, '$.details.proof.photoIds') n WHERE e.cylinder_id = ?1
  )
  SELECT n.event_id, n.version, n.photo_id, a.id AS arrived, a.subject, a.taken_at, a.arrived_at, a.sent_by, NULL AS put_at, a.width, a.height, a.content_hash
  FROM named n LEFT JOIN attachments a ON a.id = n.photo_id AND a.sent_by = n.actor_id
  UNION ALL
  SELECT e.id, e.version, a.id, a.id, a.subject, a.taken_at, a.arrived_at, a.sent_by, l.put_at, a.width, a.height, a.content_hash
  FROM custody_events e JOIN attachment_events l ON l.event_id = e.id JOIN attachments a ON a.id = l.attachment_id
  WHERE e.cylinder_id = ?1
  ORDER BY 2, 9, 7, 3`

/** The photos of a cylinder, event by event in the order of recording; events without any are left out. Ids that have not arrived are counted and not told. */
export async function cylinderPhotos(db: Database, cylinderId: string): Promise<CylinderPhotosAnswer> {
  const [{ rows }, from] = await Promise.all([db.readClient.execute({ sql: PHOTOS, args: [cylinderId] }), directory(db)])
  const names = namesOf(from)
  const byEvent = new Map<string, EventPhotos>()
  for (const row of rows) {
    const eventId = String(row.event_id)
    const of = byEvent.get(eventId) ?? { eventId, photos: [], onTheWay: 0 }
    byEvent.set(eventId, of)
    if (row.arrived === null) of.onTheWay++
    else if (!of.photos.some(({ id }) => id === row.photo_id)) of.photos.push(photoOf(row, names))
  }
  return { items: [...byEvent.values()] }
}

function photoOf(row: Row, names: ReturnType<typeof namesOf>): Photo {
  return {
    id: String(row.photo_id),
    subject: row.subject as PhotoSubject,
    takenAt: instant(row.taken_at),
    arrivedAt: new Date(Number(row.arrived_at)).toISOString(),
    by: names.person(String(row.sent_by)),
    putAt: instant(row.put_at),
    width: Number(row.width),
    height: Number(row.height),
    contentHash: String(row.content_hash),
  }
}

function instant(ms: unknown): string | null {
  return ms === null ? null : new Date(Number(ms)).toISOString()
}

import type { Stamp } from '../../../utils/capacity/types'
import type { MassReading } from '../../../utils/quantity/mass'
import type { Database } from '../database/database'
import { keepPhoto } from '../files/keepPhoto'
import type { PhotoFiles } from '../files/photoFiles'
import { HOUR, MINUTE } from './calendar'
import { scalePicture, stampPicture } from './pictures'
import { seededRandom } from './random'
import type { Script, ScriptedEvent } from './script'

const SEED = 20_261_202
const STAMPS = 5
const SCALES = 4

/** Names photos in some events of the script, before it is recorded. */
export function namePhotos({ events }: Script): void {
  // Chance of its own, so that whatever else the script draws comes out the same with photos as without.
  const random = seededRandom(SEED)
  const name = (event: ScriptedEvent) => event.body.photoIds = [random.uuid(event.recordedAt)]
  spread(events.filter(({ body }) => body.kind === 'registered' && (body.details as { stamp: Stamp }).stamp.serial !== null), STAMPS).forEach(name)
  spread(events.filter(({ body }) => body.kind === 'weighed'), SCALES).forEach(name)
}

/** As many of a list as are asked for, from its beginning to its end. */
function spread<T>(list: readonly T[], count: number): T[] {
  return Array.from({ length: Math.min(count, list.length) }, (_, at) => list[Math.floor((at + 1) * list.length / count) - 1]!)
}

/**
 * Draws and keeps the photos that the demo's events name, each showing what its event says; the newest is still on its
 * way. One more is put to a line that named none.
 */
export async function keepDemoPhotos(db: Database, files: PhotoFiles): Promise<void> {
  const { rows } = await db.readClient.execute('SELECT id, kind, actor_id, recorded_at, effective_at, body FROM custody_events WHERE kind IN (\'registered\', \'weighed\') ORDER BY recorded_at')
  const lines = rows.map(row => ({
    id: String(row.id), kind: String(row.kind), actorId: String(row.actor_id), recordedAt: Number(row.recorded_at), effectiveAt: Number(row.effective_at),
    ...JSON.parse(String(row.body)) as { photoIds?: string[], details: { stamp: Stamp, gross: MassReading } },
  }))
  const named = lines.filter(({ photoIds }) => photoIds)
  const later = lines.findLast(({ kind, photoIds }) => kind === 'weighed' && !photoIds)
  const random = seededRandom(SEED + 1)
  const keep = async (line: typeof lines[number], id: string, arrivedAt: number, eventId?: string) => keepPhoto(db, files, {
    id, eventId,
    subject: line.kind === 'registered' ? 'stamp' : 'scale',
    takenAt: new Date(line.effectiveAt).toISOString(),
    file: line.kind === 'registered' ? stampPicture(line.details.stamp) : scalePicture(line.details.gross),
  }, { personId: line.actorId, roles: [], trainee: false }, arrivedAt)
  for (const line of named.slice(0, -1)) await keep(line, line.photoIds![0]!, line.recordedAt + MINUTE)
  if (later) await keep(later, random.uuid(later.recordedAt), later.recordedAt + 2 * HOUR, later.id)
}

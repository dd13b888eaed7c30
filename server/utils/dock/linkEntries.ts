import { DOCK_KINDS, type DockKind, type LinkedDockEntry } from '../../../utils/dock/entry'
import { instantText } from '../cylinder-lists/paging'
import type { Database } from '../database/database'

/** Before the kind of an entry, where it stands among the acts of a shipment. */
export const DOCK_ACT = 'dock-'

const KINDS: ReadonlySet<string> = new Set(DOCK_KINDS)

/** What was said of a shipment at the dock, in the order it was recorded; also what was taken out since. */
export async function dockEntries(db: Database, shipmentId: string): Promise<LinkedDockEntry[]> {
  const { rows } = await db.readClient.execute({
    sql: `SELECT id, kind, cylinder_id, details, link_id, link_name, occurred_at FROM shipment_acts
      WHERE shipment_id = ? AND link_id IS NOT NULL AND kind LIKE '${DOCK_ACT}%' ORDER BY seq`,
    args: [shipmentId],
  })
  return rows.flatMap((row) => {
    const kind = (row['kind'] as string).slice(DOCK_ACT.length)
    if (!KINDS.has(kind)) return []
    const cylinderId = row['cylinder_id'] as string | null
    const said = { ...JSON.parse(row['details'] as string) as object, ...(cylinderId !== null && { cylinderId }) }
    return [{
      id: row['id'] as string, kind: kind as DockKind, name: row['link_name'] as string, at: instantText(row['occurred_at'])!, said, linkId: row['link_id'] as string,
    } as LinkedDockEntry]
  })
}

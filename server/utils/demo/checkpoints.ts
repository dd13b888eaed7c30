import type { InStatement } from '@libsql/client'
import { checkpointText, leafText } from '../../../utils/proof/checkpoint'
import { leafHash, merkleTree } from '../../../utils/proof/merkle'
import { sha256 } from '../custody/sha256'
import type { Database } from '../database/database'
import { keepCopy } from '../proof/copies'
import type { Sealing } from '../proof/sealing'
import { sha256OfBytes } from '../proof/sha256OfBytes'
import { DAY } from './calendar'

/**
 * The checkpoints that a server would have made, one a day since the demo's first event and the last one now, each by
 * the clock of its day.
 *
 * The log is walked through once and a cylinder's leaf is hashed once for each line of it: reading the log for each
 * checkpoint, as a server does, would make the first start longer by a third.
 */
export async function sealHistory(db: Database, { origin, signer, copies }: Sealing, now: number): Promise<void> {
  const { rows } = await db.readClient.execute('SELECT seq, cylinder_id, version, hash, recorded_at FROM custody_events ORDER BY seq')
  if (rows.length === 0) return
  const days = Math.floor((now - (rows[0]!.recorded_at as number)) / DAY)
  const leaves = new Map<string, Uint8Array>()
  const statements: InStatement[] = []
  const notes: string[] = []
  let events = 0
  for (let left = days; left >= 0; left--) {
    const at = now - left * DAY
    for (; events < rows.length && (rows[events]!.recorded_at as number) <= at; events++) {
      const head = { cylinderId: rows[events]!.cylinder_id as string, version: rows[events]!.version as number, hash: rows[events]!.hash as string }
      leaves.set(head.cylinderId, leafHash(Buffer.from(leafText(head)), sha256OfBytes))
    }
    const tree = merkleTree(sha256OfBytes)
    for (const id of [...leaves.keys()].sort()) tree.add(leaves.get(id)!)
    const number = notes.length + 1
    const previous = notes.at(-1)
    const note = signer.sign(checkpointText({
      origin, number, at, seq: rows[events - 1]!.seq as number, events, cylinders: tree.size(),
      root: Buffer.from(tree.root()).toString('base64'), previous: previous === undefined ? '' : sha256(previous),
    }))
    notes.push(note)
    statements.push({ sql: 'INSERT INTO checkpoints (number, note, asked_by) VALUES (?, ?, NULL)', args: [number, note] })
  }
  await db.write(statements)
  for (const note of notes) keepCopy(copies, note)
}

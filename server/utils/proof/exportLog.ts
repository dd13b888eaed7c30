import { fold } from '../../../utils/custody/fold'
import { foldContext } from '../custody/foldContext'
import { logLength } from '../custody/logLength'
import { LOG_COLUMNS, recordedEvent, type LogRow } from '../custody/logRow'
import type { Database } from '../database/database'
import type { Directory } from '../directory/directory'
import { exportedPhotos } from '../files/exportedPhotos'
import { allCheckpoints } from './checkpoints'
import { linesBetween } from './lines'
import type { Sealing } from './sealing'

/** The form of the export. A reader that knows another one says so. */
const FORMAT = { format: 'custody-log', version: 1 }

/**
 * The whole log as lines of JSON, for somebody who trusts neither this server nor its database: what it is, the scales
 * and the places of the firms that contents depend on, the checkpoints, then for each cylinder its lines in the order of recording and the net that the fleet shows for it.
 *
 * A line holds the columns of the log in the order that the first one names; its hash is taken of them. The log is given
 * as it stood when the export began. Before its end stand the photos with the hashes of their files; they are no part of
 * the chains.
 */
export async function* exportedLog(db: Database, { origin, trusted }: Sealing, from: Directory, now: number): AsyncGenerator<string> {
  const checkpoints = await allCheckpoints(db)
  const { seq, events } = await logLength(db)
  const [publicKey, ...formerKeys] = trusted
  yield textOf([
    { ...FORMAT, origin, publicKey, formerKeys, exportedAt: new Date(now).toISOString(), seq, events, columns: LOG_COLUMNS },
    ...[...from.scales.values()].map(({ id, accuracyGrams, accuracyPercent }) => ({ scale: { id, accuracyGrams, accuracyPercent } })),
    ...[...from.placeOfFirm].map(([id, placeId]) => ({ firm: { id, placeId } })),
    ...checkpoints.map(({ note }) => ({ checkpoint: note })),
  ])
  let open: LogRow[] = []
  let cylinders = 0
  for await (const rows of linesBetween(db, 0, seq)) {
    const nets = await cachedNets(db, open[0]?.cylinder_id ?? rows[0]!.cylinder_id, rows.at(-1)!.cylinder_id)
    const text: object[] = []
    const close = () => {
      if (open.length === 0) return
      text.push({ cylinder: netOf(open, nets, from) })
      cylinders++
    }
    for (const row of rows) {
      if (open[0]?.cylinder_id !== row.cylinder_id) {
        close()
        open = []
      }
      open.push(row)
      text.push({ event: LOG_COLUMNS.map(column => row[column]) })
    }
    yield textOf(text)
  }
  if (open.length > 0) {
    const nets = await cachedNets(db, open[0]!.cylinder_id, open[0]!.cylinder_id)
    yield textOf([{ cylinder: netOf(open, nets, from) }])
    cylinders++
  }
  for await (const lines of exportedPhotos(db)) yield textOf(lines)
  yield textOf([{ end: { events, cylinders, checkpoints: checkpoints.length } }])
}

function textOf(lines: object[]): string {
  return lines.map(line => `${JSON.stringify(line)}\n`).join('')
}

type CachedNets = ReadonlyMap<string, { version: number, netGrams: number | null }>

async function cachedNets(db: Database, first: string, last: string): Promise<CachedNets> {
  const { rows } = await db.readClient.execute({ sql: 'SELECT id, version, net_grams FROM cylinders WHERE id BETWEEN ? AND ?', args: [first, last] })
  return new Map(rows.map(row => [row[0] as string, { version: row[1] as number, netGrams: row[2] as number | null }]))
}

/** The net as the fleet has it, where that is of these lines; it is folded again where later ones have come. */
function netOf(rows: readonly LogRow[], nets: CachedNets, from: Directory): { id: string, version: number, netGrams: number | null } {
  const { cylinder_id: id, version } = rows.at(-1)!
  const cached = nets.get(id)
  if (cached?.version === version) return { id, version, netGrams: cached.netGrams }
  return { id, version, netGrams: foldedNet(rows, from) }
}

function foldedNet(rows: readonly LogRow[], from: Directory): number | null {
  try {
    return fold(rows.map(recordedEvent), foldContext(from)).state.contents.netGrams
  }
  catch {
    // A line that nobody can read is in the export as it is; whoever checks it will say so.
    return null
  }
}

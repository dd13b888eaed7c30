import { desc, eq, lt } from 'drizzle-orm'
import { checkpoints } from '../../../drizzle/schema'
import type { CheckpointLine, CheckpointsAnswer } from '../../../utils/contract/log'
import { checkpointText, leafText, readCheckpoint, type Checkpoint } from '../../../utils/proof/checkpoint'
import { leafHash, merkleTree } from '../../../utils/proof/merkle'
import { readNote } from '../../../utils/proof/note'
import { sha256 } from '../custody/sha256'
import { logLength } from '../custody/logLength'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { foreignCursor } from '../http/cursor'
import { problem } from '../http/problem'
import { keepCopy } from './copies'
import { headsAt } from './heads'
import type { Sealing } from './sealing'
import { sha256OfBytes } from './sha256OfBytes'

/** A checkpoint as it is stored. What it says is in its note alone; null where that is none. */
export interface StoredCheckpoint { number: number, note: string, hash: string, askedBy: string | null, says: Checkpoint | null }

type Row = typeof checkpoints.$inferSelect

/** How often a checkpoint is made again after another process made one first. */
const RACE_RETRIES = 5

const making = new WeakMap<Database, Promise<unknown>>()

/**
 * Signs how the custody log stands now, and keeps that in the database and as a copy outside it.
 *
 * The log is read as it stood at one number, while events go on being recorded. A checkpoint is no event: it changes
 * nothing of the log.
 */
export function makeCheckpoint(db: Database, sealing: Sealing, now: number, askedBy: string | null): Promise<StoredCheckpoint> {
  const before = making.get(db)?.catch(() => undefined) ?? Promise.resolve()
  const mine = before.then(() => make(db, sealing, now, askedBy))
  making.set(db, mine)
  return mine
}

async function make(db: Database, sealing: Sealing, now: number, askedBy: string | null): Promise<StoredCheckpoint> {
  for (let attempt = 0; attempt < RACE_RETRIES; attempt++) {
    const before = await newestCheckpoint(db)
    const { seq, events } = await logLength(db)
    const tree = merkleTree(sha256OfBytes)
    for await (const heads of headsAt(db, seq)) for (const head of heads) tree.add(leafHash(Buffer.from(leafText(head)), sha256OfBytes))
    const number = (before?.number ?? 0) + 1
    const note = sealing.signer.sign(checkpointText({
      origin: sealing.origin, number, at: now, seq, events, cylinders: tree.size(),
      root: Buffer.from(tree.root()).toString('base64'), previous: before?.hash ?? '',
    }))
    const [written] = await db.write([{
      sql: 'INSERT INTO checkpoints (number, note, asked_by) SELECT ?, ?, ? WHERE (SELECT max(number) FROM checkpoints) IS ? ON CONFLICT DO NOTHING RETURNING number',
      args: [number, note, askedBy, before?.number ?? null],
    }])
    if (written!.rows.length === 0) continue
    copyOrSay(sealing.copies, number, note)
    return stored({ number, note, askedBy })
  }
  throw problem(503, 'Try again', 'Other checkpoints were being made at the same time.')
}

// It is signed and stored: that its copy could not be kept must not make it look as if it were not.
function copyOrSay(file: string, number: number, note: string): void {
  try {
    keepCopy(file, note)
  }
  catch (error) {
    console.error(`No copy of checkpoint ${number} could be kept beside the database:`, String(error))
  }
}

/** Every checkpoint, oldest first. */
export async function allCheckpoints(db: Database): Promise<StoredCheckpoint[]> {
  return (await db.read.select().from(checkpoints).orderBy(checkpoints.number)).map(stored)
}

/** The newest checkpoint; null before the first. */
export async function newestCheckpoint(db: Database): Promise<StoredCheckpoint | null> {
  const [row] = await db.read.select().from(checkpoints).orderBy(desc(checkpoints.number)).limit(1)
  return row ? stored(row) : null
}

/** One checkpoint as it was signed. Errors: 404. */
export async function checkpointNote(db: Database, number: number): Promise<string> {
  const [row] = await db.read.select().from(checkpoints).where(eq(checkpoints.number, number))
  if (!row) throw problem(404, 'Not known', 'There is no such checkpoint.')
  return row.note
}

/** The checkpoints, newest first, a page at a time. Errors: 400 for a cursor that is none of ours. */
export async function listCheckpoints(db: Database, sealing: Sealing, { limit, cursor }: { limit: number, cursor?: string }): Promise<CheckpointsAnswer> {
  if (cursor !== undefined && !/^\d{1,15}$/.test(cursor)) throw foreignCursor()
  const older = cursor === undefined ? undefined : lt(checkpoints.number, Number(cursor))
  const rows = await db.read.select().from(checkpoints).where(older).orderBy(desc(checkpoints.number)).limit(limit + 1)
  const shown = rows.slice(0, limit)
  return {
    items: (await Promise.all(shown.map(row => checkpointLine(db, stored(row))))).flatMap(line => line ?? []),
    nextCursor: rows.length > limit ? String(shown.at(-1)!.number) : null,
    publicKey: sealing.signer.publicKey,
  }
}

/** A checkpoint for people to read; null where its note is none any more, which verifying tells of. */
export async function checkpointLine(db: Database, { number, hash, askedBy, says }: StoredCheckpoint): Promise<CheckpointLine | null> {
  if (!says) return null
  const { people } = await directory(db)
  return {
    number, hash, at: new Date(says.at).toISOString(), seq: says.seq, events: says.events, cylinders: says.cylinders, root: says.root,
    askedBy: askedBy === null ? null : { id: askedBy, name: people.get(askedBy)?.name ?? askedBy },
  }
}

function stored({ number, note, askedBy }: Row): StoredCheckpoint {
  const text = readNote(note)?.text
  return { number, note, hash: sha256(note), askedBy, says: text === undefined ? null : readCheckpoint(text) }
}

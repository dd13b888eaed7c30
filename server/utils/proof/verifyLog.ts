import type { LogVerification, VerifyProgress } from '../../../utils/contract/log'
import { logLength } from '../custody/logLength'
import type { LogRow } from '../custody/logRow'
import type { Database } from '../database/database'
import { allCheckpoints, type StoredCheckpoint } from './checkpoints'
import { damageList, type DamageList } from './damageList'
import { headsAt } from './heads'
import { keptCopies } from './copies'
import { judgeAgainstLog, judgeChain, judgeCopies } from './judgeCheckpoints'
import { linesBetween } from './lines'
import type { Sealing } from './sealing'
import { streamWalk, type StreamWalk } from './streamWalk'

/** Numbers that are missing are looked up one by one, but not without end. */
const GAPS_TOLD = 20

/** A verification on its way: how far it has come, in the end what it found. */
export type VerifySteps = AsyncGenerator<VerifyProgress, LogVerification>

/** What a verification goes by. */
export interface VerifyOptions {
  /** UTC milliseconds. */
  now: number
  /** null leaves out whether the checkpoints' signatures are good and whether one is missing of which a copy was kept. */
  sealing: Sealing | null
  /** The number of a checkpoint that was verified before: only what has come since is computed, on the ends that it signed. */
  since?: number | null
}

/**
 * Verifies the custody log: the chain of each cylinder, that no number is missing, every checkpoint, and how the log
 * stood at each of them. Reads some lines at a time and lets others in between; yields how far it has come.
 *
 * Since a checkpoint, the lines before it are counted and their ends compared; a line in their middle whose bytes were
 * changed and nothing else is found only by verifying all.
 */
export async function* verifying(db: Database, { now, sealing, since = null }: VerifyOptions): VerifySteps {
  const damage = damageList()
  // In this order: what is made meanwhile reaches the log first, then the table, then the copies.
  const copies = sealing ? keptCopies(sealing.copies) : []
  const checkpoints = await allCheckpoints(db)
  judgeChain(checkpoints, sealing, damage)
  judgeCopies(checkpoints, copies, damage)
  const from = checkpoints.find(({ number, says }) => number === since && says !== null) ?? null
  const judged = inReach(checkpoints).filter(({ says }) => from === null || says!.seq >= from.says!.seq)
  const walk = streamWalk(judged, damage)
  let before = 0
  try {
    const { seq: reach, events } = await logLength(db)
    if (reach !== events) await tellGaps(db, reach, damage)
    if (from) before = await linesUpTo(db, from.says!.seq)
    const steps = from ? walkSince(db, walk, from.says!.seq, reach) : walkAll(db, walk, reach)
    for await (const done of steps) yield { done, of: events - before }
  }
  catch (error) {
    // The driver refuses a number that no line of ours can hold.
    if (!(error instanceof RangeError)) throw error
    damage.add('unreadable', {})
  }
  walk.end()
  judgeAgainstLog(judged, walk.recomputed().map(one => ({ ...one, events: one.events + before })), damage)
  const told = damage.told()
  return {
    ok: told.length === 0, scope: from ? 'since' : 'all', checked: walk.lines(), cylinders: walk.cylinders(), ...(told[0] ? { firstBad: told[0] } : {}),
    damage: told, found: damage.count(), checkpoints: checkpoints.length, since: from?.number ?? null, upTo: checkpoints.at(-1)?.number ?? null,
    verifiedAt: new Date(now).toISOString(),
  }
}

/** The same without telling how far it has come. */
export function verifyLog(db: Database, options: VerifyOptions): Promise<LogVerification> {
  return verdictOf(verifying(db, options))
}

/** What a verification found, once it is through. */
export async function verdictOf(steps: VerifySteps): Promise<LogVerification> {
  for (;;) {
    const step = await steps.next()
    if (step.done) return step.value
  }
}

/** Those that say something, in the order of the numbers that they reach to. */
function inReach(checkpoints: readonly StoredCheckpoint[]): StoredCheckpoint[] {
  return checkpoints.filter(({ says }) => says !== null).sort((a, b) => a.says!.seq - b.says!.seq || a.number - b.number)
}

async function* walkAll(db: Database, walk: StreamWalk, reach: number): AsyncGenerator<number> {
  let cylinderId: string | null = null
  for await (const rows of linesBetween(db, 0, reach)) {
    for (const row of rows) {
      if (row.cylinder_id !== cylinderId) walk.begin(null)
      cylinderId = row.cylinder_id
      walk.line(row)
    }
    yield walk.lines()
  }
}

/** Ends at the checkpoint and lines after it, merged by cylinder. */
async function* walkSince(db: Database, walk: StreamWalk, seq: number, reach: number): AsyncGenerator<number> {
  const lines = flattened(linesBetween(db, seq, reach))
  let next = await lines.next()
  let cylinderId: string | null = null
  async function linesOf(isNow: (row: LogRow) => boolean): Promise<void> {
    for (; !next.done && isNow(next.value); next = await lines.next()) {
      if (next.value.cylinder_id !== cylinderId) walk.begin(null)
      cylinderId = next.value.cylinder_id
      walk.line(next.value)
    }
  }
  for await (const heads of headsAt(db, seq)) {
    for (const head of heads) {
      await linesOf(row => row.cylinder_id < head.cylinderId)
      walk.begin(head)
      cylinderId = head.cylinderId
      await linesOf(row => row.cylinder_id === head.cylinderId)
    }
    yield walk.lines()
  }
  await linesOf(() => true)
  yield walk.lines()
}

async function* flattened(pages: AsyncIterable<LogRow[]>): AsyncGenerator<LogRow, undefined> {
  for await (const rows of pages) yield* rows
}

async function linesUpTo(db: Database, seq: number): Promise<number> {
  const { rows: [row] } = await db.readClient.execute({ sql: 'SELECT count(*) FROM custody_events WHERE seq <= ?', args: [seq] })
  return row![0] as number
}

/** Where numbers are missing among those up to the last one. */
async function tellGaps(db: Database, reach: number, damage: DamageList): Promise<void> {
  const { rows } = await db.readClient.execute({
    sql: `SELECT 1 WHERE NOT EXISTS (SELECT 1 FROM custody_events WHERE seq = 1)
      UNION ALL SELECT seq + 1 FROM custody_events e WHERE seq < ? AND NOT EXISTS (SELECT 1 FROM custody_events n WHERE n.seq = e.seq + 1) LIMIT ${GAPS_TOLD}`,
    args: [reach],
  })
  for (const row of rows) damage.add('missing-number', { seq: row[0] as number })
}

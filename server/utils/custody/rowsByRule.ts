import { setImmediate as nextTurn } from 'node:timers/promises'
import type { InStatement } from '@libsql/client'
import type { CylinderState } from '../../../utils/custody/state'
import type { Database } from '../database/database'
import { nextBeginning, rulesInForceKey } from '../directory/datedRules'
import { directory } from '../directory/directory'
import { NEXT_CACHE_TURN } from './cacheTurn'
import { refreshedRow } from './caches'
import { rowContext } from './foldContext'
import { saidByOthers } from './saidByOthers'

/** Rows made anew in one turn of the writer's queue: what is posted meanwhile waits for no more than these. */
const ROWS_AT_ONCE = 100
/** How often rows are looked for that rest on other rules: another process may have set one or written by an old one. */
const LOOK_EVERY_MS = 5_000

const following = new WeakMap<Database, Promise<number>>()

/** How many rows of the fleet rest on other rules than those in force at an instant. */
export async function rowsBehind(db: Database, nowMs: number): Promise<number> {
  const result = await db.readClient.execute(behind('count(*)', rulesInForceKey(await directory(db), nowMs)))
  return result.rows[0]?.[0] as number
}

/**
 * Makes anew every row that rests on other rules than those in force, some at a time, so that events are posted meanwhile.
 *
 * Each row names its rules, so that a process that ends halfway leaves nothing to guess: the next one goes on.
 *
 * @returns how many rows it made.
 */
export function followRules(db: Database, clock: () => number = Date.now): Promise<number> {
  // One that is already at its last rows may not have seen the newest rule: so another follows it.
  const before = following.get(db)?.catch(() => 0) ?? Promise.resolve(0)
  const mine = before.then(() => followAll(db, clock))
  following.set(db, mine)
  return mine
}

/** Follows the rules now, when one begins, and every few seconds for as long as the process lives; answers how to end it. */
export function keepFollowing(db: Database): () => void {
  let timer: NodeJS.Timeout | undefined
  let hasEnded = false
  async function turn(): Promise<void> {
    let next: number | null = null
    try {
      const made = await followRules(db)
      if (made > 0) console.log(`Rows made anew by the firm's rules in force: ${made}.`)
      next = nextBeginning(await directory(db), Date.now())
    }
    catch (error) {
      console.error('The rows could not follow the firm\'s rules; they will later:', String(error))
    }
    if (hasEnded) return
    timer = setTimeout(() => void turn(), Math.min(LOOK_EVERY_MS, next === null ? LOOK_EVERY_MS : Math.max(1, next - Date.now())))
    timer.unref()
  }
  void turn()
  return () => {
    hasEnded = true
    clearTimeout(timer)
  }
}

async function followAll(db: Database, clock: () => number): Promise<number> {
  let made = 0
  for (;;) {
    const rows = await db.exclusive(commit => followSome(db, commit, clock()))
    made += rows
    if (rows < ROWS_AT_ONCE) return made
    await nextTurn()
  }
}

async function followSome(db: Database, commit: Database['write'], nowMs: number): Promise<number> {
  const from = await directory(db)
  const found = await db.readClient.execute(behind('id, state', rulesInForceKey(from, nowMs), ROWS_AT_ONCE))
  if (found.rows.length === 0) return 0
  const said = await saidByOthers(db, found.rows.map(row => row[0] as string))
  await commit([NEXT_CACHE_TURN, ...found.rows.map((row) => {
    const state = JSON.parse(row[1] as string) as CylinderState
    return refreshedRow(state.id, state, rowContext(from, nowMs, said(state.id)))
  })])
  return found.rows.length
}

// Two ranges and not "differs": so the index is used, and a look that finds nothing costs nothing.
function behind(columns: string, key: string, limit?: number): InStatement {
  return {
    sql: `SELECT ${columns} FROM cylinders WHERE ruled_by < ? OR ruled_by > ?${limit === undefined ? '' : ` LIMIT ${limit}`}`,
    args: [key, key],
  }
}

import { setImmediate as nextTurn } from 'node:timers/promises'
import type { Row } from '@libsql/client'
import type { KitAnswer, KitQuery, PackedCylinder } from '../../../utils/contract/kit'
import type { CylinderState } from '../../../utils/custody/state'
import { KIT_FORM, packCylinder } from '../../../utils/kit/packCylinder'
import type { Database } from '../database/database'
import { kitFirm } from './kitFirm'
import { kitMark } from './kitMark'

/** Cylinders in an answer: a phone takes them in one go, and its person waits for no more than these. */
const CYLINDERS_AT_ONCE = 500
/** Lines of the log looked through for an answer. */
const LINES_AT_ONCE = 2_000
/** Cylinders packed without a pause: what else is asked of the server waits for no more than these. */
const PACKED_IN_A_TURN = 100

/** How far a phone has come, as an answer says it. */
interface Reached { seq: number, mark: string }

/**
 * A part of what a phone keeps: of the whole fleet at first, then of what events have touched since.
 *
 * The first walk goes by the cylinders' ids and ends where the log stood at its beginning, so that what happens meanwhile
 * comes with the next question. A cylinder may come in a newer state than `seq` says; it then comes once more.
 */
export async function kitAnswer(db: Database, query: KitQuery): Promise<KitAnswer> {
  const firm = await kitFirm(db)
  const reached = await goingOnFrom(db, query)
  const part = reached === null ? await walk(db, await head(db), '') : query.after ? await walk(db, reached, query.after) : await touched(db, reached)
  return { form: KIT_FORM, anew: reached === null, ...part, ...query.firm === firm.tag ? {} : { firm } }
}

/** Where the phone can go on from; null where it must begin. */
async function goingOnFrom(db: Database, { since, mark }: KitQuery): Promise<Reached | null> {
  if (since === undefined || mark === undefined) return null
  return await kitMark(db, since) === mark ? { seq: since, mark } : null
}

async function head(db: Database): Promise<Reached> {
  const { rows } = await db.readClient.execute('SELECT seq FROM custody_events ORDER BY seq DESC LIMIT 1')
  const seq = (rows[0]?.[0] as number | undefined) ?? 0
  return { seq, mark: (await kitMark(db, seq))! }
}

type Part = Pick<KitAnswer, 'seq' | 'mark' | 'cylinders' | 'next' | 'more'>

async function walk(db: Database, { seq, mark }: Reached, after: string): Promise<Part> {
  const { rows } = await db.readClient.execute({
    sql: 'SELECT id, state FROM cylinders WHERE id > ? ORDER BY id LIMIT ?', args: [after, CYLINDERS_AT_ONCE + 1],
  })
  const sent = rows.slice(0, CYLINDERS_AT_ONCE)
  return { seq, mark, cylinders: await packed(sent), next: rows.length > sent.length ? sent.at(-1)![0] as string : null, more: false }
}

async function touched(db: Database, since: Reached): Promise<Part> {
  const { rows } = await db.readClient.execute({
    sql: 'SELECT seq, cylinder_id FROM custody_events WHERE seq > ? ORDER BY seq LIMIT ?', args: [since.seq, LINES_AT_ONCE],
  })
  const ids = new Set<string>()
  let seq = since.seq
  let read = 0
  for (const row of rows) {
    const id = row[1] as string
    if (ids.size === CYLINDERS_AT_ONCE && !ids.has(id)) break
    ids.add(id)
    seq = row[0] as number
    read++
  }
  const more = read < rows.length || rows.length === LINES_AT_ONCE
  if (ids.size === 0) return { ...since, cylinders: [], next: null, more }
  const states = await db.readClient.execute({
    sql: `SELECT id, state FROM cylinders WHERE id IN (${[...ids].map(() => '?').join(', ')}) ORDER BY id`, args: [...ids],
  })
  return { seq, mark: (await kitMark(db, seq))!, cylinders: await packed(states.rows), next: null, more }
}

async function packed(rows: readonly Row[]): Promise<PackedCylinder[]> {
  const all: PackedCylinder[] = []
  for (const [index, row] of rows.entries()) {
    all.push(packCylinder(JSON.parse(row[1] as string) as CylinderState))
    if ((index + 1) % PACKED_IN_A_TURN === 0) await nextTurn()
  }
  return all
}

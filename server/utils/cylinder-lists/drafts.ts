import type { InStatement } from '@libsql/client'
import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { freeFor, refuseUnfree } from './freeCylinders'
import { LISTS, type ListRef } from './lists'

/** What a new list says beside its cylinders. */
export interface NewList {
  firmId: string
  note: string | null
  cylinderIds: readonly string[]
  createdBy: string
  now: number
  /** Further statements of the same commit, under a condition that holds where the list is made in it. */
  along?: (isMade: Guard) => InStatement[]
}

/**
 * Makes a draft with its lines.
 *
 * Errors: 422 and 409 as {@link refuseUnfree}; 409 where another list has this id. The same draft sent again changes nothing.
 */
export async function createDraft(db: Database, list: ListRef, draft: NewList): Promise<void> {
  const { heads, firm, word } = LISTS[list.kind]
  const isRepeated = await isDraftedAlready(db, list, draft)
  if (isRepeated) return
  await refuseUnfree(db, list, draft.cylinderIds)

  const free = freeFor(list, draft.cylinderIds)
  const made: Guard = {
    sql: `EXISTS (SELECT 1 FROM ${heads} WHERE id = ? AND created_at = ? AND created_by = ? AND state = 'draft')`,
    args: [list.id, draft.now, draft.createdBy],
  }
  const [head] = await db.write([
    {
      sql: `INSERT INTO ${heads} (id, number, ${firm}, state, note, created_at, created_by)
        SELECT ?, (SELECT coalesce(max(number), 0) + 1 FROM ${heads}), ?, 'draft', ?, ?, ?
        WHERE ${free.sql} ON CONFLICT DO NOTHING RETURNING id`,
      args: [list.id, draft.firmId, draft.note, draft.now, draft.createdBy, ...free.args],
    },
    ...newLines(list, draft.cylinderIds, made),
    ...draft.along?.(made) ?? [],
  ])
  if (head?.rows.length === 1 || await isDraftedAlready(db, list, draft)) return
  await refuseUnfree(db, list, draft.cylinderIds)
  throw problem(409, `The ${word} was not made`, 'Somebody changed the same cylinders just now. Try again.')
}

/**
 * Puts other cylinders on a draft in place of those that stood on it. Safe to send twice.
 *
 * Errors: 404; 409 where it is no draft any more; 422 and 409 as {@link refuseUnfree}.
 */
export async function replaceLines(db: Database, list: ListRef, cylinderIds: readonly string[]): Promise<void> {
  const { heads, lines, key, word } = LISTS[list.kind]
  await refuseUnlessDraft(db, list)
  await refuseUnfree(db, list, cylinderIds)

  const free = freeFor(list, cylinderIds)
  const mayChange: Guard = {
    sql: `EXISTS (SELECT 1 FROM ${heads} WHERE id = ? AND state = 'draft') AND ${free.sql}`,
    args: [list.id, ...free.args],
  }
  const [allowed] = await db.write([
    { sql: `SELECT 1 WHERE ${mayChange.sql}`, args: mayChange.args },
    { sql: `DELETE FROM open_lines WHERE list_id = ? AND ${mayChange.sql}`, args: [list.id, ...mayChange.args] },
    { sql: `DELETE FROM ${lines} WHERE ${key} = ? AND ${mayChange.sql}`, args: [list.id, ...mayChange.args] },
    ...newLines(list, cylinderIds, mayChange),
  ])
  if (allowed?.rows.length === 1) return
  await refuseUnlessDraft(db, list)
  await refuseUnfree(db, list, cylinderIds)
  throw problem(409, `The ${word} was not changed`, 'Somebody changed the same cylinders just now. Try again.')
}

/**
 * Gives a draft up; its cylinders are free for other lists. Safe to send twice.
 *
 * Errors: 404; 409 where the cylinders have left.
 */
export async function cancelDraft(db: Database, list: ListRef): Promise<void> {
  const { heads } = LISTS[list.kind]
  await db.write([
    { sql: `UPDATE ${heads} SET state = 'cancelled' WHERE id = ? AND state = 'draft'`, args: [list.id] },
    {
      sql: `DELETE FROM open_lines WHERE list_id = ? AND EXISTS (SELECT 1 FROM ${heads} WHERE id = ? AND state = 'cancelled')`,
      args: [list.id, list.id],
    },
  ])
  if (await stateOf(db, list) !== 'cancelled') await refuseUnlessDraft(db, list)
}

/** Errors: 404; 409 where the list is no draft any more. */
export async function refuseUnlessDraft(db: Database, list: ListRef): Promise<void> {
  const { word } = LISTS[list.kind]
  const state = await stateOf(db, list)
  if (state === null) throw problem(404, `No such ${word}`, 'It may have been written wrongly.')
  if (state !== 'draft') throw problem(409, `This ${word} is no draft`, `It is ${state}; its lines stand as they are.`)
}

/** Lines in the order given, each with the key that keeps a cylinder off a second list. */
function newLines(list: ListRef, cylinderIds: readonly string[], guard: Guard): InStatement[] {
  const { lines, key } = LISTS[list.kind]
  const ids = JSON.stringify(cylinderIds)
  return [
    {
      sql: `INSERT INTO open_lines (cylinder_id, list_kind, list_id)
        SELECT value, ?, ? FROM json_each(?) WHERE ${guard.sql} ON CONFLICT DO NOTHING`,
      args: [list.kind, list.id, ids, ...guard.args],
    },
    {
      sql: `INSERT INTO ${lines} (${key}, cylinder_id, position)
        SELECT ?, value, key FROM json_each(?) WHERE ${guard.sql} ON CONFLICT DO NOTHING`,
      args: [list.id, ids, ...guard.args],
    },
  ]
}

async function stateOf(db: Database, list: ListRef): Promise<string | null> {
  const { rows } = await db.readClient.execute({ sql: `SELECT state FROM ${LISTS[list.kind].heads} WHERE id = ?`, args: [list.id] })
  return (rows[0]?.[0] as string | undefined) ?? null
}

/** Errors: 409 where a list of another content has this id. */
async function isDraftedAlready(db: Database, list: ListRef, draft: NewList): Promise<boolean> {
  const { heads, firm, word } = LISTS[list.kind]
  const { rows } = await db.readClient.execute({ sql: `SELECT ${firm}, note, created_by FROM ${heads} WHERE id = ?`, args: [list.id] })
  const row = rows[0]
  if (!row) return false
  if (row[0] === draft.firmId && row[1] === draft.note && row[2] === draft.createdBy) return true
  throw problem(409, `Another ${word} has this id`, 'Send it again under a new id.')
}

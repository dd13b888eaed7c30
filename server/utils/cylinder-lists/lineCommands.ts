import type { EventResult } from '~~/utils/contract/custody'
import type { Finding } from '~~/utils/custody/finding'
import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { LISTS, type ListRef } from './lists'

/** Holds where a list has these lines and no others. */
export function hasLines(list: ListRef, cylinderIds: readonly string[]): Guard {
  const { lines, key } = LISTS[list.kind]
  return {
    sql: `(SELECT count(*) FROM ${lines} WHERE ${key} = ?) = ?
      AND NOT EXISTS (SELECT 1 FROM ${lines} WHERE ${key} = ? AND cylinder_id NOT IN (SELECT value FROM json_each(?)))`,
    args: [list.id, cylinderIds.length, list.id, JSON.stringify(cylinderIds)],
  }
}

/** Errors: 409 where the lines told are not those of the list. */
export function refuseOtherLines(told: readonly string[], ofList: readonly string[]): void {
  const [toldIds, listIds] = [new Set(told), new Set(ofList)]
  const strange = told.flatMap((id, index) => listIds.has(id) ? [] : [{ path: `lines.${index}.cylinderId`, message: 'does not stand on it' }])
  const absent = ofList.filter(id => !toldIds.has(id)).map(id => ({ path: 'lines', message: `${id} is missing` }))
  const errors = [...strange, ...absent]
  if (errors.length > 0) throw problem(409, 'The lines have changed', 'Look at the list again, then decide.', errors)
}

/** When events took effect, as the log has it once they are written. */
export function effectOf(eventIds: readonly string[]): Guard {
  return { sql: '(SELECT max(effective_at) FROM custody_events WHERE id IN (SELECT value FROM json_each(?)))', args: [JSON.stringify(eventIds)] }
}

/** Whether every one of these events is in the log already: the same request was sent before. */
export async function areRecorded(db: Database, eventIds: readonly string[]): Promise<boolean> {
  const { rows } = await db.readClient.execute({
    sql: 'SELECT count(*) FROM custody_events WHERE id IN (SELECT value FROM json_each(?))', args: [JSON.stringify(eventIds)],
  })
  return rows[0]?.[0] === eventIds.length
}

/**
 * Errors: 409 with the reasons of each line where one may not leave.
 *
 * @param because the reasons of each line, in the order of the lines; empty for one that may leave.
 */
export function refuseHeldBack(because: readonly (readonly Finding[])[]): void {
  const errors = because.flatMap((reasons, index) => reasons.map(reason => ({ path: `lines.${index}`, message: reason.text })))
  if (errors.length > 0) throw problem(409, 'Nothing has left', 'One line or more may not leave. Mend it, or take it off the list.', errors, { type: 'held-back' })
}

/**
 * Errors: where the custody log refused one of a request's events, the same refusal with each line's reason.
 *
 * @param lineOf the line that an event belongs to, by the event's place in the request.
 */
export function refuseRefused(results: readonly EventResult[], lineOf: (event: number) => number = event => event): void {
  const refused = results.flatMap((result, index) => result.outcome === 'refused' && result.problem ? [{ problem: result.problem, line: lineOf(index) }] : [])
  const first = refused.find(one => one.problem.title !== 'Held back') ?? refused[0]
  if (!first) return
  const errors = refused.filter(one => one.problem.title === first.problem.title)
    .map(one => ({ path: `lines.${one.line}`, message: one.problem.detail }))
  throw problem(first.problem.status, first.problem.title, 'None of the lines was recorded.', errors)
}

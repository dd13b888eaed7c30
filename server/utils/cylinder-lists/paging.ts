import type { InValue } from '@libsql/client'
import { foreignCursor } from '../http/cursor'
import { LISTS, type ListKind } from './lists'

/**
 * The condition for the lists of a state that come after the page before; they count down by their numbers.
 *
 * @param stateSql what a list's state is, where its column does not say it alone.
 * Errors: 400 for a cursor that is none of ours.
 */
export function pageFilter(kind: ListKind, { state, cursor }: { state?: string, cursor?: string }, stateSql?: string): { sql: string, args: InValue[] } {
  const { heads } = LISTS[kind]
  if (cursor !== undefined && !/^[1-9]\d{0,14}$/.test(cursor)) throw foreignCursor()
  return {
    sql: `(? IS NULL OR ${stateSql ?? `${heads}.state`} = ?) AND (? IS NULL OR ${heads}.number < ?)`,
    args: [state ?? null, state ?? null, cursor ? Number(cursor) : null, cursor ? Number(cursor) : null],
  }
}

/** A page of lists that count down, from one more than its limit. */
export function pageByNumber<T extends { number: number }>(found: readonly T[], limit: number): { items: T[], nextCursor: string | null } {
  const items = found.slice(0, limit)
  return { items, nextCursor: found.length > limit ? String(items.at(-1)!.number) : null }
}

/** An instant of a row as the API says it. */
export function instantText(ms: InValue | undefined): string | null {
  return typeof ms === 'number' ? new Date(ms).toISOString() : null
}

/** The columns of a line of the custody log that its hash covers, in their fixed order. */
export const HASHED_COLUMNS = [
  'prev_hash', 'seq', 'id', 'cylinder_id', 'version', 'device_id', 'device_seq', 'kind', 'occurred_at', 'occurred_offset_minutes',
  'clock_skew_seconds', 'effective_at', 'recorded_at', 'actor_id', 'posted_by', 'supervisor_id', 'trainee', 'place_id', 'body', 'content_hash',
] as const

export type HashedColumn = (typeof HASHED_COLUMNS)[number]

/** A line as it is stored, without its own hash. Flags are 0 or 1. */
export type HashedColumns = Record<HashedColumn, string | number | null>

/** SHA-256 of a text in UTF-8, hexadecimal in lower case. */
export type Sha256 = (text: string) => string

/**
 * The text that a line's hash is taken of: a JSON array of the values in {@link HASHED_COLUMNS}, the hash of the line
 * before it first.
 *
 * Errors: TypeError where a column is neither a text, a whole number nor null, for then two lines could have one form.
 */
export function chainForm(columns: HashedColumns): string {
  return JSON.stringify(HASHED_COLUMNS.map((column) => {
    const value = columns[column]
    if (value !== null && typeof value !== 'string' && !Number.isSafeInteger(value)) throw new TypeError(`Cannot be hashed: ${column}`)
    return value
  }))
}

/** The hash that closes a line. */
export function hashEvent(columns: HashedColumns, sha256: Sha256): string {
  return sha256(chainForm(columns))
}

/** What a line must follow: the version and the hash of the line before it; 0 and '' before the first. */
export interface ChainHead { version: number, hash: string }

/** What may be wrong with a line after the one before it. */
export type ChainFault = 'missing-before' | 'unlinked' | 'changed'

/** What is wrong with a line after the one before it; null where nothing is. */
export function verifyStep(line: HashedColumns & { hash: string }, before: ChainHead, sha256: Sha256): ChainFault | null {
  if (line.version !== before.version + 1) return 'missing-before'
  if (line.prev_hash !== before.hash) return 'unlinked'
  return isClosed(line, sha256) ? null : 'changed'
}

// A value that no line can have is a change as well.
function isClosed(line: HashedColumns & { hash: string }, sha256: Sha256): boolean {
  try {
    return hashEvent(line, sha256) === line.hash
  }
  catch {
    return false
  }
}

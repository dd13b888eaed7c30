/** The database takes or gives nothing just now: answered as 503, never as success. */
export class StorageUnavailable extends Error {}

/** Codes by which SQLite and its drivers say that the storage, not the statement, is at fault. */
const STORAGE_CODES = /^(SQLITE_(FULL|READONLY|IOERR|CANTOPEN|CORRUPT|NOTADB|BUSY|LOCKED|PROTOCOL|NOMEM)|HRANA_WEBSOCKET_ERROR|SERVER_ERROR|CLIENT_CLOSED|HTTP_STATUS_ERROR)/
const STORAGE_WORDS = /database or disk is full|readonly database|disk I\/O error|unable to open database|malformed|database is locked|fetch failed|ECONN/i

/** The error as a storage failure, or null where the statement itself is at fault. */
export function storageFailure(error: unknown): StorageUnavailable | null {
  if (error instanceof StorageUnavailable) return error
  const { code, message, cause } = error as { code?: string, message?: string, cause?: { code?: string, message?: string } }
  const codes = [code, cause?.code].filter(value => typeof value === 'string')
  if (codes.some(value => STORAGE_CODES.test(value))) return new StorageUnavailable(message)
  if ([message, cause?.message].some(value => STORAGE_WORDS.test(value ?? ''))) return new StorageUnavailable(message)
  return null
}

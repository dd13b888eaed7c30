import { Problem, problem } from './problem'

/** Failures of the disk or the connection under the database, not of the request. */
const UNAVAILABLE = /^(SQLITE_(FULL|READONLY|IOERR|CANTOPEN|BUSY|LOCKED|CORRUPT|NOTADB|PROTOCOL)|HRANA_|SERVER_ERROR)/

/**
 * What the caller is told about a failure: its own problem, 503 where the database cannot be used, else 500.
 * Nothing of the failure itself gets out.
 */
export function asProblem(error: unknown): Problem {
  if (error instanceof Problem) return error
  const code = databaseCode(error)
  if (code && UNAVAILABLE.test(code)) {
    const detail = code.startsWith('SQLITE_FULL')
      ? 'The disk of the server is full. Nothing was stored; what is recorded already is safe.'
      : 'The database cannot be used just now. Nothing was stored; try again later.'
    return problem(503, 'The database is not available', detail, undefined, { type: 'database-unavailable', headers: { 'Retry-After': '30' } })
  }
  return problem(500, 'Something went wrong', 'The server failed. It is not known whether this was stored: look before you send it again.')
}

/** The driver's code of an error, or of the one that caused it. */
function databaseCode(error: unknown): string | null {
  for (let at: unknown = error, depth = 0; at instanceof Error && depth < 5; at = at.cause, depth++) {
    const { code } = at as { code?: unknown }
    if (typeof code === 'string' && UNAVAILABLE.test(code)) return code
  }
  return null
}

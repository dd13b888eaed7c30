import { storageFailure } from '../database/storageFailure'
import { Problem, problem } from './problem'

/**
 * What the caller is told about a failure: its own problem, 503 where the database cannot be used, else 500.
 * Nothing of the failure itself gets out.
 */
export function asProblem(error: unknown): Problem {
  if (error instanceof Problem) return error
  const failure = storageFailure(error)
  if (failure) {
    const detail = /full/i.test(failure.message)
      ? 'The disk of the server is full. Nothing was stored; what is recorded already is safe.'
      : 'The database cannot be used just now. Nothing was stored; try again later.'
    return problem(503, 'The database is not available', detail, undefined, { type: 'database-unavailable', headers: { 'Retry-After': '30' } })
  }
  return problem(500, 'Something went wrong', 'The server failed. It is not known whether this was stored: look before you send it again.')
}

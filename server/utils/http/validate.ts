import type { z } from 'zod'
import type { ProblemError } from '../../../utils/contract/problem'
import { problem } from './problem'

/**
 * The value as its schema has it.
 *
 * Errors: 400 with every field that does not fit.
 */
export function validate<S extends z.ZodType>(schema: S, value: unknown, what: 'path' | 'query' | 'body'): z.output<S> {
  const result = schema.safeParse(value)
  if (result.success) return result.data
  throw problem(400, 'Malformed', `The ${what} does not fit.`, result.error.issues.flatMap(fieldErrors))
}

/**
 * The query of a URL, each key once.
 *
 * Errors: 400 for a key that stands twice: which of them was meant cannot be known.
 */
export function queryOf(path: string): Record<string, string> {
  const mark = path.indexOf('?')
  const query = new Map<string, string>()
  for (const [key, value] of new URLSearchParams(mark < 0 ? '' : path.slice(mark + 1))) {
    if (query.has(key)) throw problem(400, 'Malformed', 'The query does not fit.', [{ path: key, message: 'stands more than once' }])
    query.set(key, value)
  }
  return Object.fromEntries(query)
}

function fieldErrors(issue: z.core.$ZodIssue): ProblemError[] {
  const path = issue.path.map(String)
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map(key => ({ path: [...path, key].join('.'), message: 'is not known here' }))
  }
  return [{ path: path.join('.'), message: issue.message }]
}

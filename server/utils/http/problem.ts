import { send, setResponseHeader, setResponseHeaders, setResponseStatus, type H3Event } from 'h3'
import type { ProblemDetails, ProblemError } from '../../../utils/contract/problem'

interface ProblemOptions {
  /** A stable code of ours, where a screen acts on it. */
  type?: string
  errors?: ProblemError[]
  /** Further response headers, such as Retry-After. */
  headers?: Record<string, string>
}

/** Something to tell the caller instead of the answer; thrown anywhere below a route. */
export class Problem extends Error {
  readonly details: ProblemDetails
  readonly headers: Record<string, string>

  constructor(status: number, title: string, detail: string, options: ProblemOptions = {}) {
    super(`${status} ${title}`)
    this.name = 'Problem'
    this.headers = options.headers ?? {}
    this.details = { type: options.type ?? 'about:blank', title, status, detail }
    if (options.errors) this.details.errors = options.errors
  }
}

/**
 * A problem to throw.
 *
 * Example: `throw problem(409, 'Last admin', 'Make another person admin first.')`
 */
export function problem(status: number, title: string, detail: string, errors?: ProblemError[], options: ProblemOptions = {}): Problem {
  return new Problem(status, title, detail, errors ? { ...options, errors } : options)
}

/** Answers with problem details (RFC 9457) in place of whatever was prepared. */
export function sendProblem(event: H3Event, { details, headers }: Problem): Promise<void> {
  setResponseStatus(event, details.status)
  setResponseHeaders(event, headers)
  setResponseHeader(event, 'Content-Type', 'application/problem+json')
  setResponseHeader(event, 'Cache-Control', 'no-store')
  return send(event, JSON.stringify(details))
}

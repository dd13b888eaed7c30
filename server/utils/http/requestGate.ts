import { isTooLarge, tooLarge } from './boundedBody'
import { isForm } from './formBody'
import { largestForm } from './formLimits'
import { isJson, LARGEST_BODY } from './jsonBody'
import { problem, type Problem } from './problem'

const SAFE_METHODS = new Set(['GET', 'HEAD', 'OPTIONS'])

/** What the gate looks at; header names in lower case. */
export interface GateRequest {
  method: string
  path: string
  headers: Record<string, string | string[] | undefined>
}

/**
 * Why a request is turned away before anything looks at it, or null. What changes something must come from our own
 * pages (Fetch Metadata, else the Origin), and hold nothing but JSON, or the form of a photo, of a bounded size.
 */
export function refusalAtGate({ method, path, headers }: GateRequest): Problem | null {
  // The session package's own routes hand out and clear sessions without our rows.
  if (/^\/api\/_auth(\/|\?|$)/.test(path)) return problem(404, 'Not known', 'There is nothing here.')
  if (SAFE_METHODS.has(method)) return null
  if (!isOwnPage(headers)) return problem(403, 'From elsewhere', 'This may be asked only by our own pages.', undefined, { type: 'cross-site' })
  if (!path.startsWith('/api/')) return problem(404, 'Not known', 'There is nothing here.')
  if (!hasBody(headers)) return null
  const [length, type] = [one(headers['content-length']), one(headers['content-type'])]
  const largest = largestForm(path)
  if (largest !== null) {
    if (isTooLarge(length, largest)) return tooLarge(largest)
    return isForm(type) ? null : problem(415, 'Not a form', 'A file must be sent as multipart/form-data.')
  }
  if (isTooLarge(length, LARGEST_BODY)) return tooLarge(LARGEST_BODY)
  if (!isJson(type)) return problem(415, 'Not JSON', 'The body must be sent as application/json.')
  return null
}

function isOwnPage(headers: GateRequest['headers']): boolean {
  const site = one(headers['sec-fetch-site'])
  if (site !== undefined) return site === 'same-origin'
  const origin = one(headers.origin)
  const host = one(headers.host)
  return origin !== undefined && host !== undefined && URL.canParse(origin) && new URL(origin).host === host.toLowerCase()
}

function hasBody(headers: GateRequest['headers']): boolean {
  const length = one(headers['content-length'])
  return headers['transfer-encoding'] !== undefined || (length !== undefined && length !== '0')
}

/** A header that stands once; a repeated one is as good as none. */
function one(value: string | string[] | undefined): string | undefined {
  return typeof value === 'string' ? value : undefined
}

import { getRequestHeader, type H3Event } from 'h3'
import { boundedBody } from './boundedBody'
import { problem } from './problem'

/** The largest body of JSON that is read, in bytes. */
export const LARGEST_BODY = 512 * 1024

const HIDDEN_PROTOTYPE = /__proto__|\\u005f/i

/**
 * The JSON of a request, counted while it arrives, so that a false length does not get past the limit.
 *
 * Errors: 415 where it is not JSON by its type, 413 too large, 400 empty or malformed.
 */
export async function readJsonBody(event: H3Event): Promise<unknown> {
  if (!isJson(getRequestHeader(event, 'content-type'))) {
    throw problem(415, 'Not JSON', 'The body must be sent as application/json.')
  }
  const text = await readText(event)
  if (text.trim() === '') throw malformed('The body is empty.')
  return parseJson(text)
}

/** Whether a content type is JSON in UTF-8. */
export function isJson(contentType: string | undefined): boolean {
  return /^application\/json\s*(;\s*charset="?utf-8"?\s*)?$/i.test(contentType ?? '')
}

/**
 * Parses JSON that may come from anybody.
 *
 * Errors: 400 where it is malformed, or tries to reach an object's prototype.
 */
export function parseJson(text: string): unknown {
  try {
    return HIDDEN_PROTOTYPE.test(text) ? JSON.parse(text, refusePrototype) : JSON.parse(text)
  }
  catch {
    throw malformed('The body is not well-formed JSON.')
  }
}

function refusePrototype(key: string, value: unknown): unknown {
  if (key === '__proto__') throw new Error('A key reaches the prototype')
  return value
}

async function readText(event: H3Event): Promise<string> {
  const bytes = await boundedBody(event, LARGEST_BODY)
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes)
  }
  catch {
    throw malformed('The body is not UTF-8.')
  }
}

function malformed(detail: string) {
  return problem(400, 'Malformed', detail)
}

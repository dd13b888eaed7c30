import { getRequestHeader, type H3Event } from 'h3'
import { boundedBody } from './boundedBody'
import { largestForm } from './formLimits'
import { problem } from './problem'

/** Whether a content type is a form that can hold a file. */
export function isForm(contentType: string | undefined): boolean {
  return /^multipart\/form-data\s*;\s*boundary=\S/i.test(contentType ?? '')
}

/**
 * The fields of a form, each once: text as text, a file as its bytes. What a file is called, and what type it says it
 * is of, is not believed and not kept.
 *
 * Errors: 415 where it is none by its type, 413 too large, 400 malformed or with a field that stands twice.
 */
export async function readFormBody(event: H3Event): Promise<Record<string, string | Uint8Array>> {
  const type = getRequestHeader(event, 'content-type')
  const largest = largestForm(event.path)
  if (largest === null || !isForm(type)) throw problem(415, 'Not a form', 'A file must be sent as multipart/form-data.')
  const form = await parsed(await boundedBody(event, largest), type!)
  const fields = new Map<string, string | Uint8Array>()
  for (const [name, value] of form) {
    if (fields.has(name)) throw problem(400, 'Malformed', 'The body does not fit.', [{ path: name, message: 'stands more than once' }])
    fields.set(name, typeof value === 'string' ? value : new Uint8Array(await value.arrayBuffer()))
  }
  return Object.fromEntries(fields)
}

async function parsed(bytes: Buffer, type: string): Promise<FormData> {
  try {
    return await new Response(new Uint8Array(bytes), { headers: { 'content-type': type } }).formData()
  }
  catch {
    throw problem(400, 'Malformed', 'The body is not a well-formed form.')
  }
}

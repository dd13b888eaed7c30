const INSTANT = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}:\d{2}(\.\d+)?(Z|[+-]\d{2}:\d{2})$/

/** An instant with its offset as an address holds it; null where the text is none. @example readInstant('2026-12-01T09:30:00Z') */
export function readInstant(text: string): string | null {
  return INSTANT.test(text) && !Number.isNaN(Date.parse(text)) ? text : null
}

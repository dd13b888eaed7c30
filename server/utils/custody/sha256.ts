import { hash } from 'node:crypto'

/** SHA-256 of a text (UTF-8), hexadecimal in lower case. */
export function sha256(text: string): string {
  return hash('sha256', text)
}

import { pictureKind } from '../photo/pictureKind'

/** The largest statement or certificate that is taken, in bytes. */
export const LARGEST_FILE = 10 * 1024 * 1024

/** The largest table of values that is read, in bytes: two hundred lines of text are far less. */
export const LARGEST_STATEMENT = 512 * 1024

/** The kinds of file that a statement or certificate comes as. */
export type FileKind = 'pdf' | 'jpeg' | 'png' | 'csv'

/** How each kind is served, and what its name ends with. */
export const FILE_KINDS: Record<FileKind, { mediaType: string, ending: string }> = {
  pdf: { mediaType: 'application/pdf', ending: 'pdf' },
  jpeg: { mediaType: 'image/jpeg', ending: 'jpg' },
  png: { mediaType: 'image/jpeg', ending: 'jpg' },
  csv: { mediaType: 'text/csv', ending: 'csv' },
}

const PDF_SIGNATURE = [0x25, 0x50, 0x44, 0x46, 0x2D]
const [TAB, LINE_FEED, RETURN, SPACE, DELETED] = [0x09, 0x0A, 0x0D, 0x20, 0x7F]
const [COMMA, SEMICOLON, LESS_THAN] = [0x2C, 0x3B, 0x3C]
const LONGEST_NAME = 100

/**
 * What kind of file it is by its content, whatever it is called; null where it is none that is taken.
 *
 * A table of values has no signature: it is a text without control characters, whose first line holds a delimiter, and
 * no markup, which a browser might take for a page.
 *
 * Source, from memory: PDF by ISO 32000-2, 7.5.2; the pictures as for photos.
 */
export function fileKind(bytes: Uint8Array): FileKind | null {
  if (PDF_SIGNATURE.every((byte, at) => bytes[at] === byte)) return 'pdf'
  const picture = pictureKind(bytes)
  if (picture === 'jpeg' || picture === 'png') return picture
  return picture === null && isTable(bytes) ? 'csv' : null
}

/** A file's name with nothing in it but letters, figures and a few signs, and the ending of what it is. */
export function cleanFileName(name: string, kind: FileKind): string {
  const last = name.normalize('NFC').split(/[\\/]/).at(-1)!
  const stem = last.replace(/\.[^.]*$/, '').replace(/[^\p{L}\p{N} _.()-]/gu, '').replace(/\.{2,}/g, '.').replace(/\s+/g, ' ').replace(/^[ .]+|[ .]+$/g, '')
  return `${[...stem].slice(0, LONGEST_NAME).join('').trim() || 'file'}.${FILE_KINDS[kind].ending}`
}

function isTable(bytes: Uint8Array): boolean {
  let hasDelimiter = false
  let isFirstLine = true
  for (const byte of bytes) {
    if (byte === LESS_THAN || byte === DELETED) return false
    if (byte < SPACE && byte !== TAB && byte !== LINE_FEED && byte !== RETURN) return false
    if (byte === LINE_FEED || byte === RETURN) isFirstLine = false
    if (isFirstLine && (byte === COMMA || byte === SEMICOLON || byte === TAB)) hasDelimiter = true
  }
  return hasDelimiter
}

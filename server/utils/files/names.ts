import { createHash } from 'node:crypto'

/** SHA-256 (hexadecimal) of a file: by it a photo is known again. */
export function hashOf(file: Uint8Array): string {
  return createHash('sha256').update(file).digest('hex')
}

/** The file of a photo as it is kept: named by its content, so that no two photos meet and none can be put in its place. */
export function pictureName(contentHash: string): string {
  return `${contentHash}.jpg`
}

/** The file of its thumbnail. */
export function thumbName(contentHash: string): string {
  return `${contentHash}-thumb.jpg`
}

import { createHash } from 'node:crypto'

/** SHA-256 of some bytes, given in parts. */
export function sha256OfBytes(...parts: Uint8Array[]): Uint8Array {
  const hash = createHash('sha256')
  for (const part of parts) hash.update(part)
  return hash.digest()
}

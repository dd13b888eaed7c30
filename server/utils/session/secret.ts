import { createHash, randomBytes } from 'node:crypto'

const SECRET_BYTES = 32

/** A fresh secret of 256 bits, in 43 characters that may stand in a URL. */
export function newSecret(): string {
  return randomBytes(SECRET_BYTES).toString('base64url')
}

/** What is stored of a secret: who reads the database cannot use it. */
export function secretHash(secret: string): string {
  return createHash('sha256').update(secret).digest('hex')
}

/** What a dock link holds, and what signs it. Units: the expiry in UTC milliseconds, whole seconds. */
export interface LinkToken { linkId: string, expiresAt: number, mac: Uint8Array }

const ID_BYTES = 16
const EXPIRY_BYTES = 5
/** The first 192 of the 256 bits of the signature. Source: RFC 2104, section 5 (no fewer than half). */
export const MAC_BYTES = 24
const SIGNED_BYTES = ID_BYTES + EXPIRY_BYTES
const BYTES = SIGNED_BYTES + MAC_BYTES

// Base 64 for addresses (RFC 4648, section 5). 45 bytes fill 60 characters to the last bit, so no two texts are the same bytes.
const ALPHABET = 'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789-_'
const TOKEN = /^[A-Za-z0-9_-]{60}$/

/** A token as it stands in the address of a dock link; null where the text is none. Whether it was signed by us is not looked at. */
export function readToken(token: string): LinkToken | null {
  if (!TOKEN.test(token)) return null
  const bytes = bytesOf(token)
  const hex = [...bytes.subarray(0, ID_BYTES)].map(byte => byte.toString(16).padStart(2, '0')).join('')
  return {
    linkId: hex.replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5'),
    expiresAt: bytes.subarray(ID_BYTES, SIGNED_BYTES).reduce((sum, byte) => sum * 256 + byte, 0) * 1000,
    mac: bytes.subarray(SIGNED_BYTES),
  }
}

/** The token of a link and its signature. */
export function writeToken({ linkId, expiresAt, mac }: LinkToken): string {
  const bytes = new Uint8Array(BYTES)
  bytes.set(signedBytes({ linkId, expiresAt }))
  bytes.set(mac, SIGNED_BYTES)
  return textOf(bytes)
}

/** The bytes of a link that its signature is made of. */
export function signedBytes({ linkId, expiresAt }: Pick<LinkToken, 'linkId' | 'expiresAt'>): Uint8Array {
  const hex = linkId.replace(/-/g, '') + Math.floor(expiresAt / 1000).toString(16).padStart(2 * EXPIRY_BYTES, '0')
  return Uint8Array.from({ length: SIGNED_BYTES }, (_, at) => Number.parseInt(hex.slice(2 * at, 2 * at + 2), 16))
}

function bytesOf(text: string): Uint8Array {
  const bytes = new Uint8Array(BYTES)
  for (let at = 0; at < BYTES / 3; at++) {
    const group = [...text.slice(4 * at, 4 * at + 4)].reduce((sum, character) => sum * 64 + ALPHABET.indexOf(character), 0)
    bytes.set([group >> 16, group >> 8 & 255, group & 255], 3 * at)
  }
  return bytes
}

function textOf(bytes: Uint8Array): string {
  let text = ''
  for (let at = 0; at < BYTES; at += 3) {
    const group = bytes[at]! << 16 | bytes[at + 1]! << 8 | bytes[at + 2]!
    for (const shift of [18, 12, 6, 0]) text += ALPHABET.charAt(group >> shift & 63)
  }
  return text
}

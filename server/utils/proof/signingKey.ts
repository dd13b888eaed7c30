import { createHash, createPrivateKey, createPublicKey, sign, verify, type KeyObject } from 'node:crypto'
import { readNote, writeNote } from '../../../utils/proof/note'

/** The key that signs checkpoints, under the name of the log. */
export interface Signer {
  /** As C2SP signed-note writes it: name, id and key, between plus signs. */
  publicKey: string
  sign: (text: string) => string
}

/** What became of a signature: good, by a key that is not trusted, or false. */
export type SignatureVerdict = 'good' | 'other-key' | 'forged'

// C2SP signed-note: the type of an Ed25519 signature.
const ED25519 = Uint8Array.of(1)
const KEY_ID_BYTES = 4

// RFC 8410: what stands before the 32 bytes of an Ed25519 key in its DER form (PKCS #8, SPKI).
const PRIVATE_PREFIX = Buffer.from('302e020100300506032b657004220420', 'hex')
const PUBLIC_PREFIX = Buffer.from('302a300506032b6570032100', 'hex')

/**
 * A signer from its secret.
 *
 * @param seed 32 bytes. Source: RFC 8032, section 5.1.5.
 */
export function signerOf(name: string, seed: Uint8Array): Signer {
  const key = createPrivateKey({ key: Buffer.concat([PRIVATE_PREFIX, seed]), format: 'der', type: 'pkcs8' })
  const bytes = createPublicKey(key).export({ format: 'der', type: 'spki' }).subarray(PUBLIC_PREFIX.length)
  const id = keyId(name, bytes)
  return {
    publicKey: `${name}+${id.toString('hex')}+${Buffer.concat([ED25519, bytes]).toString('base64')}`,
    sign: text => writeNote({ text, signatures: [{ name, base64: Buffer.concat([id, sign(null, Buffer.from(text), key)]).toString('base64') }] }),
  }
}

/** Whether a note was signed by one of the keys that are trusted. A signature by any other key says nothing. */
export function judgeSignature(note: string, trusted: readonly string[]): SignatureVerdict {
  const parts = readNote(note)
  if (!parts) return 'forged'
  let verdict: SignatureVerdict = 'other-key'
  for (const { name, base64 } of parts.signatures) {
    const bytes = Buffer.from(base64, 'base64')
    const key = trusted.map(publicKeyOf).find(one => one?.name === name && one.id.equals(bytes.subarray(0, KEY_ID_BYTES)))
    if (!key) continue
    if (!verify(null, Buffer.from(parts.text), key.key, bytes.subarray(KEY_ID_BYTES))) return 'forged'
    verdict = 'good'
  }
  return verdict
}

/** A public key as C2SP signed-note writes it; null where the text is none, or its id not its own. */
export function publicKeyOf(text: string): { name: string, id: Buffer, key: KeyObject } | null {
  const [, name, id, base64] = /^([^\s+]+)\+([0-9a-f]{8})\+([A-Za-z0-9+/]{44})$/.exec(text) ?? []
  if (name === undefined || id === undefined || base64 === undefined) return null
  const bytes = Buffer.from(base64, 'base64')
  if (bytes[0] !== ED25519[0] || !keyId(name, bytes.subarray(1)).equals(Buffer.from(id, 'hex'))) return null
  const key = createPublicKey({ key: Buffer.concat([PUBLIC_PREFIX, bytes.subarray(1)]), format: 'der', type: 'spki' })
  return { name, id: Buffer.from(id, 'hex'), key }
}

function keyId(name: string, bytes: Uint8Array): Buffer {
  return createHash('sha256').update(`${name}\n`).update(ED25519).update(bytes).digest().subarray(0, KEY_ID_BYTES)
}

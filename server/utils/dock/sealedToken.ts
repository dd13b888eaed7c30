import { createHmac, hkdfSync, timingSafeEqual } from 'node:crypto'
import { MAC_BYTES, readToken, signedBytes, writeToken, type LinkToken } from '../../../utils/dock/linkToken'
import { useEnvironment } from '../environment'

type Link = Pick<LinkToken, 'linkId' | 'expiresAt'>

/** A key of its own, so that nothing else that the server signs is ever a dock link. Source: RFC 5869. */
const LABEL = 'collarbook dock link 1'
const KEY_BYTES = 32

/** The token of a link, made of nothing that is stored: who reads the database has none. */
export function sealedToken(link: Link, secret = useEnvironment().secret): string {
  return writeToken({ ...link, mac: macOf(link, secret) })
}

/** The link that a token of ours names; null where it was not signed by us, as it is with one character changed. */
export function linkOfToken(token: string, secret = useEnvironment().secret): Link | null {
  const read = readToken(token)
  if (!read || !timingSafeEqual(macOf(read, secret), read.mac)) return null
  return { linkId: read.linkId, expiresAt: read.expiresAt }
}

function macOf(link: Link, secret: string): Uint8Array {
  const key = new Uint8Array(hkdfSync('sha256', secret, '', LABEL, KEY_BYTES))
  return createHmac('sha256', key).update(signedBytes(link)).digest().subarray(0, MAC_BYTES)
}

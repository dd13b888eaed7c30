import { describe, expect, it } from 'vitest'
import { MAC_BYTES, readToken, signedBytes, writeToken } from '../../../../utils/dock/linkToken'

const linkId = '01935c2f-7d41-7c22-9f0a-0123456789ab'
const expiresAt = Date.UTC(2027, 0, 1)
const mac = Uint8Array.from({ length: MAC_BYTES }, (_, at) => at)

describe('the token of a dock link', () => {
  it('is the bytes of its link, its expiry and its signature in base 64 for addresses', () => {
    // 2027-01-01T00:00:00Z is 1798761600 s, 0x6B36EC80; the rest by hand from RFC 4648.
    const bytes = Buffer.concat([Buffer.from('01935c2f7d417c229f0a0123456789ab', 'hex'), Buffer.from('006b36ec80', 'hex'), mac])
    expect(writeToken({ linkId, expiresAt, mac })).toBe(bytes.toString('base64url'))
    expect(Buffer.from(signedBytes({ linkId, expiresAt }))).toEqual(bytes.subarray(0, 21))
  })

  it('is read as it was written', () => {
    expect(readToken(writeToken({ linkId, expiresAt, mac }))).toEqual({ linkId, expiresAt, mac })
  })

  it('is none with a character more or less, with padding, or in another alphabet', () => {
    const token = writeToken({ linkId, expiresAt, mac })
    for (const other of [token.slice(1), `${token}A`, `${token}=`, `${token.slice(0, -1)}+`, `${token.slice(0, -1)}/`, `${token}\n`, '']) expect(readToken(other)).toBeNull()
  })

  it('has no second spelling: another character anywhere is another link, another expiry or another signature', () => {
    const token = writeToken({ linkId, expiresAt, mac })
    for (let at = 0; at < token.length; at++) {
      const other = readToken(token.slice(0, at) + (token[at] === 'A' ? 'B' : 'A') + token.slice(at + 1))
      expect(other).not.toEqual({ linkId, expiresAt, mac })
    }
  })
})

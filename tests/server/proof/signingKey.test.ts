import { describe, expect, it } from 'vitest'
import { judgeSignature, publicKeyOf, signerOf } from '../../../server/utils/proof/signingKey'
import { readNote } from '../../../utils/proof/note'

// RFC 8032, section 7.1, TEST 1 and 2: secret, public key, message, signature.
const RFC_8032 = [
  [
    '9d61b19deffd5a60ba844af492ec2cc44449c5697b326919703bac031cae7f60', 'd75a980182b10ab7d54bfed3c964073a0ee172f3daa62325af021a68f707511a', '',
    'e5564300c360ac729086e2cc806e828a84877f1eb8e5d974d873e065224901555fb8821590a33bacc61e39701cf9b46bd25bf5f0595bbe24655141438e7a100b',
  ],
  [
    '4ccd089b28ff96da9db6c346ec114e0f5b8a319f35aba624da8cf6ed4fb8a6fb', '3d4017c3e843895a92b70aa74d1b7ebc9c982ccf2ec4968cc0cd55f12af4660c', '72',
    '92a009a9f0d4cab8720e820b5f642540a2b27b5416503f8fb3762223ebdb69da085ac1e43e15996e458f3613d0f11d8c387b2eaeb4302aeeb00d291612bb0c00',
  ],
]

// The example of golang.org/x/mod/sumdb/note (note_test.go), on which C2SP signed-note rests.
const NAME = 'PeterNeumann'
const SECRET = Buffer.from('AYEKFALVFGyNhPJEMzD1QIDr+Y7hfZx09iUvxdXHKDFz', 'base64').subarray(1)
const PUBLIC = 'PeterNeumann+c74f20a3+ARpc2QcUPDhMQegwxbzhKqiBfsVkmqq/LDE4izWy10TW'
const TEXT = 'If you think cryptography is the answer to your problem,\nthen you don\'t know what your problem is.\n'
const NOTE = `${TEXT}\n\u2014 PeterNeumann x08go/ZJkuBS9UG/SffcvIAQxVBtiFupLLr8pAcElZInNIuGUgYN1FFYC2pZSNXgKvqfqdngotpRZb6KE6RyyBwJnAM=\n`

describe('the key of the checkpoints', () => {
  it.each(RFC_8032)('signs as the standard prints it: secret %s', (secret, publicKey, message, signature) => {
    const signer = signerOf('log', Buffer.from(secret, 'hex'))
    expect(Buffer.from(signer.publicKey.split('+').slice(2).join('+'), 'base64').toString('hex')).toBe(`01${publicKey}`)
    const signed = signer.sign(Buffer.from(message, 'hex').toString('latin1'))
    const [base64] = signed.split(' ').slice(-1)
    // Four bytes say which key; the rest is the signature.
    expect(Buffer.from(base64!, 'base64').subarray(4).toString('hex')).toBe(signature)
  })

  it('writes the published note, byte for byte', () => {
    const signer = signerOf(NAME, SECRET)
    expect(signer.publicKey).toBe(PUBLIC)
    expect(signer.sign(TEXT)).toBe(NOTE)
  })

  it('takes no public key whose id is not its own', () => {
    expect(publicKeyOf(PUBLIC)).not.toBeNull()
    expect(publicKeyOf(PUBLIC.replace('c74f20a3', 'c74f20a4'))).toBeNull()
    expect(publicKeyOf(PUBLIC.replace('PeterNeumann', 'PeterNewmann'))).toBeNull()
    expect(publicKeyOf('PeterNeumann')).toBeNull()
  })
})

describe('a signature', () => {
  it('is good where a trusted key made it', () => {
    expect(judgeSignature(NOTE, [PUBLIC])).toBe('good')
  })

  it('is forged where any character of the text was changed', () => {
    for (let at = 0; at < TEXT.length; at++) {
      const changed = `${NOTE.slice(0, at)}${NOTE[at] === 'x' ? 'y' : 'x'}${NOTE.slice(at + 1)}`
      expect(judgeSignature(changed, [PUBLIC]), changed).toBe('forged')
    }
  })

  it('is by another key where only that one made it', () => {
    const other = signerOf(NAME, Buffer.alloc(32, 7))
    expect(judgeSignature(other.sign(TEXT), [PUBLIC])).toBe('other-key')
    expect(judgeSignature(other.sign(TEXT), [PUBLIC, other.publicKey])).toBe('good')
  })

  it('is none on a text that is no note', () => {
    expect(judgeSignature(TEXT, [PUBLIC])).toBe('forged')
    expect(readNote(TEXT)).toBeNull()
  })
})

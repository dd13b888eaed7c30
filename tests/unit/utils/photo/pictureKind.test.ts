import { describe, expect, it } from 'vitest'
import { pictureKind } from '../../../../utils/photo/pictureKind'

const bytes = (text: string) => Uint8Array.from(text, character => character.charCodeAt(0))

describe('the kind of a picture', () => {
  it('is told by its first bytes', () => {
    expect(pictureKind(bytes('\xFF\xD8\xFF\xE0\x00\x10JFIF'))).toBe('jpeg')
    expect(pictureKind(bytes('\x89PNG\r\n\x1A\n\0\0\0\rIHDR'))).toBe('png')
    expect(pictureKind(bytes('RIFF\x22\0\0\0WEBPVP8 '))).toBe('webp')
    expect(pictureKind(bytes('\0\0\0\x18ftypheic'))).toBe('heic')
    expect(pictureKind(bytes('\0\0\0\x1Cftypavif'))).toBe('heic')
  })

  it.each(['', '\xFF\xD8', '\xFF\xD8\xFE', '\x89PNG\n\n', 'RIFF\x22\0\0\0WAVEfmt ', '\0\0\0\x18ftypmp42', '<svg/>', 'GIF89a', ' \xFF\xD8\xFF\xE0'])('is none that is known: %j', (text) => {
    expect(pictureKind(bytes(text))).toBeNull()
  })
})

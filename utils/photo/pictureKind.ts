/** The kinds of picture that are told apart; the last one is known only to be refused with advice. */
export type PictureKind = 'jpeg' | 'png' | 'webp' | 'heic'

/** Brands by which a file of ISO base media says that it is a picture of HEIF or AVIF. Source, from memory: ISO/IEC 23008-12, annex B; AV1 Image File Format 1.1, 6.2. */
const HEIF_BRANDS = new Set(['heic', 'heix', 'heim', 'heis', 'hevc', 'hevx', 'mif1', 'msf1', 'avif', 'avis'])

const PNG_SIGNATURE = [0x89, 0x50, 0x4E, 0x47, 0x0D, 0x0A, 0x1A, 0x0A]

/**
 * What kind of picture a file is by its first bytes, whatever it is called; null where it is none that is known.
 *
 * Source, from memory: JPEG by ITU-T T.81, B.1.1.3 (SOI and the marker after it); PNG by its specification, 5.2; WebP by RFC 9649, 2.4.
 */
export function pictureKind(bytes: Uint8Array): PictureKind | null {
  if (bytes.length > 3 && bytes[0] === 0xFF && bytes[1] === 0xD8 && bytes[2] === 0xFF) return 'jpeg'
  if (PNG_SIGNATURE.every((byte, at) => bytes[at] === byte)) return 'png'
  if (text(bytes, 0) === 'RIFF' && text(bytes, 8) === 'WEBP') return 'webp'
  if (text(bytes, 4) === 'ftyp' && HEIF_BRANDS.has(text(bytes, 8))) return 'heic'
  return null
}

/** Four bytes as the characters that they stand for. */
function text(bytes: Uint8Array, from: number): string {
  return String.fromCharCode(...bytes.subarray(from, from + 4))
}

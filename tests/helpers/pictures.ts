import { crc32, deflateSync } from 'node:zlib'
import { redrawPhoto } from '../../server/utils/files/redrawPhoto'

type Colour = [red: number, green: number, blue: number]

/** A PNG, coloured pixel by pixel. With `says`, its head claims another size than its pixels have. */
export function png(width: number, height: number, colour: (x: number, y: number) => Colour, says: { width: number, height: number } = { width, height }): Uint8Array {
  const rows = Buffer.alloc(height * (1 + width * 3))
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) rows.set(colour(x, y), y * (1 + width * 3) + 1 + x * 3)
  }
  const head = Buffer.alloc(13)
  head.writeUInt32BE(says.width, 0)
  head.writeUInt32BE(says.height, 4)
  // Eight bits a channel, red green blue.
  head.set([8, 2, 0, 0, 0], 8)
  return Uint8Array.from(Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4E, 0x47, 0x0D, 0x0A, 0x1A, 0x0A]),
    chunk('IHDR', head), chunk('IDAT', deflateSync(rows)), chunk('IEND', Buffer.alloc(0)),
  ]))
}

function chunk(type: string, data: Buffer): Buffer {
  const named = Buffer.concat([Buffer.from(type, 'latin1'), data])
  const [length, check] = [Buffer.alloc(4), Buffer.alloc(4)]
  length.writeUInt32BE(data.length)
  check.writeUInt32BE(crc32(named))
  return Buffer.concat([length, named, check])
}

/** A picture whose left half is red and whose right half is blue. */
export function redAndBlue(width = 64, height = 32): Uint8Array {
  return png(width, height, x => x < width / 2 ? [220, 20, 20] : [20, 20, 220])
}

/** The same as a JPEG with nothing in it but the picture. */
export async function redAndBlueJpeg(width?: number, height?: number): Promise<Uint8Array> {
  return (await redrawPhoto({ bytes: redAndBlue(width, height), kind: 'png' })).picture
}

/** The smallest WebP: one pixel, lossy. */
export const ONE_PIXEL_WEBP = Uint8Array.from(Buffer.from('UklGRiIAAABXRUJQVlA4IBYAAAAwAQCdASoBAAEADsD+JaQAA3AAAAAA', 'base64'))

/**
 * A JPEG as a phone writes it: with an Exif segment that says how it was held and where it was taken.
 *
 * Source: Exif 2.32 (CIPA DC-008), 4.5.4 and 4.6: an APP1 segment with a TIFF inside; tags 0x0112 orientation, 0x8825 GPS.
 */
export function withExif(jpeg: Uint8Array, orientation: number): Uint8Array {
  const tiff = Buffer.alloc(8 + 2 + 24 + 4 + 2 + 24 + 4 + 24)
  tiff.write('II*\0', 0, 'latin1')
  tiff.writeUInt32LE(8, 4)
  tiff.writeUInt16LE(2, 8)
  entry(tiff, 10, { tag: 0x0112, type: 3, count: 1, value: orientation })
  entry(tiff, 22, { tag: 0x8825, type: 4, count: 1, value: 38 })
  tiff.writeUInt16LE(2, 38)
  entry(tiff, 40, { tag: 1, type: 2, count: 2, value: 'N'.charCodeAt(0) })
  entry(tiff, 52, { tag: 2, type: 5, count: 3, value: 68 })
  for (const [at, [top, bottom]] of [[33, 1], [26, 1], [5400, 100]].entries()) {
    tiff.writeUInt32LE(top!, 68 + at * 8)
    tiff.writeUInt32LE(bottom!, 72 + at * 8)
  }
  const body = Buffer.concat([Buffer.from('Exif\0\0', 'latin1'), tiff])
  const segment = Buffer.alloc(4)
  segment.set([0xFF, 0xE1])
  segment.writeUInt16BE(body.length + 2, 2)
  return Uint8Array.from(Buffer.concat([jpeg.subarray(0, 2), segment, body, jpeg.subarray(2)]))
}

function entry(into: Buffer, at: number, { tag, type, count, value }: { tag: number, type: number, count: number, value: number }): void {
  into.writeUInt16LE(tag, at)
  into.writeUInt16LE(type, at + 2)
  into.writeUInt32LE(count, at + 4)
  into.writeUInt32LE(value, at + 8)
}

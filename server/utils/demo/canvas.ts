import { crc32, deflateSync } from 'node:zlib'
import { DOT_FONT } from './dotFont'

/** A colour of a pixel, 0 to 255 each. */
export type Colour = readonly [red: number, green: number, blue: number]

const LETTER_WIDTH = 6

/** A picture that is drawn by pixels, for the photos of the demo firm. */
export class Canvas {
  readonly #pixels: Uint8Array

  constructor(readonly width: number, readonly height: number, shade: (x: number, y: number) => Colour) {
    this.#pixels = new Uint8Array(width * height * 3)
    for (let y = 0; y < height; y++) for (let x = 0; x < width; x++) this.#pixels.set(shade(x, y), (y * width + x) * 3)
  }

  box(left: number, top: number, width: number, height: number, colour: Colour): void {
    for (let y = top; y < top + height; y++) for (let x = left; x < left + width; x++) this.#pixels.set(colour, (y * this.width + x) * 3)
  }

  disc(centreX: number, centreY: number, radius: number, colour: Colour): void {
    for (let y = Math.floor(centreY - radius); y <= centreY + radius; y++) {
      const half = Math.floor(Math.sqrt(Math.max(0, radius ** 2 - (y - centreY) ** 2)))
      this.box(Math.round(centreX) - half, y, 2 * half + 1, 1, colour)
    }
  }

  /** A line of text by its dots; `dot` draws one at its corner. Letters that the font lacks stay empty. */
  dots(text: string, left: number, top: number, pitch: number, dot: (x: number, y: number) => void): void {
    for (const [at, letter] of [...text.toUpperCase()].entries()) {
      for (const [row, bits] of (DOT_FONT[letter] ?? []).entries()) {
        for (let column = 0; column < 5; column++) {
          if (bits & (16 >> column)) dot(left + (at * LETTER_WIDTH + column) * pitch, top + row * pitch)
        }
      }
    }
  }

  /** The picture as a PNG. Source: PNG specification, sections 5 and 11: eight bits a channel, rows without a filter. */
  png(): Uint8Array {
    const stride = this.width * 3
    const rows = Buffer.alloc(this.height * (stride + 1))
    for (let y = 0; y < this.height; y++) rows.set(this.#pixels.subarray(y * stride, (y + 1) * stride), y * (stride + 1) + 1)
    const head = Buffer.alloc(13)
    head.writeUInt32BE(this.width, 0)
    head.writeUInt32BE(this.height, 4)
    head.set([8, 2, 0, 0, 0], 8)
    return Uint8Array.from(Buffer.concat([
      Buffer.from([0x89, 0x50, 0x4E, 0x47, 0x0D, 0x0A, 0x1A, 0x0A]),
      chunk('IHDR', head), chunk('IDAT', deflateSync(rows)), chunk('IEND', Buffer.alloc(0)),
    ]))
  }
}

function chunk(type: string, data: Buffer): Buffer {
  const named = Buffer.concat([Buffer.from(type, 'latin1'), data])
  const whole = Buffer.alloc(named.length + 8)
  whole.writeUInt32BE(data.length, 0)
  whole.set(named, 4)
  whole.writeUInt32BE(crc32(named), named.length + 4)
  return whole
}

import { formatReading, type MassReading } from '../../../utils/quantity/mass'
import type { Stamp } from '../../../utils/capacity/types'
import { Canvas, type Colour } from './canvas'

const WIDTH = 960
const HEIGHT = 720

/** A collar as a phone sees it: brushed steel, with the stamp's lines dotted into it. */
export function stampPicture(stamp: Stamp): Uint8Array {
  const canvas = new Canvas(WIDTH, HEIGHT, brushedSteel)
  const lines = [
    `${stamp.spec}${stamp.servicePressurePsig ?? ''}`,
    `SN ${stamp.serial ?? ''}`,
    stamp.tareWeight ? `TW ${plain(stamp.tareWeight)}` : '',
    stamp.waterCapacity ? `WC ${plain(stamp.waterCapacity)}` : '',
    stamp.madeMonth ? stamp.madeMonth.slice(2).split('-').reverse().join('-') : '',
  ].filter(Boolean)
  for (const [at, line] of lines.entries()) {
    const pitch = Math.min(11, Math.floor(820 / (line.length * 6)))
    canvas.dots(line, 90 + (at % 2) * 14, 70 + at * 124, pitch, (x, y) => {
      canvas.disc(x + 1.5, y + 1.5, 5, [196, 198, 200])
      canvas.disc(x, y, 4, [64, 66, 70])
    })
  }
  return canvas.png()
}

/** The display of a scale with a reading on it. */
export function scalePicture(reading: MassReading): Uint8Array {
  const canvas = new Canvas(WIDTH, HEIGHT, (x, y) => [38 + (x + y) / 60, 41 + (x + y) / 60, 46 + (x + y) / 60])
  canvas.box(110, 190, 740, 300, [20, 22, 22])
  canvas.box(124, 204, 712, 272, [158, 176, 142])
  const text = plain(reading)
  const pitch = Math.min(17, Math.floor(640 / (text.length * 6)))
  canvas.dots(text, 160, 340 - Math.round(3.5 * pitch), pitch, (x, y) => canvas.box(x, y, pitch - 2, pitch - 2, [28, 34, 26]))
  canvas.dots('GROSS', 160, 226, 4, (x, y) => canvas.box(x, y, 3, 3, [60, 70, 56]))
  for (const [at, colour] of ([[90, 94, 100], [90, 94, 100], [214, 92, 40]] as Colour[]).entries()) canvas.disc(300 + at * 180, 590, 46, colour)
  return canvas.png()
}

// Lines along the sheet, and light that falls from the left.
function brushedSteel(x: number, y: number): Colour {
  const stroke = ((y * 7919) % 23) + ((x * 31 + y * 17) % 5)
  const level = Math.round(120 + stroke + 40 * (1 - x / WIDTH))
  return [level, level + 2, level + 4]
}

function plain(reading: MassReading): string {
  return formatReading(reading).replace(/\s/g, ' ')
}

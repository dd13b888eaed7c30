import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { readBarcodesFromImageData, setZXingModuleOverrides } from 'zxing-wasm/reader'

const wasm = readFileSync(createRequire(import.meta.url).resolve('zxing-wasm/reader/zxing_reader.wasm'))
setZXingModuleOverrides({ wasmBinary: wasm.buffer.slice(wasm.byteOffset, wasm.byteOffset + wasm.byteLength) as ArrayBuffer })

/** What the decoder of the scan screen reads in a picture of grey levels, every symbol in it, sorted. */
export async function readSymbols(width: number, height: number, brightness: (x: number, y: number) => number): Promise<string[]> {
  const data = new Uint8ClampedArray(width * height * 4)
  for (let at = 0; at < width * height; at++) {
    data.fill(brightness(at % width, Math.floor(at / width)), at * 4, at * 4 + 3)
    data[at * 4 + 3] = 255
  }
  const picture = { data, width, height, colorSpace: 'srgb' } as ImageData
  const found = await readBarcodesFromImageData(picture, { formats: ['QRCode'], maxNumberOfSymbols: 50 })
  return found.map(symbol => symbol.text).sort()
}

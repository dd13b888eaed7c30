import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { filmOfCode, filmOfLabelPdf } from '../../helpers/fakeCamera'
import { labelPdf, payloadOf } from '../../helpers/labelPdf'
import { readSymbols } from '../../helpers/readSymbols'

const folder = mkdtempSync(join(tmpdir(), 'collarbook-film-'))
afterAll(() => rmSync(folder, { recursive: true }))

const HEADER = 'YUV4MPEG2 W640 H480 F10:1 Ip A1:1 C420jpeg\n'
const FRAME_BYTES = 'FRAME\n'.length + 640 * 480 * 3 / 2

async function readFilm(file: string): Promise<string[]> {
  const film = readFileSync(file)
  expect(film.subarray(0, HEADER.length).toString()).toBe(HEADER)
  expect(film.length).toBe(HEADER.length + 2 * FRAME_BYTES)
  const luma = film.subarray(HEADER.length + 'FRAME\n'.length)
  return readSymbols(640, 480, (x, y) => luma[y * 640 + x]!)
}

describe('what a browser\'s fake camera films', () => {
  it('is the symbol of a payload', async () => {
    const file = join(folder, 'code.y4m')
    filmOfCode(payloadOf('7K3M9Q2TX'), file)
    expect(await readFilm(file)).toEqual([payloadOf('7K3M9Q2TX')])
  })

  it.each([['roll-4x2', true], ['roll-4x2', false], ['letter-10', true]] as const)(
    'is the first label printed on %s (compressed: %s)', async (stock, compress) => {
      const file = join(folder, 'label.y4m')
      filmOfLabelPdf(await labelPdf(['7K3M9Q2TX', '10100000E'], stock, { compress }), file)
      expect(await readFilm(file)).toEqual([payloadOf('7K3M9Q2TX')])
    })

  it('is refused where nothing was printed to film', () => {
    expect(() => filmOfLabelPdf(Buffer.from('%PDF-1.3'), join(folder, 'none.y4m'))).toThrow(/no symbol/)
  })
})

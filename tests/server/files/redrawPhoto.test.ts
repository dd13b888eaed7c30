import Vips from 'wasm-vips'
import { beforeAll, describe, expect, it } from 'vitest'
import { redrawPhoto } from '../../../server/utils/files/redrawPhoto'
import { ONE_PIXEL_WEBP, png, redAndBlue, redAndBlueJpeg, withExif } from '../../helpers/pictures'

let vips: typeof Vips
beforeAll(async () => {
  vips = await Vips({ dynamicLibraries: [] })
})

/** The colour of a pixel, named by what of it is strongest. */
function colourAt(file: Uint8Array, x: number, y: number): 'red' | 'blue' | 'white' | 'other' {
  const [red = 0, green = 0, blue = 0] = vips.Image.newFromBuffer(file).getpoint(x, y)
  if (red > 240 && green > 240 && blue > 240) return 'white'
  return red > 150 && blue < 90 ? 'red' : blue > 150 && red < 90 ? 'blue' : 'other'
}

const text = (file: Uint8Array) => Buffer.from(file).toString('latin1')

describe('a photo that is kept', () => {
  it('is a JPEG whatever it came as', async () => {
    for (const [kind, bytes] of [['png', redAndBlue()], ['jpeg', await redAndBlueJpeg()], ['webp', ONE_PIXEL_WEBP]] as const) {
      const { picture, thumb } = await redrawPhoto({ bytes, kind })
      expect([...picture.subarray(0, 3)]).toEqual([0xFF, 0xD8, 0xFF])
      expect([...thumb.subarray(0, 3)]).toEqual([0xFF, 0xD8, 0xFF])
    }
  })

  it('says no more where and how it was taken, and stands upright', async () => {
    // Held with its right side down: what was taken as 64 by 32 stands as 32 by 64, its left half on top.
    const taken = withExif(await redAndBlueJpeg(64, 32), 6)
    expect(text(taken)).toContain('Exif')
    const { picture, width, height } = await redrawPhoto({ bytes: taken, kind: 'jpeg' })
    expect([width, height]).toEqual([32, 64])
    expect([colourAt(picture, 16, 6), colourAt(picture, 16, 58)]).toEqual(['red', 'blue'])
    expect(text(picture)).not.toMatch(/Exif|GPS/)
    // No application segment but JFIF's own (APP0) is left.
    expect(text(picture)).not.toMatch(/\xFF[\xE1-\xEF]/)
  })

  it('has nothing behind the picture, though a page was hung to it', async () => {
    const page = Buffer.from('<html><script>alert(1)</script></html>')
    const { picture } = await redrawPhoto({ bytes: Uint8Array.from(Buffer.concat([await redAndBlueJpeg(), page])), kind: 'jpeg' })
    expect(text(picture)).not.toContain('script')
    expect([...picture.slice(-2)]).toEqual([0xFF, 0xD9])
  })

  it('has a longest side of at most 2,048 pixels, its thumbnail of 320; a small one is not enlarged', async () => {
    const large = await redrawPhoto({ bytes: png(2100, 700, () => [90, 90, 90]), kind: 'png' })
    expect([large.width, large.height]).toEqual([2048, 683])
    const thumb = vips.Image.newFromBuffer(large.thumb)
    expect([thumb.width, thumb.height]).toEqual([320, 107])
    const small = await redrawPhoto({ bytes: redAndBlue(64, 32), kind: 'png' })
    expect([small.width, small.height]).toEqual([64, 32])
  })

  it('comes out the same each time, so that a photo kept twice is one file', async () => {
    const bytes = redAndBlue()
    expect((await redrawPhoto({ bytes, kind: 'png' })).picture).toEqual((await redrawPhoto({ bytes, kind: 'png' })).picture)
  })
})

describe('what is no photo', () => {
  const refusal = (bytes: Uint8Array, kind: 'jpeg' | 'png' | 'webp') => redrawPhoto({ bytes, kind }).then(() => null, error => error.details)

  it('is a file that ends before the picture does', async () => {
    for (const [kind, bytes] of [['jpeg', await redAndBlueJpeg(400, 300)], ['png', redAndBlue(400, 300)], ['webp', ONE_PIXEL_WEBP]] as const) {
      expect(await refusal(bytes.slice(0, Math.floor(bytes.length * 0.6)), kind)).toMatchObject({ status: 422, type: 'broken-picture' })
    }
  })

  it('is a file that only begins like one', async () => {
    expect(await refusal(Uint8Array.from(Buffer.from('\xFF\xD8\xFF\xE0 and nothing of a picture', 'latin1')), 'jpeg')).toMatchObject({ status: 422 })
  })

  it('is one that says it has more than 50 million pixels: that is read before any is decoded', async () => {
    const says = (width: number, height: number) => png(4, 4, () => [0, 0, 0], { width, height })
    expect(await refusal(says(30_000, 30_000), 'png')).toMatchObject({ status: 413, type: 'too-many-pixels' })
    // Few pixels in millions of rows hold the decoder as long.
    for (const [width, height] of [[1, 20_001], [20_001, 1]] as const) expect(await refusal(says(width, height), 'png')).toMatchObject({ status: 413, type: 'too-many-pixels' })
    expect(await redrawPhoto({ bytes: png(1, 20_000, () => [90, 90, 90]), kind: 'png' })).toMatchObject({ width: 1, height: 2048 })
    expect(await refusal(says(10_000, 5_001), 'png')).toMatchObject({ status: 413 })
    // Within the limit it is looked at, and found not to have what it says.
    expect(await refusal(says(10_000, 5_000), 'png')).toMatchObject({ status: 422 })
  })

  it('does not keep the next one waiting', async () => {
    const [bad, good] = await Promise.allSettled([
      redrawPhoto({ bytes: redAndBlue().slice(0, 60), kind: 'png' }), redrawPhoto({ bytes: redAndBlue(), kind: 'png' }),
    ])
    expect([bad.status, good.status]).toEqual(['rejected', 'fulfilled'])
  })

  it('is told to come again where seventeen come at once', async () => {
    const answers = await Promise.allSettled(Array.from({ length: 17 }, () => redrawPhoto({ bytes: redAndBlue(), kind: 'png' })))
    expect(answers.filter(({ status }) => status === 'fulfilled')).toHaveLength(16)
    expect(answers[16]).toMatchObject({ status: 'rejected', reason: { details: { status: 503 } } })
  })
})

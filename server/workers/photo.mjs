import { parentPort } from 'node:worker_threads'
import Vips from 'wasm-vips'

/** One decoder for each kind that is taken, so that no other of the library's is ever tried on a file. */
const DECODERS = { jpeg: 'jpegloadBuffer', png: 'pngloadBuffer', webp: 'webploadBuffer' }

const vips = await Vips({
  dynamicLibraries: [],
  // What it warns of lies in the file of whoever sent it, and would only fill the server's output.
  preRun: (library) => {
    library.ENV.VIPS_WARNING = '0'
  },
})

parentPort.on('message', ({ bytes, kind, limits }) => parentPort.postMessage(redrawn(bytes, kind, limits)))

/**
 * The picture drawn anew, and its thumbnail: upright, in sRGB, on white, without anything of the file but its pixels.
 * Its size is read from its head and judged before a pixel is decoded. A file that ends too early is no picture.
 */
function redrawn(bytes, kind, { mostPixels, longestSideTaken, longestSide, thumbSide }) {
  try {
    const head = vips.Image[DECODERS[kind]](bytes)
    const isTooLarge = head.width * head.height > mostPixels || Math.max(head.width, head.height) > longestSideTaken
    head.delete()
    if (isTooLarge) return { fault: 'size' }
    const picture = within(bytes, longestSide, '[fail_on=truncated]')
    const thumb = within(picture.file, thumbSide, '')
    return { picture: picture.file, thumb: thumb.file, width: picture.width, height: picture.height }
  }
  catch {
    return { fault: 'broken' }
  }
}

function within(bytes, side, loading) {
  const sized = vips.Image.thumbnailBuffer(bytes, side, { height: side, size: 'down', export_profile: 'srgb', option_string: loading })
  const flat = sized.hasAlpha() ? sized.flatten({ background: [255, 255, 255] }) : sized
  // The encoder's bytes lie in the library's own memory: they are copied out of it.
  const file = Uint8Array.from(flat.writeToBuffer('.jpg', { Q: 82, keep: 'none' }))
  const { width, height } = flat
  if (flat !== sized) flat.delete()
  sized.delete()
  return { file, width, height }
}

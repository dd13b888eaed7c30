import { LARGEST_PHOTO, LONGEST_SIDE } from '~~/utils/photo/limits'
import { pictureKind } from '~~/utils/photo/pictureKind'
import { HEIC_ADVICE } from '~~/utils/photo/words'

/** A file that cannot be sent as a photo; the message says what to do. */
export class NotAPhoto extends Error {}

const QUALITY = 0.85

/**
 * A photo as it is sent: no larger than it will be kept, so that little goes over a weak network. What this browser
 * cannot draw is sent as it is, where the server takes it.
 *
 * Errors: {@link NotAPhoto} for what is no picture, or too large and not to be drawn.
 */
export async function shrinkPhoto(file: Blob): Promise<Uint8Array<ArrayBuffer>> {
  const drawn = await redraw(file).catch(() => null)
  const bytes = new Uint8Array(await (drawn ?? file).arrayBuffer())
  const kind = pictureKind(bytes)
  if (kind === 'heic') throw new NotAPhoto(HEIC_ADVICE)
  if (kind === null) throw new NotAPhoto('This file is no picture that can be shown. A photo is taken as JPEG, PNG or WebP.')
  if (bytes.length > LARGEST_PHOTO) throw new NotAPhoto(`This picture has more than ${LARGEST_PHOTO / 1024 / 1024} MiB. Take it with a smaller size.`)
  return bytes
}

async function redraw(file: Blob): Promise<Blob | null> {
  const bitmap = await createImageBitmap(file, { imageOrientation: 'from-image' })
  const scale = Math.min(1, LONGEST_SIDE / Math.max(bitmap.width, bitmap.height))
  const canvas = document.createElement('canvas')
  canvas.width = Math.max(1, Math.round(bitmap.width * scale))
  canvas.height = Math.max(1, Math.round(bitmap.height * scale))
  const pen = canvas.getContext('2d')
  if (!pen) return null
  // What is see-through in it would be black.
  pen.fillStyle = 'white'
  pen.fillRect(0, 0, canvas.width, canvas.height)
  pen.imageSmoothingQuality = 'high'
  pen.drawImage(bitmap, 0, 0, canvas.width, canvas.height)
  bitmap.close()
  return new Promise(done => canvas.toBlob(done, 'image/jpeg', QUALITY))
}

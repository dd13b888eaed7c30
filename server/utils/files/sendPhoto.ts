import { setResponseHeaders, type H3Event } from 'h3'

/** Answers with a photo: opened by itself it is saved and never shown as a page of ours. */
export function sendPhoto(event: H3Event, id: string, bytes: Buffer): Buffer {
  setResponseHeaders(event, {
    'Content-Type': 'image/jpeg',
    'Content-Disposition': `attachment; filename="photo-${id}.jpg"`,
    'X-Content-Type-Options': 'nosniff',
    'Content-Security-Policy': 'default-src \'none\'; sandbox',
    'Cross-Origin-Resource-Policy': 'same-origin',
    // On a phone that several use, nobody sees it without having signed in.
    'Cache-Control': 'private, no-store',
  })
  return bytes
}

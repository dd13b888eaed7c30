import { setResponseHeaders, type H3Event } from 'h3'
import type { ShipmentFile } from '~~/utils/contract/shipmentFiles'

/** Answers with a shipment's file: opened by itself it is saved, never sniffed and never shown as a page of ours. */
export function sendFile(event: H3Event, { file, bytes }: { file: ShipmentFile, bytes: Buffer }): Buffer {
  const plain = file.name.replace(/[^\x20-\x7E]|["\\]/g, '_')
  setResponseHeaders(event, {
    'Content-Type': file.mediaType,
    'Content-Disposition': `attachment; filename="${plain}"; filename*=UTF-8''${encodeURIComponent(file.name).replace(/['()*]/g, sign => `%${sign.charCodeAt(0).toString(16)}`)}`,
    'X-Content-Type-Options': 'nosniff',
    'Content-Security-Policy': 'default-src \'none\'; sandbox',
    'Cross-Origin-Resource-Policy': 'same-origin',
    'Cache-Control': 'private, no-store',
  })
  return bytes
}
